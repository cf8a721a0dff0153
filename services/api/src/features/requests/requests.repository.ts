/** The only file that knows the tables of access requests. Row-level security decides which requests an actor reaches. */
import { createHash, randomUUID } from 'node:crypto';
import type { RequestForm } from '@cairnstep/contract';
import type { z } from 'zod';
import { canonicalJson, type Canonical } from '../../audit/canonical-json.ts';
import type { Tx } from '../../database/as-actor.ts';

export type Form = z.output<typeof RequestForm>;
export type Status = 'draft' | 'submitted' | 'in_review' | 'approved' | 'declined' | 'withdrawn' | 'ended';

export interface RequestRecord {
  readonly id: string;
  readonly number: string;
  readonly status: Status;
  readonly version: number;
  readonly versionHash: string;
  readonly leadId: string;
  readonly lead: string;
  readonly institution: string | null;
  readonly form: Form;
  readonly createdAt: Date;
  readonly updatedAt: Date;
  readonly submittedAt: Date | null;
  readonly decidedAt: Date | null;
  readonly accessEndsOn: string | null;
  readonly votesNeeded: number;
  readonly votesNeededBecause: readonly string[];
  readonly releaseNumber: number | null;
}

export interface VoteRecord {
  readonly stewardId: string;
  readonly steward: string;
  readonly vote: 'approve' | 'decline';
  readonly reason: string;
  readonly votedAt: Date;
}

export const hashVersion = (number: string, version: number, form: Form): string =>
  createHash('sha256')
    .update(canonicalJson({ number, version, form: form as unknown as Canonical }))
    .digest('hex');

// An approved request whose last day has passed has ended, whether or not anything noted it (days in UTC by the database's clock).
const columns = `r.id, r.number, r.version, r.version_hash as "versionHash", r.lead_id as "leadId", coalesce(account_name(r.lead_id), 'a former colleague') as lead,
  account_institution(r.lead_id) as institution, r.form, r.created_at as "createdAt", r.updated_at as "updatedAt", r.submitted_at as "submittedAt",
  r.decided_at as "decidedAt", r.access_ends_on::text as "accessEndsOn", r.votes_needed as "votesNeeded", r.votes_needed_because as "votesNeededBecause",
  r.release_number as "releaseNumber",
  case when r.status = 'approved' and r.access_ends_on < (now() at time zone 'UTC')::date then 'ended' else r.status end as status`;

export async function readRequest(tx: Tx, id: string): Promise<RequestRecord | null> {
  const [row] = (await tx.query(`select ${columns} from access_requests r where r.id = $1`, [id])) as RequestRecord[];
  return row ?? null;
}

export async function lockRequest(tx: Tx, id: string): Promise<RequestRecord | null> {
  const [row] = (await tx.query(`select ${columns} from access_requests r where r.id = $1 for update of r`, [id])) as RequestRecord[];
  return row ?? null;
}

export const listRequests = async (tx: Tx): Promise<RequestRecord[]> =>
  (await tx.query(`select ${columns} from access_requests r order by r.updated_at desc limit 500`)) as RequestRecord[];

/** Numbers run per year: AR-2026-0007. The last one is free again when its draft is deleted. */
export async function insertRequest(tx: Tx, leadId: string, form: Form, year: number): Promise<string> {
  await tx.query("select pg_advisory_xact_lock(hashtext('access-request-number'))");
  const [{ next }] = (await tx.query('select next_request_number($1) as next', [`AR-${year}-`])) as [{ next: string }];
  const id = randomUUID();
  await tx.query(
    "insert into access_requests (id, number, status, lead_id, form, version_hash, votes_needed_because) values ($1, $2, 'draft', $3, $4, $5, '[]')",
    [id, next, leadId, JSON.stringify(form), hashVersion(next, 1, form)],
  );
  return id;
}

export const updateForm = (tx: Tx, request: RequestRecord, form: Form): Promise<unknown> =>
  tx.query('update access_requests set form = $2, version_hash = $3, updated_at = now() where id = $1', [
    request.id,
    JSON.stringify(form),
    hashVersion(request.number, request.version, form),
  ]);

/** Only drafts can be deleted; the policy of the table sees to it as well. */
export const deleteRequest = (tx: Tx, id: string): Promise<unknown> => tx.query('delete from access_requests where id = $1', [id]);

