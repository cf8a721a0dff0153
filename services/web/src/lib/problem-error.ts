/** A refusal of the API as an error to branch on (`code`), to place (`errors`) and to show (`title`, `detail`). */
import type { Problem, ProblemCode } from '@cairnstep/contract';

export class ProblemError extends Error {
  readonly code: ProblemCode;
  readonly status: number;
  readonly title: string;
  readonly detail: string;
  readonly errors: readonly { readonly pointer: string; readonly detail: string }[];

  constructor(problem: Problem) {
    super(`${problem.title}. ${problem.detail}`);
    this.name = 'ProblemError';
    this.code = problem.type.slice('/problems/'.length) as ProblemCode;
    this.status = problem.status;
    this.title = problem.title;
    this.detail = problem.detail;
    this.errors = problem.errors ?? [];
  }
}

/** No answer came: the network, a proxy, or a server that is starting. */
export class UnreachableError extends Error {
  constructor() {
    super('The registry cannot be reached.');
    this.name = 'UnreachableError';
  }
}

/** An answer came that this version of the client does not understand, most often because a newer one is in service. */
export class UnexpectedAnswerError extends Error {
  constructor(readonly status: number) {
    super('The registry answered in a way this page does not understand.');
    this.name = 'UnexpectedAnswerError';
  }
}
