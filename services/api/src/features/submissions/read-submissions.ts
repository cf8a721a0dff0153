/** Reading submissions, months, findings and receipts. */
import type { InputOf, ResponseOf, Submission, SubmissionReceipt } from '@cairnstep/contract';
import type {
  getReceipt as GetReceipt,
  getSubmission as GetSubmission,
  listFindings as ListFindings,
  listMonths as ListMonths,
  listSubmissions as ListSubmissions,
} from '@cairnstep/contract';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { readSite } from '../people/sites.repository.ts';
import { dueOn, monthOf, monthsBetween } from './months.ts';
import { presentSubmission } from './submission.present.ts';
import { listFindings, listSubmissions, readFiles, readMonths, readSubmission, type SubmissionRecord } from './submissions.repository.ts';

const linesPerPage = 50;

export async function visibleSubmission(tx: Tx, actor: Actor, id: string): Promise<SubmissionRecord> {
  const submission = requireFound(await readSubmission(tx, id));
  requireMayAtSite(actor, 'see-site-rows', submission.siteId);
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

export const listMonths = (
  { database, clock }: Context,
  actor: Actor,
  { siteId }: InputOf<typeof ListMonths>,
): Promise<ResponseOf<typeof ListMonths>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-site-rows', siteId);
    const { id, code, name, firstMonth } = requireFound(await readSite(tx, siteId));
    const now = clock();
    const today = now.toISOString().slice(0, 10);
    const lines = new Map((await readMonths(tx, siteId)).map((line) => [line.month, line]));
    const months = monthsBetween(firstMonth, monthOf(now)).map((month) => {
      const line = lines.get(month);
      const state = line?.unsettled
        ? ('in-progress' as const)
        : line?.accepted
          ? ('accepted' as const)
          : month >= monthOf(now)
            ? ('not-yet-due' as const)
            : today > dueOn(month)
              ? ('overdue' as const)
              : ('due' as const);
      return {
        month,
        state,
        dueOn: dueOn(month),
        submissionId: line?.unsettled ?? line?.accepted ?? null,
        acceptedAt: line?.acceptedAt?.toISOString() ?? null,
        rows: line?.rows ?? null,
      };
    });
    return { site: { id, code, name }, months: months.reverse() };
  });

export const listSubmissionsOfSite = (
  { database }: Context,
  actor: Actor,
  { siteId, page }: InputOf<typeof ListSubmissions>,
): Promise<ResponseOf<typeof ListSubmissions>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-site-rows', siteId);
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
