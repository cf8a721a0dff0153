/** A month the way a coordinator's page sends it; the worker's job is run in place. */
import { expect } from 'vitest';
import type { Submission } from '../../packages/contract/src/index.ts';
import type { Row, TableKey } from '../../packages/dictionary/src/index.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import type { TestPerson, TestSite } from './people.ts';
import { csvOf } from './rows.ts';
import type { TestServer } from './server.ts';

export type MonthRows = Partial<Readonly<Record<TableKey, readonly Row[]>>>;
export type MonthFiles = Partial<Readonly<Record<TableKey, string | Buffer>>>;

export const filesOf = (rows: MonthRows): MonthFiles =>
  Object.fromEntries((Object.entries(rows) as [TableKey, readonly Row[]][]).map(([table, of]) => [table, csvOf(table, of)]));

/** Opened, uploaded, and a check asked for; the answer is the submission's id. */
export async function askForCheck(coordinator: TestPerson, site: TestSite, month: string, files: MonthFiles): Promise<string> {
  const opened = await coordinator.post('/api/submissions', { siteId: site.id, month });
  expect(opened.status, JSON.stringify(opened.body)).toBe(201);
  const { id } = opened.body as Submission;
  for (const [table, bytes] of Object.entries(files)) {
    const put = await coordinator.upload(`/api/submissions/${id}/files/${table}?fileName=${table}.csv`, bytes);
    expect(put.status, JSON.stringify(put.body)).toBe(200);
  }
  await coordinator.post(`/api/submissions/${id}/check`).expect(202);
  return id;
}

/** As above, and checked. */
export async function uploadMonth(
  server: TestServer,
  coordinator: TestPerson,
  site: TestSite,
  month: string,
  files: MonthFiles,
): Promise<Submission> {
  const id = await askForCheck(coordinator, site, month, files);
  await checkSubmission(server.context, id);
  return (await coordinator.get(`/api/submissions/${id}`).expect(200)).body as Submission;
}

/** As above, every warning given a reason, and committed. */
export async function submitMonth(
  server: TestServer,
  coordinator: TestPerson,
  site: TestSite,
  month: string,
  rows: MonthRows,
): Promise<Submission> {
  const checked = await uploadMonth(server, coordinator, site, month, filesOf(rows));
  const errors = checked.findings.filter((group) => group.severity === 'error');
  expect(errors.map((group) => `${group.rule} ${group.statement}`)).toEqual([]);
  for (const group of checked.findings) {
    await coordinator.post(`/api/submissions/${checked.id}/acknowledgements`, { rule: group.rule, reason: 'as published' }).expect(200);
  }
  await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest }).expect(200);
  return (await coordinator.get(`/api/submissions/${checked.id}`).expect(200)).body as Submission;
}
