/** The only file that knows how a refusal looks on the wire (RFC 9457). */
import { problems, type Problem, type ProblemCode } from '@cairnstep/contract';
import { Refusal } from './refusal.ts';

/** SQLSTATE classes after which trying again later is the right advice: connection lost, out of resources, operator intervention, timeouts. */
const passingFault = /^(08|53|57|58|55000|55P03|40001|40P01)/;

const codeOf = (error: unknown): string | undefined => {
  if (typeof error !== 'object' || error === null) return undefined;
  const code = (error as { code?: unknown }).code;
  return typeof code === 'string' ? code : undefined;
};

export function isPassingFault(error: unknown): boolean {
  const code = codeOf(error);
  if (code === undefined) return error instanceof Error && /terminat|timeout exceeded when trying to connect|Connection ended/i.test(error.message);
  return passingFault.test(code) || ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT'].includes(code);
}

function build(code: ProblemCode, detail: string, requestId: string, errors?: Problem['errors']): Problem {
  const { status, title } = problems[code];
  return { type: `/problems/${code}`, status, title, detail, instance: `urn:cairnstep:request:${requestId}`, ...(errors ? { errors } : {}) };
}

/** Anything that is not a refusal says nothing of its cause: the details are in the log under the request id. */
export function toProblem(error: unknown, requestId: string): Problem {
  if (error instanceof Refusal) return build(error.code, error.detail, requestId, error.errors);
  const status = typeof error === 'object' && error !== null ? (error as { status?: unknown }).status : undefined;
  if (status === 413) return build('too-large', 'The request is larger than this address accepts. Nothing was kept.', requestId);
  if (status === 400) return build('invalid-input', 'The request could not be read. Nothing was kept.', requestId);
  if (isPassingFault(error)) return build('busy', 'The registry cannot answer just now. Nothing was changed; try again in a moment.', requestId);
  return build('internal-error', `Nothing was changed. Tell the registry office this number: ${requestId}`, requestId);
}
