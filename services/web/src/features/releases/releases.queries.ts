import { listReleases, makeRelease } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export const releasesQuery = () =>
  queryOptions({
    queryKey: ['releases'],
    queryFn: ({ signal }) => call(listReleases, {}, { signal }),
  });

/** Everything that shows the newest release is asked for anew. */
export function useMakeRelease() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (note: string) => call(makeRelease, { note }),
    onSuccess: () =>
      Promise.all([
        cache.invalidateQueries({ queryKey: releasesQuery().queryKey }),
        cache.invalidateQueries({ queryKey: ['explore'] }),
        cache.invalidateQueries({ queryKey: ['public'] }),
      ]),
  });
}
