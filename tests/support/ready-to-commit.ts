/** Months of sites of their own, uploaded and checked, so that each can be committed whatever became of the others. */
import type { Submission } from '../../packages/contract/src/index.ts';
import { monthOfBouts, type MonthSize } from '../../packages/submission-files/bench/month-of-bouts.ts';
import type { RowCounts } from './commit-state.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from './people.ts';
import type { TestServer } from './server.ts';
import { uploadMonth, type MonthFiles } from './submit-month.ts';

export interface MonthReady {
  readonly site: TestSite;
  readonly coordinator: TestPerson;
  readonly submission: Submission;
  readonly counts: RowCounts;
}

export interface MonthOfFiles {
  readonly files: MonthFiles;
  readonly counts: RowCounts;
}

export function monthFiles(size: MonthSize): MonthOfFiles {
  const sessions = size.participants * size.sessionsEach;
  return {
    files: Object.fromEntries(Object.entries(monthOfBouts(size)).map(([table, bytes]) => [table, Buffer.from(bytes)])),
    counts: { participants: size.participants, consents: size.participants, sessions, bouts: sessions * size.boutsEach },
  };
}

export async function monthsReady(server: TestServer, { files, counts }: MonthOfFiles, howMany: number): Promise<MonthReady[]> {
  const months: MonthReady[] = [];
  for (let made = 0; made < howMany; made += 1) {
    const site = await makeSite(server);
    const coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
    const submission = await uploadMonth(server, coordinator, site, '2026-01', files);
    if (!submission.preview || submission.findings.length > 0) {
      throw new Error(`The month is not clean: ${submission.findings.map(({ rule, statement }) => `${rule} ${statement}`).join(', ')}.`);
    }
    months.push({ site, coordinator, submission, counts });
  }
  return months;
}
