import type { Context } from '../../context.ts';
import { route, type Route } from '../../http/route.ts';
import { acknowledgeFindings } from './acknowledge-findings.ts';
import { commitSubmission } from './commit-submission.ts';
import { discardSubmission } from './discard-submission.ts';
import { downloadFindings, downloadFindingsWorkbook } from './download-findings.ts';
import { listChanges } from './list-changes.ts';
import { mendCells } from './mend-cells.ts';
import { openSubmission } from './open-submission.ts';
import { putSubmissionFile, putSubmissionWorkbook, removeSubmissionFile, removeSubmissionWorkbook } from './put-submission-file.ts';
import { getReceipt, getSubmission, listSubmissionFindings, listSubmissionsOfSite } from './read-submissions.ts';
import { requestCheck } from './request-check.ts';
import { listSafeHeaders, markSafeHeader, unmarkSafeHeader } from './safe-headers.ts';
import { getTemplate, listParticipantCodes } from './template.ts';

export const submissionRoutes = (context: Context): Route[] => [
  route('listSubmissions', (actor, input) => listSubmissionsOfSite(context, actor, input)),
  route('openSubmission', (actor, input, { requestId }) => openSubmission(context, actor, input, requestId)),
  route('getSubmission', (actor, input) => getSubmission(context, actor, input)),
  route('putSubmissionFile', (actor, input, facts) => putSubmissionFile(context, actor, input, facts)),
  route('removeSubmissionFile', (actor, input, { requestId }) => removeSubmissionFile(context, actor, input, requestId)),
  route('putSubmissionWorkbook', (actor, input, facts) => putSubmissionWorkbook(context, actor, input, facts)),
  route('removeSubmissionWorkbook', (actor, input, { requestId }) => removeSubmissionWorkbook(context, actor, input, requestId)),
  route('mendCells', (actor, input, { requestId }) => mendCells(context, actor, input, requestId)),
  route('checkSubmission', (actor, input, { requestId }) => requestCheck(context, actor, input, requestId)),
  route('listFindings', (actor, input) => listSubmissionFindings(context, actor, input)),
  route('downloadFindings', (actor, input) => downloadFindings(context, actor, input)),
  route('downloadFindingsWorkbook', (actor, input) => downloadFindingsWorkbook(context, actor, input)),
  route('acknowledgeFindings', (actor, input, { requestId }) => acknowledgeFindings(context, actor, input, requestId)),
  route('listChanges', (actor, input) => listChanges(context, actor, input)),
  route('commitSubmission', (actor, input, { requestId }) => commitSubmission(context, actor, input, requestId)),
  route('getReceipt', (actor, input) => getReceipt(context, actor, input)),
  route('discardSubmission', (actor, input, { requestId }) => discardSubmission(context, actor, input, requestId)),
  route('getTemplate', (actor, input) => getTemplate(context, actor, input)),
  route('listParticipantCodes', (actor, input) => listParticipantCodes(context, actor, input)),
  route('listSafeHeaders', (actor, input) => listSafeHeaders(context, actor, input)),
  route('markSafeHeader', (actor, input, { requestId }) => markSafeHeader(context, actor, input, requestId)),
  route('unmarkSafeHeader', (actor, input, { requestId }) => unmarkSafeHeader(context, actor, input, requestId)),
];
