/** One cache of answers for the whole client. */
import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { accountQuery } from './account.ts';
import { ProblemError, UnexpectedAnswerError } from './problem-error.ts';

/** A refusal will be a refusal again; only silence and failures on the other side are worth another try. */
export function worthRetrying(failures: number, error: unknown): boolean {
  if (error instanceof ProblemError && error.status < 500) return false;
  if (error instanceof UnexpectedAnswerError && error.status < 500) return false;
  return failures < 2;
}

/** Refusals that tell that the account is no longer what this client believes. */
const accountChanged = new Set(['not-signed-in', 'no-grant', 'not-permitted']);

export function makeQueryClient(): QueryClient {
  const onError = (error: unknown) => {
    if (error instanceof ProblemError && accountChanged.has(error.code))
      void client.invalidateQueries({ queryKey: accountQuery().queryKey });
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: { retry: worthRetrying, staleTime: 30_000, refetchOnWindowFocus: false },
      mutations: { retry: false },
    },
  });
  return client;
}
