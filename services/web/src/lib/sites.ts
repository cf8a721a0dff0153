/** The sites a person may see, as several features ask for them. */
import { listSites } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { call } from './call.ts';

export const sitesQuery = () =>
  queryOptions({
    queryKey: ['sites'],
    queryFn: ({ signal }) => call(listSites, {}, { signal }),
    staleTime: 10 * 60_000,
  });