export const setStatus = (tx: Tx, id: string, status: Status): Promise<unknown> =>
  tx.query('update access_requests set status = $2, updated_at = now() where id = $1', [id, status]);

export async function markSubmitted(tx: Tx, id: string, votesNeeded: number, because: readonly string[]): Promise<void> {
  await tx.query(
    "update access_requests set status = 'submitted', submitted_at = now(), updated_at = now(), votes_needed = $2, votes_needed_because = $3 where id = $1",
    [id, votesNeeded, JSON.stringify(because)],
  );
}

export const requireVotes = (tx: Tx, id: string, votesNeeded: number, because: readonly string[]): Promise<unknown> =>
  tx.query('update access_requests set votes_needed = $2, votes_needed_because = $3, updated_at = now() where id = $1', [
    id,
    votesNeeded,
    JSON.stringify(because),
  ]);

/** Access runs from today for whole months, counted by the database's clock. */
export async function markDecided(
  tx: Tx,
  id: string,
  decision: 'approved' | 'declined',
  months: number,
  release: number | null,
): Promise<void> {
  await tx.query(
    `update access_requests set status = $2, decided_at = now(), updated_at = now(),
       access_ends_on = case when $2 = 'approved' then ((now() at time zone 'UTC')::date + make_interval(months => $3))::date end,
       release_number = case when $2 = 'approved' then $4::int end where id = $1`,
    [id, decision, months, release],
  );
}

export async function replaceMembers(tx: Tx, id: string, members: readonly string[]): Promise<void> {
  await tx.query('delete from access_request_members where request_id = $1', [id]);
  await tx.query('insert into access_request_members (request_id, account_id) select $1, unnest($2::uuid[])', [id, members]);
}

export async function isTeamMember(tx: Tx, requestId: string): Promise<boolean> {
  const [{ member }] = (await tx.query('select actor_is_member($1) as member', [requestId])) as [{ member: boolean }];
  return member;
}

export async function readVotes(tx: Tx, request: Pick<RequestRecord, 'id' | 'version'>): Promise<VoteRecord[]> {
  return (await tx.query(
    `select steward_id as "stewardId", coalesce(account_name(steward_id), 'a former steward') as steward, vote, reason, voted_at as "votedAt"
       from access_request_votes where request_id = $1 and version = $2 order by voted_at, steward_id`,
    [request.id, request.version],
  )) as VoteRecord[];
}

export async function insertVote(
  tx: Tx,
  request: RequestRecord,
  stewardId: string,
  vote: 'approve' | 'decline',
  reason: string,
): Promise<void> {
  await tx.query(
    'insert into access_request_votes (request_id, version, steward_id, vote, reason, version_hash) values ($1, $2, $3, $4, $5, $6)',
    [request.id, request.version, stewardId, vote, reason, request.versionHash],
  );
}

/** Addresses of active accounts that have this role today. Run as the registry. */
export async function addressesOfRole(tx: Tx, role: string): Promise<string[]> {
  const rows = (await tx.query(
    `select distinct a.email from accounts a join grants g on g.account_id = a.id
      where g.role = $1 and a.status = 'active' and a.email is not null and g.starts_on <= (now() at time zone 'UTC')::date
        and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date)`,
    [role],
  )) as { email: string }[];
  return rows.map((row) => row.email);
}

/** Contact addresses of accounts, for mail. Run as the registry. */
export async function addressesOf(tx: Tx, accounts: readonly string[]): Promise<string[]> {
  const rows = (await tx.query("select email from accounts where id = any($1::uuid[]) and email is not null and status = 'active'", [
    accounts,
  ])) as { email: string }[];
  return rows.map((row) => row.email);
}

/** Accounts of researchers by contact address; an address nobody or several people have is absent. Run as the registry. */
export async function researchersByAddress(tx: Tx, addresses: readonly string[]): Promise<ReadonlyMap<string, string>> {
  const rows = (await tx.query(
    `select lower(a.email) as email, min(a.id::text) as id from accounts a
      where lower(a.email) = any($1::text[]) and a.status = 'active' and exists (select from grants g where g.account_id = a.id and g.role = 'researcher'
        and g.starts_on <= (now() at time zone 'UTC')::date and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date))
      group by lower(a.email) having count(*) = 1`,
    [addresses.map((address) => address.toLowerCase())],
  )) as { email: string; id: string }[];
  return new Map(rows.map((row) => [row.email, row.id]));
}
