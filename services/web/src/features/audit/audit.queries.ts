import { listAudit, verifyAudit } from '@cairnstep/contract';
import type { ResponseOf } from '@cairnstep/contract';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type Entry = ResponseOf<typeof listAudit>['items'][number];

export const auditQuery = (page: number) =>
  queryOptions({
    queryKey: ['audit', page],
    queryFn: ({ signal }) => call(listAudit, { page }, { signal }),
    placeholderData: keepPreviousData,
    staleTime: 0,
  });

/** Verifying is itself an act that the log keeps. */
export function useVerifyAudit() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(verifyAudit, {}),
    onSuccess: () => cache.invalidateQueries({ queryKey: ['audit'] }),
  });
}
