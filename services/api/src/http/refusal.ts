/** A use case that must stop throws this. Facts go into the sentence the person reads; none of them may come from a participant. */
import type { ProblemCode } from '@cairnstep/contract';

export interface LocatedIssue {
  readonly pointer: string;
  readonly detail: string;
}

export class Refusal extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly errors?: readonly LocatedIssue[],
  ) {
    super(code);
    this.name = 'Refusal';
  }
}

/** An access token that does not do. `error` is the word of RFC 6750 for the challenge in the answer. */
export class TokenRefusal extends Refusal {
  constructor(
    readonly error: 'invalid_token' | 'insufficient_scope' | 'invalid_request',
    code: ProblemCode,
    detail: string,
  ) {
    super(code, detail);
    this.name = 'TokenRefusal';
  }
}
