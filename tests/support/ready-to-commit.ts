/** Months of sites of their own, uploaded and checked, so that each can be committed whatever became of the others. */
import type { Submission } from '../../packages/contract/src/index.ts';
import { monthOfBouts, type MonthSize } from '../../packages/submission-files/bench/month-of-bouts.ts';
import type { RowCounts } from './commit-state.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from './people.ts';
import type { TestServer } from './server.ts';
import { askForCheck, uploadMonth, type MonthFiles } from './submit-month.ts';

export interface MonthReady {
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

const inTurn = async <T>(howMany: number, make: () => Promise<T>): Promise<T[]> => {
  const made: T[] = [];
  while (made.length < howMany) made.push(await make());
  return made;
};

async function newcomer(server: TestServer): Promise<{ site: TestSite; coordinator: TestPerson }> {
  const site = await makeSite(server);
  return { site, coordinator: await makePerson(server, { grants: [{ role: 'coordinator', site }] }) };
}

/** Checked in place. */
export const monthsReady = (server: TestServer, { files, counts }: MonthOfFiles, howMany: number): Promise<MonthReady[]> =>
  inTurn(howMany, async () => {
    const { site, coordinator } = await newcomer(server);
    const submission = await uploadMonth(server, coordinator, site, '2026-01', files);
    if (!submission.preview || submission.findings.length > 0) {
      throw new Error(`The month is not clean: ${submission.findings.map(({ rule, statement }) => `${rule} ${statement}`).join(', ')}.`);
    }
    return { coordinator, submission, counts };
  });

export interface MonthToCheck {
  readonly coordinator: TestPerson;
  readonly id: string;
  readonly counts: RowCounts;
}

/** Left to the workers to check. */
export const monthsToCheck = (server: TestServer, { files, counts }: MonthOfFiles, howMany: number): Promise<MonthToCheck[]> =>
  inTurn(howMany, async () => {
    const { site, coordinator } = await newcomer(server);
    return { coordinator, id: await askForCheck(coordinator, site, '2026-01', files), counts };
  });
