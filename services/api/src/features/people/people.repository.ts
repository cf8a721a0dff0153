import type { Invitation, Person, Role, Site } from '@cairnstep/contract';
import type { z } from 'zod';
import type { Tx } from '../../database/as-actor.ts';
import { grantColumns, presentGrant, type GrantRecord } from '../account/grants.repository.ts';
import { readSite } from './sites.repository.ts';

type PersonOut = z.output<typeof Person>;
type InvitationOut = z.output<typeof Invitation>;

interface AccountRecord {
  readonly id: string;
  readonly name: string;
  readonly email: string | null;
  readonly institution: string | null;
  readonly status: 'active' | 'disabled';
  readonly last_sign_in_at: Date | null;
}

/** Everyone, or one person; with every grant that has not ended. */
async function selectPeople(tx: Tx, personId: string | null): Promise<PersonOut[]> {
  const accounts = (await tx.query(
    'select id, name, email, institution, status, last_sign_in_at from accounts where $1::uuid is null or id = $1 order by name, id',
    [personId],
  )) as AccountRecord[];
  const grants = (await tx.query(
    `select g.account_id, ${grantColumns} from grants g left join sites s on s.id = g.site_id
      where ($1::uuid is null or g.account_id = $1) and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date)
      order by g.starts_on, g.id`,
    [personId],
  )) as (GrantRecord & { account_id: string })[];
  return accounts.map((account) => ({
    id: account.id,
    name: account.name,
    email: account.email,
    institution: account.institution,
    status: account.status,
    lastSignInAt: account.last_sign_in_at?.toISOString() ?? null,
    grants: grants.filter((grant) => grant.account_id === account.id).map(presentGrant),
  }));
}

export const listPeople = (tx: Tx): Promise<PersonOut[]> => selectPeople(tx, null);
export const readPerson = async (tx: Tx, id: string): Promise<PersonOut | null> => (await selectPeople(tx, id))[0] ?? null;

interface InvitationRecord {
  readonly id: string;
  readonly email: string;
  readonly role: Role;
  readonly status: InvitationOut['status'];
  readonly expires_at: Date;
  readonly site_id: string | null;
  readonly code: string | null;
  readonly site_name: string | null;
}

async function selectInvitations(tx: Tx, id: string | null): Promise<InvitationOut[]> {
  const rows = (await tx.query(
    `select i.id, i.email, i.role, i.expires_at, s.id as site_id, s.code, s.name as site_name,
            case when i.revoked_at is not null then 'revoked' when i.accepted_at is not null then 'accepted'
                 when i.expires_at <= now() then 'expired' else 'sent' end as status
       from invitations i left join sites s on s.id = i.site_id
      where $1::uuid is null or i.id = $1 order by i.created_at desc limit 200`,
    [id],
  )) as InvitationRecord[];
  return rows.map((row) => {
    const site: Site | null =
      row.site_id !== null && row.code !== null && row.site_name !== null ? { id: row.site_id, code: row.code, name: row.site_name } : null;
    return { id: row.id, email: row.email, role: row.role, site, status: row.status, expiresAt: row.expires_at.toISOString() };
  });
}

export const listInvitations = (tx: Tx): Promise<InvitationOut[]> => selectInvitations(tx, null);
export const readInvitation = async (tx: Tx, id: string): Promise<InvitationOut | null> => (await selectInvitations(tx, id))[0] ?? null;

export const siteName = async (tx: Tx, id: string): Promise<string | null> => (await readSite(tx, id))?.name ?? null;

export interface NewInvitation {
  readonly id: string;
  readonly email: string;
  readonly role: Role;
  readonly siteId: string | null;
  readonly grantEndsOn: string | null;
  readonly tokenHash: string;
  readonly invitedBy: string;
  readonly expiresAt: Date;
}

export async function insertInvitation(tx: Tx, invitation: NewInvitation): Promise<void> {
  await tx.query(
    'insert into invitations (id, email, role, site_id, grant_ends_on, token_hash, invited_by, expires_at) values ($1, $2, $3, $4, $5, $6, $7, $8)',
    [
      invitation.id,
      invitation.email,
      invitation.role,
      invitation.siteId,
      invitation.grantEndsOn,
      invitation.tokenHash,
      invitation.invitedBy,
      invitation.expiresAt,
    ],
  );
}

export const markRevoked = (tx: Tx, id: string): Promise<unknown> =>
  tx.query('update invitations set revoked_at = now() where id = $1', [id]);

export interface NewGrant {
  readonly id: string;
  readonly personId: string;
  readonly role: Role;
  readonly siteId: string | null;
  readonly startsOn: string;
  readonly endsOn: string | null;
  readonly givenBy: string | null;
}

export async function insertGrant(tx: Tx, grant: NewGrant): Promise<void> {
  await tx.query('insert into grants (id, account_id, role, site_id, starts_on, ends_on, given_by) values ($1, $2, $3, $4, $5, $6, $7)', [
    grant.id,
    grant.personId,
    grant.role,
    grant.siteId,
    grant.startsOn,
    grant.endsOn,
    grant.givenBy,
  ]);
}

/** Two administrators who give one person roles at once do it one after the other. */
export const lockGrantsOf = (tx: Tx, personId: string): Promise<unknown> =>
  tx.query('select pg_advisory_xact_lock(hashtext($1))', [`grants ${personId}`]);

/** Whether the person holds the same role, for the same site, on any day of this time. */
export async function holdsAlready(
  tx: Tx,
  grant: Pick<NewGrant, 'personId' | 'role' | 'siteId' | 'startsOn' | 'endsOn'>,
): Promise<boolean> {
  const [{ held }] = (await tx.query(
    `select exists (select from grants where account_id = $1 and role = $2 and site_id is not distinct from $3::uuid
       and starts_on <= coalesce($5::date, 'infinity') and coalesce(ends_on, 'infinity') >= greatest(starts_on, $4::date)) as held`,
    [grant.personId, grant.role, grant.siteId, grant.startsOn, grant.endsOn],
  )) as [{ held: boolean }];
  return held;
}

export const accountsWithAddress = async (tx: Tx, email: string): Promise<{ id: string; name: string }[]> =>
  (await tx.query('select id, name from accounts where lower(email) = lower($1) order by name, id', [email])) as {
    id: string;
    name: string;
  }[];

/** A grant's last day becomes yesterday: it gives nothing from the next request on. False when there is no such grant in force or to come. */
export async function stopGrant(tx: Tx, personId: string, grantId: string): Promise<boolean> {
  const [, count] = (await tx.query(
    `update grants set ends_on = (now() at time zone 'UTC')::date - 1
      where id = $1 and account_id = $2 and (ends_on is null or ends_on >= (now() at time zone 'UTC')::date)`,
    [grantId, personId],
  )) as [unknown, number];
  return count > 0;
}

export const updateStatus = (tx: Tx, personId: string, status: 'active' | 'disabled'): Promise<unknown> =>
  tx.query('update accounts set status = $2 where id = $1', [personId, status]);
