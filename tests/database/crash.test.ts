/** What is left when a process dies in the middle: real processes, killed without warning at seeded moments. */
import { createServer } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';
import fc from 'fast-check';
import { Client } from 'pg';
import { SMTPServer } from 'smtp-server';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { drawFreePort, loopback } from '../../infra/network/ports.ts';
import type { Submission } from '../../packages/contract/src/index.ts';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { queueMail } from '../../services/api/src/mail/queue-mail.ts';
import { startMailCatcher, type MailCatcher } from '../../services/mail-catcher/src/index.ts';
import { everything, nothing, readChain, readCommitState } from '../support/commit-state.ts';
import { deaths, startOwnCluster, type OwnCluster } from '../support/own-cluster.ts';
import { browser } from '../support/people.ts';
import { startApiProcess, startWorkerProcess, type ApiProcess, type TestProcess } from '../support/processes.ts';
import { monthFiles, monthsReady, monthsToCheck, type MonthReady, type MonthToCheck } from '../support/ready-to-commit.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

/** How long something may take on a busy machine before the test gives up, milliseconds. */
const patience = 60_000;
const longTest = 180_000;

const month = monthFiles({ participants: 8, sessionsEach: 10, boutsEach: 10 });
const atOnce = 4;
/** Commits under way when the API is killed, and how often it is: forty moments, with the twelve of PostgreSQL more than fifty. */
const commitsAtOnce = 8;
const killings = 5;

/**
 * How far each of several commits has come when the process dies, as parts of the time that they take when nobody disturbs them:
 * one from each of as many equal stretches, the last of which ends after the commit.
 */
const moments = (seed: number, howMany = atOnce): number[] =>
  fc
    .sample(fc.noBias(fc.integer({ min: 0, max: 999 })), { seed, numRuns: howMany })
    .map((draw, index) => ((index + draw / 1_000) / howMany) * 1.2);

async function until(what: string, isTrue: () => Promise<boolean>): Promise<void> {
  const deadline = Date.now() + patience;
  while (!(await isTrue())) {
    if (Date.now() > deadline) throw new Error(`In vain waited until ${what}.`);
    await wait(10);
  }
}

const first = <T>(items: readonly T[]): T => {
  const [item] = items;
  if (item === undefined) throw new Error('There is nothing to begin with.');
  return item;
};

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

/** Milliseconds that these commits take together when nobody disturbs them. */
async function timeCommits(server: TestServer, url: string, months: readonly MonthReady[]): Promise<number> {
  const begun = performance.now();
  const answers = await Promise.all(months.map((one) => commit(server, url, one)));
  expect(answers.map((answer) => answer?.status)).toEqual(months.map(() => 200));
  return performance.now() - begun;
}

/** Commits that have come as far as `parts` of `whole` milliseconds say when `die` is called. */
async function commitsUntil(
  server: TestServer,
  url: string,
  months: readonly MonthReady[],
  parts: readonly number[],
  whole: number,
  die: () => Promise<void>,
) {
  const longest = Math.max(...parts);
  const answers = months.map(async (one, index) => {
    await wait((longest - (parts[index] ?? 0)) * whole);
    return commit(server, url, one);
  });
  await wait(longest * whole);
  await die();
  return Promise.all(answers);
}

type Left = 'all' | 'nothing';

async function whatIsLeft(owner: Client, { submission, counts }: MonthReady, answer: Answer | null): Promise<Left> {
  const state = await readCommitState(owner, submission.id);
  const isAccepted = state.status === 'accepted';
  expect(state).toEqual(isAccepted ? everything(counts) : nothing);
  // What was confirmed is there.
  if (answer?.status === 200) expect(isAccepted).toBe(true);
  return isAccepted ? 'all' : 'nothing';
}

/** Once more, as a coordinator does who saw no answer: it goes through, or the receipt of before is shown; either way it is there once. */
async function commitAgain(server: TestServer, url: string, owner: Client, one: MonthReady): Promise<void> {
  const again = await commit(server, url, one);
  expect(again).toEqual({ status: 200, type: undefined });
  expect(await readCommitState(owner, one.submission.id)).toEqual(everything(one.counts));
}

