/** What is left when a process dies in the middle: real processes, killed without warning at seeded moments. */
import { setTimeout as wait } from 'node:timers/promises';
import fc from 'fast-check';
import type { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { everything, nothing, readChain, readCommitState } from '../support/commit-state.ts';
import { browser } from '../support/people.ts';
import { startApiProcess, type ApiProcess } from '../support/processes.ts';
import { monthFiles, monthsReady, type MonthReady } from '../support/ready-to-commit.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

/** As parts of the time that the work takes when nobody disturbs it: one from each of so many equal stretches, the last just after its end. */
const moments = (count: number, seed: number): number[] =>
  fc
    .sample(fc.noBias(fc.integer({ min: 0, max: 999 })), { seed, numRuns: count })
    .map((draw, index) => ((index + draw / 1_000) / count) * 1.2);

const oneMonth = monthFiles({ participants: 8, sessionsEach: 10, boutsEach: 12 });

interface Answer {
  readonly status: number;
  readonly type: string | undefined;
}

/** The coordinator presses "commit"; null when no answer came. */
async function commit(server: TestServer, url: string, { coordinator, submission }: MonthReady): Promise<Answer | null> {
  try {
    const page = browser({ ...server, url }, coordinator.cookie);
    const { status, body } = await page.post(`/api/submissions/${submission.id}/commit`, { previewDigest: submission.preview?.digest });
    return { status, type: (body as { type?: string }).type };
  } catch {
    return null;
  }
}

/** Milliseconds that a commit takes when nobody disturbs it. */
async function timeCommit(server: TestServer, url: string, month: MonthReady): Promise<number> {
  const begun = performance.now();
  expect(await commit(server, url, month)).toMatchObject({ status: 200 });
  return performance.now() - begun;
}

async function expectAllOrNothing(owner: Client, { submission, counts }: MonthReady, answer: Answer | null): Promise<'all' | 'nothing'> {
  const state = await readCommitState(owner, submission.id);
  const isAccepted = state.status === 'accepted';
  expect(state).toEqual(isAccepted ? everything(counts) : nothing);
  // What was confirmed is there.
  if (answer?.status === 200) expect(isAccepted).toBe(true);
  expect(await readChain(owner)).toMatchObject({ holds: true });
  return isAccepted ? 'all' : 'nothing';
}

/** Once more, as a coordinator does who saw no answer: it goes through, or is told that it did before; either way it is there once. */
async function expectOnceAfterAnother(
  server: TestServer,
  url: string,
  owner: Client,
  month: MonthReady,
  left: 'all' | 'nothing',
): Promise<void> {
  const again = await commit(server, url, month);
  if (left === 'nothing') expect(again).toEqual({ status: 200, type: undefined });
  else expect(again).toEqual({ status: 409, type: '/problems/submission-closed' });
  expect(await readCommitState(owner, month.submission.id)).toEqual(everything(month.counts));
}

describe('a commit whose API is killed', () => {
  let server: TestServer;
  let api: ApiProcess;
  beforeAll(async () => {
    server = await startTestServer();
    api = await startApiProcess(server.config);
  });
  afterAll(async () => {
    await api.stop();
    await server.close();
  });

  /** In the order in which a commit writes to them. */
  const steps = ['participants', 'bouts', 'course_facts', 'submission_files', 'mail_messages', 'pgboss.job', 'audit_entries'];

  it('leaves nothing, at whichever step it was', async () => {
    const { owner } = server.database;
    const [month] = await monthsReady(server, oneMonth, 1);
    if (!month) throw new Error('No month was prepared.');
    const blocker = await connectAgain(server);
    for (const table of steps) {
      await blocker.query(`begin; lock table ${table} in exclusive mode`);
      const answer = commit(server, api.url, month);
      await untilTrue(owner, 'select exists (select from pg_locks where relation = $1::regclass and not granted)', [table]);
      await api.kill();
      expect(await answer).toBeNull();
      await blocker.query('rollback');
      expect(await expectAllOrNothing(owner, month, null)).toBe('nothing');
      api = await startApiProcess(server.config);
    }
    await blocker.end();
    await expectOnceAfterAnother(server, api.url, owner, month, 'nothing');
  });

  it('leaves all or nothing, at whichever moment it was, and goes through once after a new start', async () => {
    const { owner } = server.database;
    const at = moments(10, 20_260_801);
    const [first, ...months] = await monthsReady(server, oneMonth, at.length + 1);
    if (!first) throw new Error('No month was prepared.');
    const whole = await timeCommit(server, api.url, first);
    for (const [index, month] of months.entries()) {
      const answer = commit(server, api.url, month);
      await wait(whole * (at[index] ?? 0));
      await api.kill();
      const left = await expectAllOrNothing(owner, month, await answer);
      api = await startApiProcess(server.config);
      await expectOnceAfterAnother(server, api.url, owner, month, left);
    }
  });
});

/** A second connection as the owner of a test's database. */
async function connectAgain(server: TestServer): Promise<Client> {
  const { Client: Connection } = await import('pg');
  const client = new Connection({ connectionString: server.database.ownerUrl });
  await client.connect();
  return client;
}

async function untilTrue(owner: Client, question: string, values: readonly unknown[] = [], within = 40_000): Promise<void> {
  const deadline = Date.now() + within;
  for (;;) {
    const { rows } = await owner.query({ text: question, values: [...values], rowMode: 'array' });
    if ((rows[0] as unknown[])[0] === true) return;
    if (Date.now() > deadline) throw new Error(`It did not come true: ${question}`);
    await wait(10);
  }
}
