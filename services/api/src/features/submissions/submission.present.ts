import type { Submission, SubmissionFile } from '@cairnstep/contract';
import { tableOfFile } from './file-key.ts';
import type { FileRecord, SubmissionRecord } from './submissions.repository.ts';

export function presentSubmission(record: SubmissionRecord, files: readonly FileRecord[]): Submission {
  const { progress } = record;
  return {
    id: record.id,
    site: { id: record.siteId, code: record.siteCode, name: record.siteName },
    month: record.month,
    status: record.status,
    createdAt: record.createdAt.toISOString(),
    createdBy: record.createdBy,
    settledAt: record.settledAt?.toISOString() ?? null,
    files: files.map(presentFile),
    progress: progress === null ? null : { step: progress.step, done: progress.done, of: progress.of },
    findings: record.findings,
    preview:
      record.preview !== null && record.previewDigest !== null ? { digest: record.previewDigest, tables: record.preview.tables } : null,
  };
}

const presentFile = ({ key, tables, fileName, bytes, sha256, addedAt, rows, mended, refused }: FileRecord): SubmissionFile => ({
  table: tableOfFile(key),
  tables: tables && [...tables],
  fileName,
  bytes,
  sha256,
  addedAt: addedAt.toISOString(),
  rows,
  mended,
  refused,
});
