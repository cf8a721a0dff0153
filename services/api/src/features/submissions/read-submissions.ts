/** Reading submissions, months, findings and receipts. */
import type { InputOf, ResponseOf, Submission, SubmissionReceipt } from '@cairnstep/contract';
import type {
  getReceipt as GetReceipt,
  getSubmission as GetSubmission,
  listFindings as ListFindings,
  listSubmissions as ListSubmissions,
} from '@cairnstep/contract';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { presentSubmission } from './submission.present.ts';
import { listFindings, listSubmissions, readFiles, readSubmission, type SubmissionRecord } from './submissions.repository.ts';

const linesPerPage = 50;

export async function visibleSubmission(tx: Tx, actor: Actor, id: string): Promise<SubmissionRecord> {
  const submission = requireFound(await readSubmission(tx, id));
  requireMayAtSite(actor, 'see-submissions', submission.siteId);
  return submission;
}

export const present = async (tx: Tx, id: string): Promise<Submission> =>
  presentSubmission(requireFound(await readSubmission(tx, id)), await readFiles(tx, id));

export const getSubmission = ({ database }: Context, actor: Actor, { submissionId }: InputOf<typeof GetSubmission>): Promise<Submission> =>
  asActor(database, actor, async (tx) =>
    presentSubmission(await visibleSubmission(tx, actor, submissionId), await readFiles(tx, submissionId)),
  );

export const getReceipt = ({ database }: Context, actor: Actor, { submissionId }: InputOf<typeof GetReceipt>): Promise<SubmissionReceipt> =>
  asActor(database, actor, async (tx) => requireFound((await visibleSubmission(tx, actor, submissionId)).receipt));

export const listSubmissionsOfSite = (
  { database }: Context,
  actor: Actor,
  { siteId, page }: InputOf<typeof ListSubmissions>,
): Promise<ResponseOf<typeof ListSubmissions>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-submissions', siteId);
    const { items, total } = await listSubmissions(tx, siteId, linesPerPage, (page - 1) * linesPerPage);
    return {
      items: items.map((item) => ({ ...item, createdAt: item.createdAt.toISOString(), settledAt: item.settledAt?.toISOString() ?? null })),
      page,
      pageSize: linesPerPage,
      total,
    };
  });

export const listSubmissionFindings = (
  { database }: Context,
  actor: Actor,
  input: InputOf<typeof ListFindings>,
): Promise<ResponseOf<typeof ListFindings>> =>
  asActor(database, actor, async (tx) => {
    await visibleSubmission(tx, actor, input.submissionId);
    const { items, total } = await listFindings(tx, input.submissionId, input, linesPerPage, (input.page - 1) * linesPerPage);
    return { items, page: input.page, pageSize: linesPerPage, total };
  });
