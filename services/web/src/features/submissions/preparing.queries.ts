/** What the preparing page has to know of a site beforehand: the codes the registry holds, and headers a steward calls safe. */
import { listParticipantCodes, listSafeHeaders, replaceCodes } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';
import type { ReplacedCodes } from '../../preparing/messages.ts';

export interface SiteKnowledge {
  readonly knownParticipants: readonly string[];
  readonly safeHeaders: readonly string[];
}

export const siteKnowledgeQuery = (siteId: string) =>
  queryOptions({
    queryKey: ['site-knowledge', siteId],
    queryFn: async ({ signal }): Promise<SiteKnowledge> => {
      const [{ codes }, { headers }] = await Promise.all([
        call(listParticipantCodes, { siteId }, { signal }),
        call(listSafeHeaders, { siteId }, { signal }),
      ]);
      return { knownParticipants: codes, safeHeaders: headers.map(({ header }) => header) };
    },
    // A key file is held against it, so it has to be as the registry is now; while the page is open it stays as it was.
    staleTime: Infinity,
    gcTime: 0,
    refetchOnWindowFocus: false,
  });

/** The registry puts new codes in the place of old ones; checks and previews of the site's months are then out of date. */
export function useReplaceCodes(siteId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (codes: ReplacedCodes) => call(replaceCodes, { siteId, codes }),
    onSuccess: () => cache.invalidateQueries({ queryKey: ['submissions'] }),
  });
}
