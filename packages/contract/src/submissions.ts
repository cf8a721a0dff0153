/** A month from the clinic: files in, findings, preview, commit, receipt. */
import { tableKeys } from '@cairnstep/dictionary';
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Digest, Id, Instant, Month, Page, pageOf, Site } from './vocabulary.ts';

export const Table = z.enum(tableKeys);

/**
 * `open`: files may come and go. `checking`: the worker reads and checks them. `checked`: findings and a preview exist.
 * `accepted`: committed. `superseded`: a later submission of the same month was accepted. `discarded`: given up by its owner.
 */
export const SubmissionStatus = z.enum(['open', 'checking', 'checked', 'accepted', 'superseded', 'discarded']);

export const SubmissionFile = z.strictObject({
  table: Table,
  fileName: z.string(),
  bytes: z.number().int(),
  sha256: Digest,
  addedAt: Instant,
  /** Known after the check. */
  rows: z.number().int().nullable(),
});

export const Severity = z.enum(['error', 'warning']);

/** One rule's findings together. A warning needs a reason before the month can be committed. */
export const FindingGroup = z.strictObject({
  rule: z.string(),
  severity: Severity,
  statement: z.string(),
  why: z.string(),
  mend: z.string(),
  count: z.number().int(),
  acknowledgedReason: z.string().nullable(),
});

export const Finding = z.strictObject({
  id: z.number().int(),
  rule: z.string(),
  severity: Severity,
  table: Table,
  /** Line of the file as an editor counts it; 1 is the header. Null when the finding is about the whole file. */
  line: z.number().int().nullable(),
  column: z.string().nullable(),
  /** What kind of thing was found and what is expected; never the value of a cell that could identify. */
  found: z.string(),
  mend: z.string(),
});

export const TableChange = z.strictObject({
  table: Table,
  added: z.number().int(),
  changed: z.number().int(),
  unchanged: z.number().int(),
  removed: z.number().int(),
});

export const Submission = z.strictObject({
  id: Id,
  site: Site,
  month: Month,
  status: SubmissionStatus,
  createdAt: Instant,
  createdBy: z.string(),
  settledAt: Instant.nullable(),
  files: z.array(SubmissionFile),
  progress: z.strictObject({ step: z.enum(['read', 'check', 'compare', 'done']), done: z.number(), of: z.number() }).nullable(),
  findings: z.array(FindingGroup),
  /** Present once checked without errors. `digest` binds a commit to just this preview. */
  preview: z.strictObject({ digest: Digest, tables: z.array(TableChange) }).nullable(),
});
export type Submission = z.output<typeof Submission>;

const SubmissionParams = z.strictObject({ submissionId: Id });

export const openSubmission = endpoint({
  method: 'POST',
  path: '/api/submissions',
  summary: 'Open the submission of a month, or return the one already open',
  body: z.strictObject({ siteId: Id, month: Month }),
  response: Submission,
  status: 201,
  problems: ['not-found', 'month-not-open'],
});

export const listSubmissions = endpoint({
  method: 'GET',
  path: '/api/submissions',
  summary: "A site's submissions, newest first",
  query: z.strictObject({ siteId: Id, page: Page }),
  response: pageOf(
    z.strictObject({
      id: Id,
      month: Month,
      status: SubmissionStatus,
      createdAt: Instant,
      createdBy: z.string(),
      settledAt: Instant.nullable(),
      rows: z.number().int().nullable(),
    }),
  ),
  problems: ['not-found'],
});

export const getSubmission = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId',
  summary: 'One submission with its files, findings and preview',
  params: SubmissionParams,
  response: Submission,
  problems: ['not-found'],
});

export const putSubmissionFile = endpoint({
  method: 'PUT',
  path: '/api/submissions/:submissionId/files/:table',
  summary: 'Add or replace the CSV file of one table',
  params: z.strictObject({ submissionId: Id, table: Table }),
  query: z.strictObject({ fileName: z.string().min(1).max(200) }),
  upload: { contentType: 'text/csv' },
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy', 'too-large', 'file-unreadable'],
});

export const removeSubmissionFile = endpoint({
  method: 'DELETE',
  path: '/api/submissions/:submissionId/files/:table',
  summary: 'Take the file of one table out again',
  params: z.strictObject({ submissionId: Id, table: Table }),
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy'],
});

export const checkSubmission = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/check',
  summary: 'Read and check the files in the background',
  params: SubmissionParams,
  body: z.strictObject({}),
  response: Submission,
  status: 202,
  problems: ['not-found', 'submission-closed', 'submission-busy', 'submission-empty'],
});

export const listFindings = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId/findings',
  summary: 'The findings of a submission, by rule, table or severity',
  params: SubmissionParams,
  query: z.strictObject({ rule: z.string().max(40).optional(), table: Table.optional(), severity: Severity.optional(), page: Page }),
  response: pageOf(Finding),
  problems: ['not-found'],
});

export const acknowledgeFindings = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/acknowledgements',
  summary: 'Say why the warnings of one rule stand',
  params: SubmissionParams,
  body: z.strictObject({ rule: z.string().max(40), reason: z.string().trim().min(5, 'Say in a few words why these stand').max(500) }),
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy'],
});

export const ChangeKind = z.enum(['added', 'changed', 'unchanged', 'removed']);

/** A row of the preview: its key, and for each differing column the old and new value. */
export const RowChange = z.strictObject({
  kind: ChangeKind,
  line: z.number().int().nullable(),
  key: z.record(z.string(), z.string()),
  cells: z.array(z.strictObject({ column: z.string(), before: z.string().nullable(), after: z.string().nullable() })),
});

export const listChanges = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId/changes',
  summary: 'What a commit would change, row by row',
  params: SubmissionParams,
  query: z.strictObject({ table: Table, kind: ChangeKind, page: Page }),
  response: pageOf(RowChange),
  problems: ['not-found'],
});

export const SubmissionReceipt = z.strictObject({
  submissionId: Id,
  site: Site,
  month: Month,
  acceptedAt: Instant,
  acceptedBy: z.string(),
  digest: Digest,
  tables: z.array(TableChange),
  files: z.array(z.strictObject({ table: Table, fileName: z.string(), sha256: Digest, rows: z.number().int() })),
  acknowledged: z.array(z.strictObject({ rule: z.string(), count: z.number().int(), reason: z.string() })),
});
export type SubmissionReceipt = z.output<typeof SubmissionReceipt>;

export const commitSubmission = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/commit',
  summary: 'Commit just what was previewed: all or nothing',
  params: SubmissionParams,
  body: z.strictObject({ previewDigest: Digest }),
  response: SubmissionReceipt,
  problems: [
    'not-found',
    'submission-closed',
    'submission-busy',
    'submission-stale',
    'submission-has-errors',
    'submission-has-open-warnings',
  ],
});

export const getReceipt = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId/receipt',
  summary: 'The receipt of an accepted submission',
  params: SubmissionParams,
  response: SubmissionReceipt,
  problems: ['not-found'],
});

export const discardSubmission = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/discard',
  summary: 'Give up an open submission; the registry is not touched',
  params: SubmissionParams,
  body: z.strictObject({}),
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy'],
});
