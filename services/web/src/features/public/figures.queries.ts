import { getPublicFigures } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

/** Changes only with a release. */
export const publicFiguresQuery = () =>
  queryOptions({
    queryKey: ['public', 'figures'],
    queryFn: ({ signal }) => call(getPublicFigures, {}, { signal }),
    staleTime: 10 * 60_000,
  });
