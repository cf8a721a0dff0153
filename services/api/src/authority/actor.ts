/** Who acts. Everything the server decides, it decides from this and the authority table. */
import type { Role } from '@cairnstep/contract';

export interface ActiveGrant {
  readonly id: string;
  readonly role: Role;
  readonly siteId: string | null;
}

export type Actor =
  | { readonly kind: 'nobody' }
  | {
      readonly kind: 'person';
      readonly accountId: string;
      readonly name: string;
      readonly institution: string | null;
      readonly grants: readonly ActiveGrant[];
    }
  /** A site's own system, known by its access token. It may do what the authority table says in its column, at this one site. */
  | { readonly kind: 'site-system'; readonly systemId: string; readonly label: string; readonly siteId: string }
  /** The registry's own processes: sign-in, jobs, statistics. `part` names the reach the database gives it. */
  | { readonly kind: 'system'; readonly part: 'registry' | 'statistics' };

export type Person = Extract<Actor, { kind: 'person' }>;
export type SiteSystem = Extract<Actor, { kind: 'site-system' }>;

/** Reads and writes for the registry itself: jobs, sign-in, releases. */
export const registry: Actor = { kind: 'system', part: 'registry' };
/** Reads the frozen facts of releases and nothing else. */
export const statistics: Actor = { kind: 'system', part: 'statistics' };
export const nobody: Actor = { kind: 'nobody' };

export const sitesOf = (actor: Actor, ...roles: readonly Role[]): readonly string[] =>
  actor.kind === 'person'
    ? actor.grants.flatMap((grant) => (roles.includes(grant.role) && grant.siteId !== null ? [grant.siteId] : []))
    : [];

export const hasRole = (actor: Actor, role: Role): boolean => actor.kind === 'person' && actor.grants.some((grant) => grant.role === role);
