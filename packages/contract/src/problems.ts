/** Every refusal the API can answer with, as `application/problem+json` of type `/problems/<code>` (RFC 9457). */

export const problems = {
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'no-grant': { status: 403, title: 'Nobody has given this account a role yet' },
  'not-permitted': { status: 403, title: 'Your role does not include this' },
  'request-not-from-here': { status: 403, title: 'The request did not come from this application' },
  'not-found': { status: 404, title: 'There is nothing at this address' },
  'invalid-input': { status: 400, title: 'Some of what was sent cannot be used' },
  'too-large': { status: 413, title: 'The request is larger than is accepted' },
  'too-many-requests': { status: 429, title: 'Too many requests in a short time' },
  busy: { status: 503, title: 'The registry is busy or being restarted' },
  'internal-error': { status: 500, title: 'Something failed on our side' },
  'provider-unavailable': { status: 503, title: 'The sign-in service of your organisation does not answer' },
  'sign-in-failed': { status: 400, title: 'Signing in did not work' },
  'invitation-unusable': { status: 410, title: 'This invitation can no longer be used' },
  'token-refused': { status: 401, title: 'The access token is not accepted' },
  'token-without-scope': { status: 403, title: 'The access token does not cover this' },
  'two-identities': { status: 400, title: 'A request comes from a person or from a system, not from both' },
  'system-registered': { status: 409, title: 'This system is registered already' },
  'grant-to-oneself': { status: 409, title: 'Nobody can change their own roles' },
  'already-held': { status: 409, title: 'The person has this role already' },
  'submission-stale': { status: 409, title: 'The registry changed since this preview was made' },
  'submission-has-errors': { status: 409, title: 'The files still hold errors' },
  'submission-has-open-warnings': { status: 409, title: 'Some warnings have no reason yet' },
  'submission-closed': { status: 409, title: 'This submission has already been settled' },
  'submission-busy': { status: 409, title: 'This submission is being checked' },
  'submission-empty': { status: 409, title: 'No file has been added yet' },
  'month-not-open': { status: 409, title: 'This month cannot be submitted' },
  'month-not-empty': { status: 409, title: 'Something has been submitted for this month' },
  'identifies-somebody': { status: 422, title: 'What was sent could identify a person' },
  'codes-collide': { status: 409, title: 'Rows of two codes contradict each other' },
  'file-unreadable': { status: 422, title: 'The file could not be read' },
  'request-incomplete': { status: 409, title: 'The request is not complete' },
  'request-not-in-state': { status: 409, title: 'The request has moved on' },
  'conflict-of-interest': { status: 409, title: 'Somebody else has to decide this request' },
  'already-voted': { status: 409, title: 'You have already given your decision' },
  'access-ended': { status: 409, title: 'The access this request gave has ended' },
  'export-not-ready': { status: 409, title: 'The export is not ready' },
  'export-stale': { status: 409, title: 'The export is out of date' },
  'release-unchanged': { status: 409, title: 'Nothing has changed since the last release' },
} as const satisfies Record<string, { status: number; title: string }>;

export type ProblemCode = keyof typeof problems;

/** Any endpoint may answer with these. */
export const commonProblems = [
  'not-signed-in',
  'token-refused',
  'token-without-scope',
  'two-identities',
  'no-grant',
  'not-permitted',
  'request-not-from-here',
  'invalid-input',
  'too-many-requests',
  'busy',
  'internal-error',
] as const satisfies readonly ProblemCode[];

/** The body of a refusal. `errors` lists every located issue of an `invalid-input`; pointers are JSON pointers into the request. */
export interface Problem {
  readonly type: `/problems/${ProblemCode}`;
  readonly status: number;
  readonly title: string;
  readonly detail: string;
  readonly instance: string;
  readonly errors?: readonly { readonly pointer: string; readonly detail: string }[];
}
