import { getGrid, listOutcomes } from '@cairnstep/contract';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export interface GridQuestion {
  readonly outcome: string;
  readonly inDevice: 'yes' | 'no';
  readonly statistic: 'change' | 'baseline' | 'end';
  /** Absent: the newest. */
  readonly release?: number;
  /** A site's own live figures instead of a release. */
  readonly siteId?: string;
}

/** Changes only with a release. */
export const outcomesQuery = () =>
  queryOptions({
    queryKey: ['explore', 'outcomes'],
    queryFn: ({ signal }) => call(listOutcomes, {}, { signal }),
    staleTime: 10 * 60_000,
  });

/** A release never changes, so its figures are asked for once. While others are fetched, those asked for before stay in sight. */
export const gridQuery = (question: GridQuestion) =>
  queryOptions({
    queryKey: ['explore', 'grid', question],
    queryFn: ({ signal }) => call(getGrid, question, { signal }),
    placeholderData: keepPreviousData,
    staleTime: question.siteId !== undefined ? 0 : question.release === undefined ? 10 * 60_000 : Infinity,
  });
