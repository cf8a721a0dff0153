/** A month from the clinic: files in, findings, preview, commit, receipt. */
import { tableKeys } from '@cairnstep/dictionary';
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Digest, Id, Instant, Month, Page, pageOf, Site } from './vocabulary.ts';

export const Table = z.enum(tableKeys);

/**
 * `open`: files may come and go. `checking`: the worker reads and checks them. `checked`: findings and a preview exist.
 * `accepted`: committed. `superseded`: accepted, and corrected by a later submission of the same month. `discarded`: given up by its owner.
 */
export const SubmissionStatus = z.enum(['open', 'checking', 'checked', 'accepted', 'superseded', 'discarded']);

export const SubmissionFile = z.strictObject({
  /** Null for the workbook, which has a sheet for each of several tables. */
  table: Table.nullable(),
  /** The tables it has rows of; of a workbook known after the check. */
  tables: z.array(Table).nullable(),
  fileName: z.string(),
  bytes: z.number().int(),
  sha256: Digest,
  addedAt: Instant,
  /** Known after the check. */
  rows: z.number().int().nullable(),
  /** Cells mended on screen, which count in place of those of the file. */
  mended: z.number().int(),
  /** It identified somebody or could not be read to its end, and was deleted. Only its place is kept. */
  refused: z.boolean(),
});
export type SubmissionFile = z.output<typeof SubmissionFile>;

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
  /** Null when about a whole workbook. */
  table: Table.nullable(),
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

export const workbookType = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';

export const putSubmissionWorkbook = endpoint({
  method: 'PUT',
  path: '/api/submissions/:submissionId/workbook',
  summary: 'Add or replace the workbook: a sheet for each table, as in the template',
  params: SubmissionParams,
  query: z.strictObject({ fileName: z.string().min(1).max(200) }),
  upload: { contentType: workbookType },
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy', 'too-large', 'file-unreadable'],
});

export const removeSubmissionWorkbook = endpoint({
  method: 'DELETE',
  path: '/api/submissions/:submissionId/workbook',
  summary: 'Take the workbook out again',
  params: SubmissionParams,
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy'],
});

export const mendCells = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/mends',
  summary: 'Put values in place of cells of the files that were added; they are checked like any cell',
  params: SubmissionParams,
  body: z.strictObject({
    mends: z
      .array(
        z.strictObject({
          table: Table,
          /** As in findings: line of the file, or row of the sheet. */
          line: z.number().int().min(2).max(10_000_000),
          /** Key of the dictionary. */
          column: z.string().max(60),
          /** As one would type it in the file; empty leaves the cell empty. */
          value: z.string().max(200),
        }),
      )
      .min(1)
      .max(1_000),
  }),
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy', 'too-large', 'identifies-somebody'],
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

export const downloadFindings = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId/findings.csv',
  summary: 'All findings that were kept, as CSV',
  params: SubmissionParams,
  response: z.undefined(),
  download: { contentType: 'text/csv; charset=utf-8' },
  problems: ['not-found'],
});

export const downloadFindingsWorkbook = endpoint({
  method: 'GET',
  path: '/api/submissions/:submissionId/findings.xlsx',
  summary: 'The files as a workbook, with the findings in the cells they are about',
  params: SubmissionParams,
  response: z.undefined(),
  download: { contentType: workbookType },
  problems: ['not-found'],
});

export const acknowledgeFindings = endpoint({
  method: 'POST',
  path: '/api/submissions/:submissionId/acknowledgements',
  summary: 'Say why the warnings of one rule stand',
  params: SubmissionParams,
  body: z.strictObject({ rule: z.string().max(40), reason: z.string().trim().min(5, 'Say in a few words why these stand').max(500) }),
  response: Submission,
  problems: ['not-found', 'submission-closed', 'submission-busy', 'identifies-somebody'],
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
  problems: ['not-found', 'submission-stale'],
});

export const SubmissionReceipt = z.strictObject({
  submissionId: Id,
  site: Site,
  month: Month,
  acceptedAt: Instant,
  acceptedBy: z.string(),
  digest: Digest,
  tables: z.array(TableChange),
  files: z.array(
    z.strictObject({
      /** Null for the workbook. */
      table: Table.nullable(),
      fileName: z.string(),
      /** Of the file as it was sent. */
      sha256: Digest,
      rows: z.number().int(),
      /** Cells mended on screen; receipts of earlier versions do not tell. */
      mended: z.number().int().optional(),
    }),
  ),
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

export const getTemplate = endpoint({
  method: 'GET',
  path: '/api/sites/:siteId/template',
  summary: "The workbook to fill in for a month, with the site's participants to choose from",
  params: z.strictObject({ siteId: Id }),
  query: z.strictObject({ month: Month }),
  response: z.undefined(),
  download: { contentType: workbookType },
  problems: ['not-found'],
});

export const listParticipantCodes = endpoint({
  method: 'GET',
  path: '/api/sites/:siteId/participant-codes',
  summary: 'The codes of all participants the registry holds of a site, in their order',
  params: z.strictObject({ siteId: Id }),
  response: z.strictObject({ codes: z.array(z.string()) }),
  problems: ['not-found'],
});

const SafeHeaders = z.strictObject({
  headers: z.array(z.strictObject({ header: z.string(), markedAt: Instant, markedBy: z.string() })),
});
const Header = z.string().trim().min(1, 'Write the header').max(60, 'Headers of columns are shorter');

export const listSafeHeaders = endpoint({
  method: 'GET',
  path: '/api/sites/:siteId/safe-headers',
  summary: 'Headers that screening would refuse and that a steward has marked as safe in the files of this site',
  params: z.strictObject({ siteId: Id }),
  response: SafeHeaders,
  problems: ['not-found'],
});

export const markSafeHeader = endpoint({
  method: 'POST',
  path: '/api/sites/:siteId/safe-headers',
  summary: 'Mark a header as safe in the files of this site; its cells are screened all the same',
  params: z.strictObject({ siteId: Id }),
  body: z.strictObject({ header: Header }),
  response: SafeHeaders,
  problems: ['not-found', 'identifies-somebody'],
});

export const unmarkSafeHeader = endpoint({
  method: 'DELETE',
  path: '/api/sites/:siteId/safe-headers',
  summary: 'Have a header screened again',
  params: z.strictObject({ siteId: Id }),
  query: z.strictObject({ header: Header }),
  response: SafeHeaders,
  problems: ['not-found'],
});
