/** Accounts as sign-in needs them. Identity is (issuer, subject); e-mail is contact data only. */
import { randomUUID } from 'node:crypto';
import type { Role } from '@cairnstep/contract';
import type { ActiveGrant } from '../../authority/actor.ts';
import type { Tx } from '../../database/as-actor.ts';

export interface Identity {
  readonly issuer: string;
  readonly subject: string;
  readonly name: string;
  readonly email: string | null;
}

/** Finds or creates the account of an identity and notes the sign-in. Null when the account is disabled. */
export async function accountOf(tx: Tx, identity: Identity): Promise<string | null> {
  const rows = (await tx.query(
    `insert into accounts (id, issuer, subject, name, email, last_sign_in_at) values ($1, $2, $3, $4, $5, now())
     on conflict (issuer, subject) do update set name = excluded.name, email = coalesce(excluded.email, accounts.email), last_sign_in_at = now()
     returning id, status`,
    [randomUUID(), identity.issuer, identity.subject, identity.name, identity.email],
  )) as { id: string; status: string }[];
  const account = rows[0];
  return account && account.status === 'active' ? account.id : null;
}

export interface SignedInAccount {
  readonly name: string;
  readonly institution: string | null;
  readonly status: string;
  readonly grants: readonly ActiveGrant[];
}

/** Read at each request: a change of grants takes effect at once. Days count in UTC by the database's clock. */
export async function readAccount(tx: Tx, accountId: string): Promise<SignedInAccount | null> {
  const rows = (await tx.query(
    `select a.name, a.institution, a.status, g.id, g.role, g.site_id
       from accounts a
       left join grants g on g.account_id = a.id
        and g.starts_on <= (now() at time zone 'UTC')::date and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date)
      where a.id = $1
      order by g.starts_on, g.id`,
    [accountId],
  )) as { name: string; institution: string | null; status: string; id: string | null; role: Role; site_id: string | null }[];
  const first = rows[0];
  if (!first) return null;
  const grants = rows.flatMap((row) => (row.id === null ? [] : [{ id: row.id, role: row.role, siteId: row.site_id }]));
  return { name: first.name, institution: first.institution, status: first.status, grants };
}
