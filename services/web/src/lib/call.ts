/** The one way to the API: builds the address, sends, parses the answer by the contract, throws refusals. */
import type { CallOf, Endpoint, Problem, ResponseOf } from '@cairnstep/contract';
import { ProblemError, UnexpectedAnswerError, UnreachableError } from './problem-error.ts';
import { sendWithProgress } from './send-with-progress.ts';

type AnyEndpoint = Pick<Endpoint, 'method' | 'path' | 'params' | 'query' | 'body' | 'upload' | 'response'>;

export interface CallOptions {
  readonly signal?: AbortSignal;
  /** The bytes of an endpoint that takes a file. */
  readonly file?: Blob;
  /** Hears how much of the file has left, from 0 to 1. */
  readonly onSent?: (part: number) => void;
}

/** The address of an endpoint with its parameters filled in; for links to files as well. */
export function addressOf<E extends AnyEndpoint>(endpoint: E, input: CallOf<E>): string {
  const values = input as Readonly<Record<string, unknown>>;
  const path = endpoint.path.replace(/:([A-Za-z]+)/g, (_whole, name: string) => encodeURIComponent(String(values[name])));
  const search = new URLSearchParams();
  for (const name of namesOf(endpoint.query)) {
    const value = values[name];
    if (value !== undefined && value !== null) search.append(name, String(value));
  }
  return search.size > 0 ? `${path}?${search}` : path;
}

export async function call<E extends AnyEndpoint>(endpoint: E, input: CallOf<E>, options: CallOptions = {}): Promise<ResponseOf<E>> {
  const response = await send(endpoint, input, options);
  if (!response.ok) throw await refusalIn(response);
  const parsed = endpoint.response.safeParse(await jsonIn(response));
  if (!parsed.success) throw new UnexpectedAnswerError(response.status);
  return parsed.data as ResponseOf<E>;
}

async function send<E extends AnyEndpoint>(endpoint: E, input: CallOf<E>, { signal, file, onSent }: CallOptions): Promise<Response> {
  // A header no form or foreign page can send: the API refuses changes without it.
  const headers: Record<string, string> = { 'X-Cairnstep-Request': '1', Accept: 'application/json, application/problem+json' };
  const request: RequestInit = { method: endpoint.method, headers, credentials: 'same-origin', ...(signal && { signal }) };
  if (endpoint.upload) {
    headers['Content-Type'] = endpoint.upload.contentType;
    request.body = file ?? null;
  } else if (endpoint.body) {
    const values = input as Readonly<Record<string, unknown>>;
    headers['Content-Type'] = 'application/json';
    request.body = JSON.stringify(Object.fromEntries(namesOf(endpoint.body).map((name) => [name, values[name]])));
  }
  try {
    const address = addressOf(endpoint, input);
    return await (onSent === undefined ? fetch(address, request) : sendWithProgress(address, request, onSent));
  } catch (cause) {
    if (signal?.aborted === true) throw cause;
    throw new UnreachableError();
  }
}

async function refusalIn(response: Response): Promise<Error> {
  if (response.headers.get('Content-Type')?.startsWith('application/problem+json') !== true)
    return new UnexpectedAnswerError(response.status);
  return new ProblemError((await jsonIn(response)) as Problem);
}

async function jsonIn(response: Response): Promise<unknown> {
  try {
    return await response.json();
  } catch {
    throw new UnexpectedAnswerError(response.status);
  }
}

/** Names of the fields an object schema describes. */
function namesOf(schema: unknown): string[] {
  return schema !== null && typeof schema === 'object' && 'shape' in schema ? Object.keys(schema.shape as object) : [];
}
