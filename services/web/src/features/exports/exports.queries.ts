import { listExports } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { exportsKey } from '../../lib/build-export.ts';
import { call } from '../../lib/call.ts';

/** While one is being built, it is looked at again every two seconds. */
export const exportsQuery = () =>
  queryOptions({
    queryKey: exportsKey,
    queryFn: ({ signal }) => call(listExports, {}, { signal }),
    staleTime: 0,
    refetchInterval: ({ state }) => (state.data?.exports.some(({ status }) => status === 'building') === true ? 2000 : false),
  });
