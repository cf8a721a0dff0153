/** A submission as tests meet it: one clinic, November 2026. Never part of the built client. */
import type { Submission, SubmissionReceipt } from '@cairnstep/contract';
import type { TableKey } from '@cairnstep/dictionary';
import { writeTemplate } from '@cairnstep/submission-files';
import { signedInAs, site } from '../../testing/fake-api.ts';

export const submissionId = '2b1b7c2e-8a57-4a0b-9d0a-5d1f0a9b7c33';
export const coordinator = signedInAs({ role: 'coordinator', site });
export const therapist = signedInAs({ role: 'therapist', site });

export const sample = (more: Partial<Submission> = {}): Submission => ({
  id: submissionId,
  site,
  month: '2026-11',
  status: 'open',
  createdAt: '2026-12-01T08:00:00.000Z',
  createdBy: 'Mara Lind',
  settledAt: null,
  files: [],
  progress: null,
  findings: [],
  preview: null,
  ...more,
});

export const fileOf = (table: TableKey, rows: number | null = null): Submission['files'][number] => ({
  table,
  tables: [table],
  fileName: `${table}.csv`,
  bytes: 2_400,
  sha256: 'ab'.repeat(32),
  addedAt: '2026-12-01T08:05:00.000Z',
  rows,
  mended: 0,
  refused: false,
});

export const error: Submission['findings'][number] = {
  rule: 'F21',
  severity: 'error',
  statement: 'A number lies within the hard limits.',
  why: 'A value outside them is impossible.',
  mend: 'Compare the value with the record.',
  count: 3,
  acknowledgedReason: null,
};

export const warning: Submission['findings'][number] = {
  ...error,
  rule: 'T04',
  severity: 'warning',
  statement: 'Step length lies between two limits.',
  count: 2,
};

const digest = 'cd'.repeat(32);
const unchanged = { table: 'participants', added: 0, changed: 0, unchanged: 12, removed: 0 } as const;

export const checked = (more: Partial<Submission> = {}): Submission =>
  sample({
    status: 'checked',
    files: [fileOf('participants', 12), fileOf('sessions', 90)],
    preview: { digest, tables: [unchanged, { table: 'sessions', added: 88, changed: 2, unchanged: 0, removed: 1 }] },
    ...more,
  });

export const receipt: SubmissionReceipt = {
  submissionId,
  site,
  month: '2026-11',
  acceptedAt: '2026-12-01T09:00:00.000Z',
  acceptedBy: 'Mara Lind',
  digest,
  tables: [unchanged, { table: 'sessions', added: 88, changed: 2, unchanged: 0, removed: 1 }],
  files: [{ table: 'sessions', fileName: 'sessions.csv', sha256: 'ab'.repeat(32), rows: 90 }],
  acknowledged: [{ rule: 'T04', count: 2, reason: 'Short steps are right for this person.' }],
};

/** The template as it is handed out: nothing in it but its example rows. */
export async function sampleWorkbook(): Promise<File> {
  const pieces: Uint8Array<ArrayBuffer>[] = [];
  for await (const piece of writeTemplate({ site: site.name, month: '2026-11', participants: [] })) pieces.push(new Uint8Array(piece));
  return new File(pieces, 'month.xlsx');
}
