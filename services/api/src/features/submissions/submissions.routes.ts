import type { Context } from '../../context.ts';
import { route, type Route } from '../../http/route.ts';
import { acknowledgeFindings } from './acknowledge-findings.ts';
import { commitSubmission } from './commit-submission.ts';
import { discardSubmission } from './discard-submission.ts';
import { listChanges } from './list-changes.ts';
import { openSubmission } from './open-submission.ts';
import { putSubmissionFile, removeSubmissionFile } from './put-submission-file.ts';
import { getReceipt, getSubmission, listSubmissionFindings, listSubmissionsOfSite } from './read-submissions.ts';
import { requestCheck } from './request-check.ts';

export const submissionRoutes = (context: Context): Route[] => [
  route('listSubmissions', (actor, input) => listSubmissionsOfSite(context, actor, input)),
  route('openSubmission', (actor, input, { requestId }) => openSubmission(context, actor, input, requestId)),
  route('getSubmission', (actor, input) => getSubmission(context, actor, input)),
  route('putSubmissionFile', (actor, input, facts) => putSubmissionFile(context, actor, input, facts)),
  route('removeSubmissionFile', (actor, input, { requestId }) => removeSubmissionFile(context, actor, input, requestId)),
  route('checkSubmission', (actor, input, { requestId }) => requestCheck(context, actor, input, requestId)),
  route('listFindings', (actor, input) => listSubmissionFindings(context, actor, input)),
  route('acknowledgeFindings', (actor, input, { requestId }) => acknowledgeFindings(context, actor, input, requestId)),
  route('listChanges', (actor, input) => listChanges(context, actor, input)),
  route('commitSubmission', (actor, input, { requestId }) => commitSubmission(context, actor, input, requestId)),
  route('getReceipt', (actor, input) => getReceipt(context, actor, input)),
  route('discardSubmission', (actor, input, { requestId }) => discardSubmission(context, actor, input, requestId)),
];
