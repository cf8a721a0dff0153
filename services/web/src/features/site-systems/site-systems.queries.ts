/** What the page of sites' systems asks and tells. A change answers with the system as it then is. */
import { addSiteSystem, listSiteSystems, setSiteSystemStatus } from '@cairnstep/contract';
import type { CallOf, ResponseOf } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type Systems = ResponseOf<typeof listSiteSystems>;
export type System = Systems['systems'][number];

export const systemsQuery = () =>
  queryOptions({
    queryKey: ['site-systems'],
    queryFn: ({ signal }) => call(listSiteSystems, {}, { signal }),
  });

function useSystemChange<Input>(change: (input: Input) => Promise<System>) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSuccess: (changed) =>
      cache.setQueryData(
        systemsQuery().queryKey,
        (before) => before && { ...before, systems: [...before.systems.filter(({ id }) => id !== changed.id), changed].sort(bySite) },
      ),
  });
}

const bySite = (one: System, other: System): number => one.site.code.localeCompare(other.site.code) || one.label.localeCompare(other.label);

export const useAddSystem = () => useSystemChange((system: CallOf<typeof addSiteSystem>) => call(addSiteSystem, system));

export const useSetSystemStatus = (systemId: string) =>
  useSystemChange((status: System['status']) => call(setSiteSystemStatus, { systemId, status }));
