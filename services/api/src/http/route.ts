/** A route: an endpoint of the contract bound to a use case. Parses, decides who may, calls, answers. */
import type { Endpoint, EndpointName, InputOf, ResponseOf } from '@cairnstep/contract';
import { endpoints } from '@cairnstep/contract';
import type { Request, RequestHandler, Response } from 'express';
import type { Readable } from 'node:stream';
import { z } from 'zod';
import type { Actor } from '../authority/actor.ts';
import { requireEntry } from '../authority/require-may.ts';
import { Refusal, type LocatedIssue } from './refusal.ts';

/** What a use case may need of the request beside its input. */
export interface RequestFacts {
  readonly requestId: string;
  readonly address: string;
  /** The body of an upload endpoint. */
  readonly upload: Readable;
  readonly session: Request['session'];
}

/** A file to send as an attachment under a fixed, safe name. */
export interface FileAnswer {
  readonly fileName: string;
  readonly bytes: Buffer;
}

/** An endpoint that sends a file promises nothing else. */
type Answer<E> = undefined extends ResponseOf<E> ? FileAnswer : ResponseOf<E>;
export type UseCase<E> = (actor: Actor, input: InputOf<E>, facts: RequestFacts) => Promise<Answer<E>> | Answer<E>;

export interface Route {
  readonly name: EndpointName;
  readonly endpoint: Endpoint;
  readonly handler: RequestHandler;
}

const nothing = z.undefined();

function issuesOf(part: string, error: z.ZodError): LocatedIssue[] {
  return error.issues.flatMap((issue) => {
    const path = issue.path.map((step) => String(step).replaceAll('~', '~0').replaceAll('/', '~1'));
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({ pointer: `/${[part, ...path, key].join('/')}`, detail: 'This is not expected here.' }));
    }
    return [{ pointer: `/${[part, ...path].join('/')}`, detail: issue.message }];
  });
}

function parseInput(endpoint: Endpoint, request: Request): Record<string, unknown> {
  const parts = [
    ['params', endpoint.params, request.params],
    ['query', endpoint.query, { ...request.query }],
    ['body', endpoint.body, endpoint.body ? (request.body ?? {}) : undefined],
  ] as const;
  const input: Record<string, unknown> = {};
  const issues: LocatedIssue[] = [];
  for (const [part, schema, value] of parts) {
    const parsed = (schema ?? nothing).safeParse(schema ? value : undefined);
    if (parsed.success) Object.assign(input, parsed.data ?? {});
    else issues.push(...issuesOf(part, parsed.error));
  }
  // An address that does not fit its pattern names nothing: same answer as an unknown id.
  if (issues.some((issue) => issue.pointer.startsWith('/params/'))) throw new Refusal('not-found', 'There is nothing at this address, or it is not yours to see.');
  if (issues.length > 0) throw new Refusal('invalid-input', 'Nothing was kept. Mend what is listed and send it again.', issues);
  return input;
}

function send(endpoint: Endpoint, response: Response, answer: unknown): void {
  response.status(endpoint.status ?? 200);
  if (endpoint.download) {
    const { fileName, bytes } = answer as FileAnswer;
    response.setHeader('Content-Type', endpoint.download.contentType);
    response.setHeader('Content-Disposition', `attachment; filename="${fileName}"`);
    response.setHeader('Content-Security-Policy', "sandbox; default-src 'none'");
    response.end(bytes);
    return;
  }
  // Only what the contract names leaves: an extra field is a fault of ours, not of the caller.
  response.json(endpoint.response.parse(answer));
}

export function route<Name extends EndpointName>(name: Name, useCase: UseCase<(typeof endpoints)[Name]>): Route {
  const endpoint: Endpoint = endpoints[name];
  return {
    name,
    endpoint,
    handler: async (request, response) => {
      const actor = request.actor;
      requireEntry(actor, name);
      const input = parseInput(endpoint, request) as InputOf<(typeof endpoints)[Name]>;
      const facts: RequestFacts = { requestId: String(request.id), address: request.ip ?? '', upload: request, session: request.session };
      send(endpoint, response, await useCase(actor, input, facts));
    },
  };
}
