/** A role as it is being given: typed so far, what is missing, and what is sent. */
import { CalendarDate } from '@cairnstep/contract';
import type { Account, Role } from '@cairnstep/contract';
import type { PlacedProblem } from '../../lib/field-problems.ts';

type Grant = Account['grants'][number];

export interface RoleDraft {
  readonly role: Role | null;
  readonly siteId: string | null;
  /** As typed; empty: without an end. */
  readonly endsOn: string;
}

export const emptyRole: RoleDraft = { role: null, siteId: null, endsOn: '' };

/** Roles that name a site. */
export const isSiteRole = (role: Role | null): boolean => role === 'therapist' || role === 'coordinator';

export interface RoleFieldIds {
  readonly role: string;
  readonly site: string;
  readonly endsOn: string;
}

export const fieldIdsOf = (form: string): RoleFieldIds => ({ role: `${form}-role`, site: `${form}-site`, endsOn: `${form}-ends-on` });

/** `today`: `2026-12-01`. `held`: the roles the person has. */
export function problemsOfRole(
  draft: RoleDraft,
  ids: RoleFieldIds,
  today: string,
  held: readonly Pick<Grant, 'role' | 'site'>[] = [],
): PlacedProblem[] {
  const endsOn = draft.endsOn.trim();
  return [
    draft.role === null && { fieldId: ids.role, message: 'Choose a role' },
    held.some((grant) => isSame(grant, draft)) && { fieldId: ids.role, message: 'The person has this role already' },
    isSiteRole(draft.role) && draft.siteId === null && { fieldId: ids.site, message: 'Choose the site this person works at' },
    endsOn !== '' &&
      !CalendarDate.safeParse(endsOn).success && {
        fieldId: ids.endsOn,
        message: 'Write the last day as year, month and day, such as 2027-06-30',
      },
    endsOn !== '' &&
      CalendarDate.safeParse(endsOn).success &&
      endsOn < today && { fieldId: ids.endsOn, message: 'The last day lies in the past' },
  ].filter((problem) => problem !== false);
}

const isSame = ({ role, site }: Pick<Grant, 'role' | 'site'>, draft: RoleDraft): boolean =>
  role === draft.role && (!isSiteRole(role) || site?.id === draft.siteId);

/** What is sent of a draft without problems. */
export function roleOf({ role, siteId, endsOn }: RoleDraft): { role: Role; siteId: string | null; endsOn: string | null } {
  if (role === null) throw new RangeError('No role has been chosen');
  return { role, siteId: isSiteRole(role) ? siteId : null, endsOn: endsOn.trim() === '' ? null : endsOn.trim() };
}
