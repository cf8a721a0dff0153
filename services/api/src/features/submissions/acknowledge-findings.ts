/** Somebody says why warnings stand. */
import type { InputOf, Submission } from '@cairnstep/contract';
import type { acknowledgeFindings as Acknowledge } from '@cairnstep/contract';
import { detectIdentifiers } from '@cairnstep/deidentification';
import type { Canonical } from '../../audit/canonical-json.ts';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { present } from './read-submissions.ts';
import { listFindings, setFindingGroups } from './submissions.repository.ts';

/** The rule about what might identify a person. */
const mightIdentify = 'F51';
/** A file has no more columns. */
const mostColumns = 500;

/** A reason explains numbers; it stays with the receipt, so nobody's name may stand in it. */
function refuseIdentifying(reason: string): void {
  const found = detectIdentifiers({ headers: ['reason'], rows: [[reason]] }, { roles: new Map([['reason', 'text']]) });
  if (found.some(({ strength }) => strength === 'block'))
    throw new Refusal('identifies-somebody', 'Say why the warning stands without names, dates or numbers of people. Nothing was kept.');
}

/** Who lets stay what might identify somebody does so column by column: each with what it seems to be and how often. */
async function columnsLetStay(tx: Tx, submissionId: string): Promise<Canonical> {
  const { items } = await listFindings(tx, submissionId, { rule: mightIdentify }, mostColumns, 0);
  return items.map(({ table, column, found }) => ({ table, column, found }));
}

/** The reason stays with the submission and its receipt; the log says only that one was given, for the words are the clinic's. */
export const acknowledgeFindings = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId, rule, reason }: InputOf<typeof Acknowledge>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    const group = requireFound(submission.findings.find((one) => one.rule === rule && one.severity === 'warning'));
    refuseIdentifying(reason);
    await setFindingGroups(
      tx,
      submissionId,
      submission.findings.map((one) => (one === group ? { ...one, acknowledgedReason: reason } : one)),
    );
    await recordAudit(tx, actor, {
      act: 'submission.acknowledge',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: { rule, count: group.count, ...(rule === mightIdentify ? { columns: await columnsLetStay(tx, submissionId) } : {}) },
    });
    return present(tx, submissionId);
  });
