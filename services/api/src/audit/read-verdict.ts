import type { Tx } from '../database/as-actor.ts';
import { verifyChain, type ChainEntry, type ChainVerdict } from './chain.ts';

/** Recomputes the whole chain as the actor of this transaction sees it (a steward or the registry sees all of it). */
export async function readVerdict(tx: Tx): Promise<ChainVerdict> {
  const rows = (await tx.query('select seq, event, prev, hash from audit_entries order by seq')) as { seq: string; event: string; prev: string; hash: string }[];
  return verifyChain(rows.map((row): ChainEntry => ({ ...row, seq: Number(row.seq) })));
}
