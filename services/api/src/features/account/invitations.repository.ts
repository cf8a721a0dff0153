/** Invitations by the hash of their token. */
import { createHash } from 'node:crypto';
import type { Role, Site } from '@cairnstep/contract';
import type { Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';

export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');

const unusable = () => new Refusal('invitation-unusable', 'It was used, taken back, or has expired. Ask whoever invited you for a new one.');

interface OpenInvitation {
  readonly id: string;
  readonly role: Role;
  readonly site_id: string | null;
  readonly code: string | null;
  readonly site_name: string | null;
  readonly grant_ends_on: string | null;
  readonly expires_at: Date;
}

const openInvitation = `select i.id, i.role, i.site_id, s.code, s.name as site_name, i.grant_ends_on::text, i.expires_at
  from invitations i left join sites s on s.id = i.site_id
 where i.token_hash = $1 and i.accepted_at is null and i.revoked_at is null and i.expires_at > now()`;

export async function readOffer(tx: Tx, token: string): Promise<{ role: Role; site: Site | null; expiresAt: string }> {
  const [found] = (await tx.query(openInvitation, [hashToken(token)])) as OpenInvitation[];
  if (!found) throw unusable();
  const site = found.site_id !== null && found.code !== null && found.site_name !== null ? { id: found.site_id, code: found.code, name: found.site_name } : null;
  return { role: found.role, site, expiresAt: found.expires_at.toISOString() };
}

/** Locks and uses the invitation up: of two people with one link, one gets it. */
export async function useInvitation(tx: Tx, token: string, accountId: string): Promise<OpenInvitation> {
  const [found] = (await tx.query(`${openInvitation} for update of i`, [hashToken(token)])) as OpenInvitation[];
  if (!found) throw unusable();
  await tx.query('update invitations set accepted_at = now(), accepted_by = $2 where id = $1', [found.id, accountId]);
  return found;
}
