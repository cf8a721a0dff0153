import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ErrorNotice } from './error-notice.tsx';
import { Loading } from './loading.tsx';

export interface AnswerProps<Data> {
  readonly query: UseQueryResult<Data>;
  /** A sentence: "Reading the figures." */
  readonly waiting: string;
  readonly children: (data: Data) => ReactNode;
}

/** Shows a question's answer once it is there, and until then or instead its waiting, error or no-permission state. */
export function Answer<Data>({ query, waiting, children }: AnswerProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  if (query.isError) return <ErrorNotice error={query.error} retry={() => void query.refetch()} />;
  return <Loading>{waiting}</Loading>;
}
