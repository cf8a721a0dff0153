/** The questions the server asks the authority table. Hidden and missing answer alike. */
import { roles, type EndpointName, type Role } from '@cairnstep/contract';
import { Refusal } from '../http/refusal.ts';
import { sitesOf, type Actor, type Person, type SiteSystem } from './actor.ts';
import { authority, entries, type Action, type Reach } from './table.ts';

const rolesWith = (action: Action, ...reach: readonly Reach[]): Role[] => roles.filter((role) => reach.includes(authority[action][role]));

/** True when the actor has this action at all, whatever its reach. */
export function mayAtAll(actor: Actor, action: Action): boolean {
  if (actor.kind === 'site-system') return authority[action]['site-system'] !== 'no';
  if (actor.kind !== 'person') return false;
  return actor.grants.some((grant) => authority[action][grant.role] !== 'no');
}

/** The action for the whole registry. */
export const mayEverywhere = (actor: Actor, action: Action): boolean =>
  actor.kind === 'person' && actor.grants.some((grant) => authority[action][grant.role] === 'all');

/** The action for rows of this site. */
export const mayAtSite = (actor: Actor, action: Action, siteId: string): boolean =>
  actor.kind === 'site-system'
    ? mayAtAll(actor, action) && actor.siteId === siteId
    : mayEverywhere(actor, action) || sitesOf(actor, ...rolesWith(action, 'own-site')).includes(siteId);

const nothingHere = () => new Refusal('not-found', 'There is nothing at this address, or it is not yours to see.');

/** Asked of every request before its input is read. */
export function requireEntry(actor: Actor, name: EndpointName): void {
  const entry = entries[name];
  if (actor.kind === 'site-system') return requireSystemEntry(actor, entry);
  if (entry === 'anyone') return;
  if (actor.kind === 'nobody')
    throw new Refusal('not-signed-in', 'Your session has ended or you have not signed in. What you typed is still on this page.');
  if (entry === 'signed-in') return;
  if (actor.kind === 'person' && actor.grants.length === 0)
    throw new Refusal('no-grant', 'Your identity is known, but no role has been given to it.');
  if (!mayAtAll(actor, entry)) throw new Refusal('not-permitted', 'None of your roles includes this.');
}

/** Accounts, sessions and invitations are of people: a system has no business there. */
function requireSystemEntry(actor: SiteSystem, entry: (typeof entries)[EndpointName]): void {
  if (entry === 'anyone' || entry === 'signed-in' || !mayAtAll(actor, entry)) {
    throw new Refusal('not-permitted', "A site's system may submit the site's months and follow what becomes of them, nothing else.");
  }
}

export function requireMayAtSite(actor: Actor, action: Action, siteId: string): void {
  if (!mayAtSite(actor, action, siteId)) throw nothingHere();
}

export function requirePerson(actor: Actor): Person {
  if (actor.kind !== 'person') throw new Refusal('not-signed-in', 'Sign in first.');
  return actor;
}

/** Whoever submits: a person or a site's system. */
export interface Submitter {
  readonly id: string;
  readonly name: string;
}

export function requireSubmitter(actor: Actor): Submitter {
  if (actor.kind === 'site-system') return { id: actor.systemId, name: actor.label };
  const { accountId, name } = requirePerson(actor);
  return { id: accountId, name };
}

export function requireFound<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw nothingHere();
  return value;
}