/** What was checked does not outlive a crash of the database; the files do. The worker checks them again. */
async function checkAgain(server: TestServer, one: MonthReady): Promise<MonthReady> {
  const page = browser(server, one.coordinator.cookie);
  await page.post(`/api/submissions/${one.submission.id}/check`).expect(202);
  let submission = one.submission;
  await until('the month is checked again', async () => {
    submission = (await page.get(`/api/submissions/${one.submission.id}`)).body as Submission;
    return submission.status === 'checked';
  });
  return { ...one, submission };
}

/** A further session as superuser that holds a table until `letGo`, so that whoever writes to it stops there. */
async function holdTable(ownerUrl: string, table: string): Promise<{ untilWaitedFor: () => Promise<void>; letGo: () => Promise<void> }> {
  const holder = new Client({ connectionString: ownerUrl });
  await holder.connect();
  await holder.query(`begin; lock table ${table} in exclusive mode`);
  return {
    untilWaitedFor: () =>
      until(`somebody writes to ${table}`, async () => {
        const { rows } = await holder.query<{ waits: boolean }>(
          'select exists (select from pg_locks where relation = $1::regclass and not granted) as waits',
          [table],
        );
        return rows[0]?.waits === true;
      }),
    letGo: () => holder.end(),
  };
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

  it.each(['bouts', 'course_facts', 'mail_messages', 'audit_entries'])(
    'leaves nothing when it had come to the table %s',
    { timeout: longTest },
    async (table) => {
      const { owner, ownerUrl } = server.database;
      const one = first(await monthsReady(server, month, 1));
      const held = await holdTable(ownerUrl, table);
      const answer = commit(server, api.url, one);
      await held.untilWaitedFor();
      await api.kill();
      await held.letGo();
      expect(await whatIsLeft(owner, one, await answer)).toBe('nothing');
      api = await startApiProcess(server.config);
      await commitAgain(server, api.url, owner, one);
    },
  );

  it('leaves all or nothing, whatever the moment, and goes through once after a new start', { timeout: longTest }, async () => {
    const { owner } = server.database;
    const whole = await timeCommits(server, api.url, await monthsReady(server, month, commitsAtOnce));
    for (let killing = 1; killing <= killings; killing += 1) {
      const months = await monthsReady(server, month, commitsAtOnce);
      const answers = await commitsUntil(server, api.url, months, moments(20_260_800 + killing, commitsAtOnce), whole, () => api.kill());
      for (const [index, one] of months.entries()) await whatIsLeft(owner, one, answers[index] ?? null);
      expect(await readChain(owner)).toMatchObject({ holds: true });
      api = await startApiProcess(server.config);
      for (const one of months) await commitAgain(server, api.url, owner, one);
    }
    expect(await readChain(owner)).toMatchObject({ holds: true });
  });
});

describe('a commit whose PostgreSQL is killed', () => {
  let cluster: OwnCluster;
  let server: TestServer;
  let api: ApiProcess;
  let worker: TestProcess;
  let closeDatabase: () => Promise<void>;
  beforeAll(async () => {
    cluster = await startOwnCluster();
    const database = await cluster.openDatabase();
    closeDatabase = () => database.close();
    server = await startTestServer({}, database);
    [api, worker] = await Promise.all([startApiProcess(server.config), startWorkerProcess(server.config)]);
  });
  afterAll(async () => {
    await Promise.all([api.stop(), worker.stop()]);
    await server.close();
    await closeDatabase();
    await cluster.close();
  });

  it('leaves all or nothing, whatever the moment, and goes through once when it is back', { timeout: longTest }, async () => {
    const rounds = [];
    for (const [index, death] of deaths.entries())
      rounds.push({ death, parts: moments(20_260_811 + index), months: await monthsReady(server, month, atOnce) });
    const whole = await timeCommits(server, api.url, await monthsReady(server, month, atOnce));
    for (const [index, { death, parts, months: prepared }] of rounds.entries()) {
      const months = index === 0 ? prepared : await Promise.all(prepared.map((one) => checkAgain(server, one)));
      const answers = await commitsUntil(server, api.url, months, parts, whole, () => cluster.die(death));
      await cluster.recover();
      const owner = await cluster.connect();
      const left: Left[] = [];
      for (const [index, one] of months.entries()) left.push(await whatIsLeft(owner, one, answers[index] ?? null));
      expect(await readChain(owner)).toMatchObject({ holds: true });
      // The API and the worker outlive their database.
      for (const [index, one] of months.entries()) {
        if (left[index] === 'all') await commitAgain(server, api.url, owner, one);
        else {
          expect(await commit(server, api.url, one)).toEqual({ status: 409, type: '/problems/submission-stale' });
          expect(await whatIsLeft(owner, one, null)).toBe('nothing');
          await commitAgain(server, api.url, owner, await checkAgain(server, one));
        }
      }
      expect(await readChain(owner)).toMatchObject({ holds: true });
      await owner.end();
      expect([api.hasEnded(), worker.hasEnded()]).toEqual([false, false]);
    }
  });
});

