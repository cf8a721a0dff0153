/** The one grant that no administrator gives, because there is none yet. It goes through the registry's own audit log. */
import { randomUUID } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { recordAudit } from '../../services/api/src/audit/record-audit.ts';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { StartError } from '../start/start-error.ts';

export interface Identity {
  /** The provider's issuer address. */
  readonly issuer: string;
  /** What the provider calls the person. */
  readonly subject: string;
}

/** Any number of its own: two appointments at once must not both find the post vacant. */
const advisoryLock = 5_209_772;

/** @throws StartError when the registry has an administrator, or nobody with this identity has signed in */
export async function appointFirstAdministrator(database: DataSource, { issuer, subject }: Identity): Promise<void> {
  await asActor(database, registry, async (tx) => {
    await tx.query('select pg_advisory_xact_lock($1)', [advisoryLock]);
    const [post] = (await tx.query(
      `select exists (select from grants g join accounts a on a.id = g.account_id
        where g.role = 'administrator' and a.status = 'active' and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date)) as taken`,
    )) as [{ taken: boolean }];
    if (post.taken) throw new StartError('The registry has an administrator already, who invites people on screen.');
    const [account] = (await tx.query(`select id from accounts where issuer = $1 and subject = $2 and status = 'active'`, [
      issuer,
      subject,
    ])) as { id: string }[];
    if (account === undefined)
      throw new StartError('Nobody with this issuer and subject has signed in yet. Let the person sign in once, then run this again.');
    await tx.query(
      `insert into grants (id, account_id, role, starts_on) values ($1, $2, 'administrator', (now() at time zone 'UTC')::date)`,
      [randomUUID(), account.id],
    );
    await recordAudit(tx, registry, { act: 'grant.first-administrator', object: account.id });
  });
}
