/** Writes one audit entry in the caller's transaction: no entry, no act. Never a participant's value, a name, an address or a token. */
import type { Actor } from '../authority/actor.ts';
import type { Tx } from '../database/as-actor.ts';
import { canonicalJson, type Canonical } from './canonical-json.ts';
import { chainHash } from './chain.ts';

export interface AuditEvent {
  readonly act: string;
  readonly object?: string;
  readonly site?: string;
  readonly result?: 'ok' | 'refused' | 'failed';
  readonly reason?: string;
  readonly requestId?: string;
  /** Counts, versions, digests. */
  readonly detail?: { readonly [key: string]: Canonical };
}

function rolesOf(actor: Actor): string {
  if (actor.kind === 'person') return [...new Set(actor.grants.map((grant) => grant.role))].sort().join(' ');
  return actor.kind === 'nobody' ? '' : actor.kind;
}

function nameOf(actor: Actor): string {
  if (actor.kind === 'person') return actor.accountId;
  return actor.kind === 'site-system' ? actor.systemId : actor.kind;
}

/**
 * `audit_head()` takes the one lock that serialises writers until the transaction ends, so the chain cannot fork.
 * Call it late in the transaction: everyone else's act waits behind it.
 */
export async function recordAudit(tx: Tx, actor: Actor, event: AuditEvent): Promise<void> {
  const [head] = (await tx.query(
    'select seq, hash, to_char(at at time zone \'UTC\', \'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"\') as at from audit_head()',
  )) as [{ seq: string; hash: string; at: string }];
  const seq = Number(head.seq) + 1;
  const who = nameOf(actor);
  const full: { [key: string]: Canonical } = {
    seq,
    at: head.at,
    actor: who,
    role: rolesOf(actor),
    act: event.act,
    result: event.result ?? 'ok',
  };
  if (event.object !== undefined) full['object'] = event.object;
  if (event.site !== undefined) full['site'] = event.site;
  if (event.reason !== undefined) full['reason'] = event.reason;
  if (event.requestId !== undefined) full['request'] = event.requestId;
  if (event.detail !== undefined) full['detail'] = event.detail;
  const text = canonicalJson(full);
  await tx.query(
    'insert into audit_entries (seq, at, actor, role, act, object, result, event, prev, hash) values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10)',
    [seq, head.at, who, rolesOf(actor), event.act, event.object ?? null, event.result ?? 'ok', text, head.hash, chainHash(head.hash, text)],
  );
}
