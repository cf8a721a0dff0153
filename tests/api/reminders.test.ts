/** Reminders of months that are due or overdue: who gets which, once, and when they end. */
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { remindCoordinators } from '../../services/api/src/features/months/remind-coordinators.ts';
import { enqueue } from '../../services/api/src/jobs/enqueue.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { startWorkerProcess } from '../support/processes.ts';
import { rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { filesOf, submitMonth, uploadMonth } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let number = 0;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(async () => {
  // Every test has a site of its own that joins with November 2025, due on 15 December.
  await server.database.owner.query("update sites set first_month = '2030-01'");
  await server.database.owner.query('delete from mail_messages');
  number += 1;
  site = await makeSite(server, '2025-11');
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: `Coordinator ${number}` });
  await server.database.owner.query("update grants set starts_on = '2025-01-01'");
});

interface Sent {
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
}
async function reminded(day: string): Promise<Sent[]> {
  const before = await mails();
  server.setClock(new Date(`${day}T08:20:00Z`));
  await remindCoordinators(server.context);
  return (await mails()).slice(before.length);
}
const mails = async (): Promise<Sent[]> =>
  (
    await server.database.owner.query(
      "select recipient, subject, body from mail_messages where event like 'month-reminder:%' order by created_at, recipient",
    )
  ).rows;
const subjects = (sent: readonly Sent[]): string[] => sent.map((mail) => mail.subject);

const overdue = (): string => `Cairnstep: 2025-11 of ${site.code} is overdue`;

describe('a reminder', () => {
  it('comes five days before the day, the day after it, and then weekly, four times; each once', async () => {
    const calendar: [string, string[]][] = [
      ['2025-12-09', []],
      ['2025-12-10', [`Cairnstep: 2025-11 of ${site.code} is due on 2025-12-15`]],
      ['2025-12-11', []],
      ['2025-12-15', []],
      ['2025-12-16', [overdue()]],
      ['2025-12-17', []],
      ['2025-12-23', [overdue()]],
      ['2025-12-30', [overdue()]],
      ['2026-01-06', [overdue()]],
    ];
    for (const [day, expected] of calendar) expect(subjects(await reminded(day)), day).toEqual(expected);
    // December is due on 15 January by then.
    expect(subjects(await reminded('2026-01-13')).sort()).toEqual(
      [overdue(), `Cairnstep: 2025-12 of ${site.code} is due on 2026-01-15`].sort(),
    );
    expect(subjects(await reminded('2026-01-20'))).toEqual([`Cairnstep: 2025-12 of ${site.code} is overdue`]);
  });

  it('is plain text with the way to the month, and nothing of a participant', async () => {
    const [mail] = await reminded('2025-12-10');
    expect(mail?.recipient).toBe(coordinator.email);
    expect(mail?.body.split('\n')).toEqual([
      `The month 2025-11 of ${site.name} (${site.code}) is due on 2025-12-15. It has not been accepted yet.`,
      '',
      'Submit it, or say that there was nothing to report:',
      `${server.url}/month?site=${site.code}`,
      '',
      'Reminders of this month end as soon as it is accepted or closed.',
      'If you are not the one who submits for this site, tell the registry office, registry@cairnstep.example.',
    ]);
  });

  it('missed while the registry stood still is made up for, but not those before it', async () => {
    expect(subjects(await reminded('2025-12-27'))).toEqual([overdue()]);
    expect(await reminded('2025-12-28')).toEqual([]);
  });

  it('goes to every coordinator of the site with a grant in force, and to nobody else', async () => {
    const second = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
    await makePerson(server, { grants: [{ role: 'therapist', site }] });
    await makePerson(server, { grants: [{ role: 'steward' }] });
    const elsewhere = await makeSite(server, '2030-01');
    await makePerson(server, { grants: [{ role: 'coordinator', site: elsewhere }] });
    const left = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
    const disabled = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
    await server.database.owner.query("update grants set starts_on = '2025-01-01'");
    await server.database.owner.query("update grants set ends_on = '2025-12-01' where account_id = $1", [left.id]);
    await server.database.owner.query("update accounts set status = 'disabled' where id = $1", [disabled.id]);
    expect((await reminded('2025-12-10')).map((mail) => mail.recipient).sort()).toEqual([coordinator.email, second.email].sort());
  });

  it('comes while a submission is only under way, and ends when it is accepted', async () => {
    server.setClock(new Date('2025-12-10T08:00:00Z'));
    const month = { participants: [rowOf('participants')], consents: [rowOf('consents')] };
    await uploadMonth(server, coordinator, site, '2025-11', filesOf(month));
    expect(await reminded('2025-12-10')).toHaveLength(1);
    await submitMonth(server, coordinator, site, '2025-11', month);
    expect(await reminded('2025-12-16')).toEqual([]);
  });

  it('ends when the month is closed as having nothing to report', async () => {
    server.setClock(new Date('2025-12-11T08:00:00Z'));
    await coordinator.post(`/api/sites/${site.id}/months/2025-11/nothing-to-report`).expect(200);
    for (const day of ['2025-12-12', '2025-12-16', '2025-12-23']) expect(await reminded(day), day).toEqual([]);
  });

  it('is mailed once though the job runs several times at once, and is in the log', async () => {
    server.setClock(new Date('2025-12-10T08:20:00Z'));
    await Promise.all([1, 2, 3].map(() => remindCoordinators(server.context)));
    expect(await mails()).toHaveLength(1);
    const { rows } = await server.database.owner.query(
      "select event::jsonb -> 'detail' as detail from audit_entries where act = 'month.remind' and object = $1",
      [`${site.code} 2025-11`],
    );
    expect(rows).toEqual([{ detail: { kind: 'due', mails: 1, month: '2025-11' } }]);
  });
});

describe('the worker', () => {
  it('takes the job up, and another worker after it mails nothing twice', async () => {
    server.setClock(null);
    // On any day the month before last or the last one is due or overdue within the time of reminding.
    await server.database.owner.query("update sites set first_month = '2025-01' where id = $1", [site.id]);
    const runJob = async (): Promise<void> => {
      const worker = await startWorkerProcess(server.config);
      await asActor(server.database.app, registry, (tx) => enqueue(tx, 'remind-coordinators', {}));
      const waiting = async (): Promise<number> =>
        (
          await server.database.owner.query(
            "select count(*)::int as n from pgboss.job where name = 'remind-coordinators' and state <> 'completed'",
          )
        ).rows[0].n;
      while ((await waiting()) > 0) await wait(100);
      await worker.kill();
    };
    await runJob();
    const first = await mails();
    expect(first.length).toBeGreaterThan(0);
    expect(new Set(first.map((mail) => mail.recipient))).toEqual(new Set([coordinator.email]));
    await runJob();
    expect(await mails()).toEqual(first);
  });
});