/** What a worker makes of a check: done once, or not at all. */
async function checkState(owner: Client, id: string): Promise<{ status: string; staged: number; findings: number; checks: number }> {
  const { rows } = await owner.query<{ status: string; staged: number; findings: number; checks: number }>(
    `select m.status, (select count(*)::int from staged_bouts where submission_id = m.id) as staged,
       (select count(*)::int from submission_findings where submission_id = m.id) as findings,
       (select count(*)::int from audit_entries where act = 'submission.checked' and object = m.id::text) as checks
     from submissions m where m.id = $1`,
    [id],
  );
  return first(rows);
}
const unchecked = { status: 'checking', staged: 0, findings: 0, checks: 0 };
const checked = { status: 'checked', staged: month.counts.bouts, findings: 0, checks: 1 };

const untilChecked = (owner: Client, months: readonly MonthToCheck[]): Promise<void> =>
  until('every month is checked', async () => {
    const { rows } = await owner.query<{ done: boolean }>(
      "select bool_and(status = 'checked') as done from submissions where id = any($1)",
      [months.map((one) => one.id)],
    );
    return rows[0]?.done === true;
  });

async function expectCheckedAndCommit(server: TestServer, months: readonly MonthToCheck[]): Promise<void> {
  const { owner } = server.database;
  await untilChecked(owner, months);
  for (const { coordinator, id, counts } of months) {
    expect(await checkState(owner, id)).toEqual(checked);
    const { body } = await coordinator.get(`/api/submissions/${id}`).expect(200);
    await commitAgain(server, server.url, owner, { coordinator, submission: body as Submission, counts });
  }
}

describe('a check whose worker is killed', () => {
  let server: TestServer;
  beforeAll(async () => {
    server = await startTestServer();
  });
  afterAll(() => server.close());

  it('leaves nothing when it was about to write, and begins anew with the next worker', { timeout: longTest }, async () => {
    const { owner, ownerUrl } = server.database;
    const lost = await startWorkerProcess(server.config);
    const held = await holdTable(ownerUrl, 'staged_bouts');
    const months = await monthsToCheck(server, month, 1);
    await held.untilWaitedFor();
    await lost.kill();
    await held.letGo();
    expect(await checkState(owner, first(months).id)).toEqual(unchecked);
    const next = await startWorkerProcess(server.config);
    await expectCheckedAndCommit(server, months);
    await next.stop();
  });

  it('is done once, whatever the moment', { timeout: longTest }, async () => {
    const { owner } = server.database;
    const workers = await Promise.all(Array.from({ length: atOnce }, () => startWorkerProcess(server.config)));
    const begun = performance.now();
    await untilChecked(owner, await monthsToCheck(server, month, atOnce));
    const whole = performance.now() - begun;
    const months = await monthsToCheck(server, month, atOnce);
    await Promise.all(
      moments(20_260_821).map(async (part, index) => {
        await wait(part * whole);
        await workers[index]?.kill();
      }),
    );
    for (const one of months) expect([unchecked, checked]).toContainEqual(await checkState(owner, one.id));
    const next = await startWorkerProcess(server.config);
    await expectCheckedAndCommit(server, months);
    await next.stop();
  });
});

/** A mail in the outbox; the answer is its subject. */
async function postMail(server: TestServer, subject: string): Promise<string> {
  const mail = { event: `test:${subject}`, recipient: 'coordinator@clinic.example', subject, body: 'For the test.' };
  await asActor(server.context.database, registry, (tx) => queueMail(tx, mail));
  return subject;
}

