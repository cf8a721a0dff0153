/** What the list of safe headers asks and tells. A change answers with the list as it then is. */
import { listSafeHeaders, markSafeHeader, unmarkSafeHeader } from '@cairnstep/contract';
import type { ResponseOf } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type SafeHeaders = ResponseOf<typeof listSafeHeaders>;
export type SafeHeader = SafeHeaders['headers'][number];

export const safeHeadersQuery = (siteId: string) =>
  queryOptions({
    queryKey: ['safe-headers', siteId],
    queryFn: ({ signal }) => call(listSafeHeaders, { siteId }, { signal }),
  });

function useHeaderChange(siteId: string, change: (header: string) => Promise<SafeHeaders>) {
  const cache = useQueryClient();
  return useMutation({ mutationFn: change, onSuccess: (headers) => cache.setQueryData(safeHeadersQuery(siteId).queryKey, headers) });
}

export const useMarkHeader = (siteId: string) => useHeaderChange(siteId, (header) => call(markSafeHeader, { siteId, header }));

export const useUnmarkHeader = (siteId: string) => useHeaderChange(siteId, (header) => call(unmarkSafeHeader, { siteId, header }));
