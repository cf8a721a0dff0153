/**
 * The only way to the tables. Opens the transaction and tells PostgreSQL whom it serves, so that row-level security decides again.
 * The login role inherits nothing and owns nothing: a query outside fails instead of leaking.
 */
import type { DataSource, EntityManager } from 'typeorm';
import { sitesOf, type Actor } from '../authority/actor.ts';

export type Tx = EntityManager;

const scopeOf = (actor: Actor) => ({
  account: actor.kind === 'person' ? actor.accountId : '',
  roles:
    actor.kind === 'person' ? [...new Set(actor.grants.map((grant) => grant.role))].join(',') : actor.kind === 'system' ? actor.part : '',
  reads: actor.kind === 'site-system' ? actor.siteId : sitesOf(actor, 'therapist', 'coordinator').join(','),
  writes: actor.kind === 'site-system' ? actor.siteId : sitesOf(actor, 'coordinator').join(','),
});

const scopeQuery = `select set_config('role', 'cairnstep_app', true), set_config('cairnstep.account', $1, true),
  set_config('cairnstep.roles', $2, true), set_config('cairnstep.reads', $3, true), set_config('cairnstep.writes', $4, true)`;

/** `one-moment`: every statement sees the registry as it was at the first (repeatable read). */
export type View = 'each-statement' | 'one-moment';

export async function asActor<T>(
  database: DataSource,
  actor: Actor,
  work: (tx: Tx) => Promise<T>,
  view: View = 'each-statement',
): Promise<T> {
  return database.transaction(view === 'one-moment' ? 'REPEATABLE READ' : 'READ COMMITTED', async (tx) => {
    const scope = scopeOf(actor);
    await tx.query(scopeQuery, [scope.account, scope.roles, scope.reads, scope.writes]);
    return work(tx);
  });
}
