/** Roles as the screens call them. */
import type { Role, Site } from '@cairnstep/contract';

export const roleNames: Readonly<Record<Role, string>> = {
  therapist: 'treating therapist',
  coordinator: 'site coordinator',
  researcher: 'researcher',
  steward: 'data steward',
  administrator: 'administrator',
};

/** "site coordinator, North Harbour Clinic (S01)" */
export function roleWithin(role: Role, site: Site | null): string {
  return site === null ? roleNames[role] : `${roleNames[role]}, ${site.name} (${site.code})`;
}
