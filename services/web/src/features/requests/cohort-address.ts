/** The way from a request to the grid, where its cohort is chosen, and back. */
import type { Cohort } from '../../lib/cohort.ts';
import { cohortSearch } from '../../lib/cohort.ts';

/** `draft`: the request that a choice in the grid is to go back to. */
export function gridAddress(cohort: Cohort, draft?: string): string {
  const search = cohortSearch(cohort);
  if (draft !== undefined) search.set('draft', draft);
  return `/explore?${search}`;
}

/** What leaves the address of a draft once its cohort was taken over from the grid. */
export const withoutCohort = { outcome: null, 'in-device': null, cells: null } as const;
