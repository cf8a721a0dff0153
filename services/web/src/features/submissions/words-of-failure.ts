/** Why something did not reach the registry, for the preparing page, which cannot ask itself. */
import { ProblemError, UnreachableError } from '../../lib/problem-error.ts';

export function wordsOfFailure(error: unknown): string {
  if (error instanceof ProblemError) return `${error.title}. ${error.detail}`;
  if (error instanceof UnreachableError) return 'The registry cannot be reached. Look at your connection, then send again.';
  return 'The registry answered in a way that is not understood here. Load the page again.';
}
