/** One cache of answers for the whole client. */
import { QueryClient } from '@tanstack/react-query';
import { ProblemError, UnexpectedAnswerError } from './problem-error.ts';

/** A refusal will be a refusal again; only silence and failures on the other side are worth another try. */
export function worthRetrying(failures: number, error: unknown): boolean {
  if (error instanceof ProblemError && error.status < 500) return false;
  if (error instanceof UnexpectedAnswerError && error.status < 500) return false;
  return failures < 2;
}

export function makeQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry: worthRetrying, staleTime: 30_000, refetchOnWindowFocus: false },
      mutations: { retry: false },
    },
  });
}
