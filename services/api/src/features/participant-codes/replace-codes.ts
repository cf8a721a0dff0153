/**
 * Puts new participant codes in the place of old ones: after a site has changed its key, or has found two codes to be one person's. One
 * transaction under the site's lock, for which commits of the site wait: either every row, its history and the facts have the new codes, or
 * nothing has changed.
 */
import { tableKeys } from '@cairnstep/dictionary';
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { replaceCodes as ReplaceCodes } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireMayAtSite, requireSubmitter } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { joinWholeTables } from '../../database/join-whole-tables.ts';
import { Refusal } from '../../http/refusal.ts';
import { lockSite } from '../people/sites.repository.ts';
import { refreshFacts } from '../submissions/apply-changes.ts';
import { reopen } from '../submissions/submissions.repository.ts';
import { requireClearPairs } from './clear-pairs.ts';
import {
  countCollisions,
  dropEqualRows,
  findCodes,
  keepReplaced,
  replaceIn,
  replaceInHistory,
  stagePairs,
  submissionsInCheck,
} from './replaced-codes.repository.ts';

export const replaceCodes = (
  { database, clock }: Context,
  actor: Actor,
  { siteId, codes }: InputOf<typeof ReplaceCodes>,
  requestId: string,
): Promise<ResponseOf<typeof ReplaceCodes>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'submit', siteId);
    requireClearPairs(codes);
    await lockSite(tx, siteId);
    await stagePairs(tx, codes);
    const { known, joining } = await findCodes(tx, siteId);
    await joinWholeTables(tx);
    if (joining.length > 0) await joinRows(tx, siteId, joining);
    let rows = 0;
    for (const table of tableKeys) rows += await replaceIn(tx, table, siteId);
    const earlierValues = await replaceInHistory(tx, siteId, codes);
    await keepReplaced(tx, siteId, requireSubmitter(actor).id, clock());
    if (rows > 0) {
      const touched = new Set(known);
      const people = codes.flatMap(({ from, to }) => (touched.has(from) ? [from, to] : []));
      await refreshFacts(tx, siteId, people);
    }
    // A check under way reads its files against the codes as they were.
    for (const id of await submissionsInCheck(tx, siteId)) await reopen(tx, id);
    // A preview made before compares with codes that are no more.
    await tx.query('update sites set revision = revision + 1 where id = $1', [siteId]);
    const outcome = { replaced: known.length, unknown: codes.length - known.length, joined: joining.length, rows, earlierValues };
    await recordAudit(tx, actor, { act: 'codes.replace', object: siteId, site: siteId, requestId, detail: outcome });
    return outcome;
  });

/** Two codes of one person: what both say stays once; where they contradict each other nobody here can tell which is right. */
async function joinRows(tx: Tx, siteId: string, joining: readonly string[]): Promise<void> {
  const collisions: string[] = [];
  for (const table of tableKeys) {
    const count = await countCollisions(tx, table, siteId, joining);
    if (count > 0) collisions.push(`${count} in ${table}`);
  }
  if (collisions.length > 0) {
    throw new Refusal(
      'codes-collide',
      `Rows of codes that are to become one have the same day and number, but do not say the same: ${collisions.join(', ')}. Nothing was changed. Correct the months of one of the codes, then send the codes again.`,
    );
  }
  for (const table of tableKeys) await dropEqualRows(tx, table, siteId, joining);
}
