/** What the preparing page has to know of a site beforehand: the codes the registry holds, and headers a steward calls safe. */
import { listParticipantCodes, listSafeHeaders } from '@cairnstep/contract';
import { queryOptions } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

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