async function mailState(owner: Client, subject: string): Promise<{ status: string; job: string; retries: number }> {
  const { rows } = await owner.query<{ status: string; job: string; retries: number }>(
    `select m.status, j.state::text as job, j.retry_count as retries from mail_messages m
       join pgboss.job j on j.name = 'send-mail' and j.data->>'mailId' = m.id::text where m.subject = $1`,
    [subject],
  );
  return first(rows);
}

const untilDone = (owner: Client, subject: string): Promise<void> =>
  until(`the mail "${subject}" is dealt with`, async () => (await mailState(owner, subject)).job === 'completed');

describe('background work', () => {
  let server: TestServer;
  let smtpPort: number;
  let mails: MailCatcher | undefined;
  const startWorker = () => startWorkerProcess(server.config, { SMTP_URL: `smtp://${loopback}:${smtpPort}` });
  const startMails = async (): Promise<MailCatcher> => (mails = await startMailCatcher({ smtpPort, httpPort: 0 }));
  const caught = (subject: string): number => mails?.messages().filter((mail) => mail.subject === subject).length ?? 0;
  beforeAll(async () => {
    server = await startTestServer();
    smtpPort = await drawFreePort();
  });
  afterEach(async () => {
    await mails?.close();
    mails = undefined;
  });
  afterAll(() => server.close());

  it('is taken up by one of two workers, and done once', { timeout: longTest }, async () => {
    const { owner } = server.database;
    await startMails();
    const workers = await Promise.all([startWorker(), startWorker()]);
    const subjects = await Promise.all(Array.from({ length: 12 }, (_, index) => postMail(server, `To all, ${index + 1}`)));
    const months = await monthsToCheck(server, month, 3);
    for (const subject of subjects) await untilDone(owner, subject);
    await untilChecked(owner, months);
    await Promise.all(workers.map((worker) => worker.stop()));
    expect(subjects.map(caught)).toEqual(subjects.map(() => 1));
    for (const one of months) expect(await checkState(owner, one.id)).toEqual(checked);
    const { rows } = await owner.query(
      "select distinct state::text, retry_count from pgboss.job where name in ('send-mail', 'check-submission')",
    );
    expect(rows).toEqual([{ state: 'completed', retry_count: 0 }]);
  });

  it('does not send a mail twice when its worker is killed while sending', { timeout: longTest }, async () => {
    const { owner } = server.database;
    // A server that never greets: the mail is claimed, and nobody can know what became of it.
    const silent = createServer();
    const reached = new Promise<void>((resolve) => silent.once('connection', () => resolve()));
    await new Promise<void>((resolve) => silent.listen(smtpPort, loopback, resolve));
    const lost = await startWorker();
    const subject = await postMail(server, 'Claimed');
    await reached;
    expect(await mailState(owner, subject)).toEqual({ status: 'sending', job: 'active', retries: 0 });
    await lost.kill();
    await new Promise<void>((resolve) => silent.close(() => resolve()));

    await startMails();
    const next = await startWorker();
    await untilDone(owner, subject);
    expect(await mailState(owner, subject)).toEqual({ status: 'sending', job: 'completed', retries: 1 });
    const after = await postMail(server, 'After it');
    await untilDone(owner, after);
    await next.stop();
    expect([caught(subject), caught(after)]).toEqual([0, 1]);
  });

  it('sends a mail later that the server refused for now, once', { timeout: longTest }, async () => {
    const { owner } = server.database;
    const refusing = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'],
      // 451: the action was not taken, a local error; the client may try again (RFC 5321, 4.2.3).
      onMailFrom: (_address, _session, done) => done(Object.assign(new Error('Later, please'), { responseCode: 451 })),
    });
    await new Promise<void>((resolve) => refusing.listen(smtpPort, loopback, resolve));
    const worker = await startWorker();
    const subject = await postMail(server, 'Refused');
    await until('the mail was refused', async () => (await mailState(owner, subject)).job === 'retry');
    expect(await mailState(owner, subject)).toMatchObject({ status: 'waiting' });
    await new Promise<void>((resolve) => refusing.close(() => resolve()));

    await startMails();
    await untilDone(owner, subject);
    await worker.stop();
    expect(await mailState(owner, subject)).toMatchObject({ status: 'sent' });
    expect(caught(subject)).toBe(1);
  });
});
