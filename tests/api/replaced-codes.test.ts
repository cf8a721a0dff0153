/** Participant codes that a site replaces in one batch: every row, its history and its facts, or nothing at all. */
import { randomUUID } from 'node:crypto';
import { Client } from 'pg';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { tableKeys } from '../../packages/dictionary/src/index.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { readNewestConsents } from '../../services/api/src/features/exports/exports.repository.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { participantCode, rowOf, type Overrides } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { askForCheck, filesOf, submitMonth, uploadMonth, type MonthRows } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let other: TestSite;
let coordinator: TestPerson;
let otherCoordinator: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());
beforeEach(async () => {
  site = await makeSite(server);
  other = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: 'Mara Lind' });
  otherCoordinator = await makePerson(server, { grants: [{ role: 'coordinator', site: other }] });
});

const [anna, ben, carl, dora, eve] = [1, 2, 3, 4, 5].map(participantCode) as [string, string, string, string, string];

interface OfPerson {
  readonly person?: Overrides;
  readonly session?: Overrides;
}
/** One person's month: a row in every table that may come without an exam's cells. */
const monthOf = (participant: string, { person = {}, session = {} }: OfPerson = {}): MonthRows => ({
  participants: [rowOf('participants', { participant, ...person })],
  consents: [rowOf('consents', { participant })],
  sessions: [rowOf('sessions', { participant, upright_min: 30, steps_total: null, distance_total_m: null, ...session })],
  bouts: [rowOf('bouts', { participant })],
});
const together = (...months: readonly MonthRows[]): MonthRows =>
  Object.fromEntries(tableKeys.flatMap((table) => (months[0]?.[table] ? [[table, months.flatMap((month) => month[table] ?? [])]] : [])));

/** People who differ in more than their code, so that nothing takes them for one. */
const second: OfPerson = { person: { days_injury_to_index: 300 } };

const replace = (codes: readonly { from: string; to: string }[], who: TestPerson = coordinator, of: TestSite = site) =>
  who.post(`/api/sites/${of.id}/replaced-codes`, { codes });
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

/** Every row of every table with a participant, at a site, as text without the code; and which codes occur. */
async function contents(of: TestSite): Promise<{ codes: string[]; rows: string[] }> {
  const rows: string[] = [];
  const codes = new Set<string>();
  for (const table of [...tableKeys, 'course_facts', 'outcome_facts']) {
    const found = await server.database.owner.query(
      `select participant, (to_jsonb(t) - 'participant')::text as rest from ${table} t where site_id = $1`,
      [of.id],
    );
    for (const row of found.rows as { participant: string; rest: string }[]) {
      codes.add(row.participant);
      rows.push(`${table} ${row.rest}`);
    }
  }
  return { codes: [...codes].sort(), rows: rows.sort() };
}
const revisionOf = async (of: TestSite): Promise<number> =>
  (await server.database.owner.query('select revision from sites where id = $1', [of.id])).rows[0].revision;

describe('a batch of replaced codes', () => {
  it('gives the same rows and facts new codes, and says how many', async () => {
    await submitMonth(server, coordinator, site, '2026-01', together(monthOf(anna), monthOf(ben, second)));
    const before = await contents(site);
    const revision = await revisionOf(site);
    const { body } = await replace([
      { from: anna, to: carl },
      { from: ben, to: dora },
      { from: eve, to: participantCode(6) },
    ]).expect(200);
    expect(body).toEqual({ replaced: 2, unknown: 1, joined: 0, rows: 8, earlierValues: 0 });
    const after = await contents(site);
    expect(after.codes).toEqual([carl, dora]);
    expect(after.rows).toEqual(before.rows);
    expect(await revisionOf(site)).toBe(revision + 1);
    const { rows } = await server.database.owner.query(
      "select actor, object, event::jsonb -> 'detail' as detail from audit_entries where act = 'codes.replace' and object = $1",
      [site.id],
    );
    expect(rows).toEqual([{ actor: coordinator.id, object: site.id, detail: body }]);
    for (const code of [anna, ben, carl]) for (const line of server.logLines) expect(line).not.toContain(code);
  });

  it('leaves the same code at another site alone', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    await submitMonth(server, otherCoordinator, other, '2026-01', monthOf(anna));
    const before = await contents(other);
    await replace([{ from: anna, to: carl }]).expect(200);
    expect(await contents(other)).toEqual(before);
    expect((await contents(site)).codes).toEqual([carl]);
  });

  it('leads from the new code to the earlier values of its rows', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna, { session: { upright_min: 31 } }));
    const history = async () =>
      (
        await server.database.owner.query(
          "select row_key->>'participant' as code, before->>'participant' as had, before->>'upright_min' as was, change from row_history where site_id = $1",
          [site.id],
        )
      ).rows;
    expect(await history()).toEqual([{ code: anna, had: anna, was: '30', change: 'changed' }]);
    expect((await replace([{ from: anna, to: carl }]).expect(200)).body.earlierValues).toBe(1);
    expect(await history()).toEqual([{ code: carl, had: carl, was: '30', change: 'changed' }]);
    // And a correction under the new code goes on from there.
    await submitMonth(server, coordinator, site, '2026-01', monthOf(carl, { session: { upright_min: 32 } }));
    expect((await history()).map((row) => row.was).sort()).toEqual(['30', '31']);
  });

  it('makes a preview from before stale and ends a check under way', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const checked = await uploadMonth(
      server,
      coordinator,
      site,
      '2026-02',
      filesOf({ sessions: [...(monthOf(anna).sessions ?? [])], bouts: [...(monthOf(anna).bouts ?? [])] }),
    );
    const checking = await askForCheck(coordinator, site, '2026-03', filesOf(monthOf(anna)));
    await replace([{ from: anna, to: carl }]).expect(200);
    const commit = await coordinator.post(`/api/submissions/${checked.id}/commit`, {
      previewDigest: checked.preview?.digest ?? 'a'.repeat(64),
    });
    expect(codeOf(commit.body)).toBe('submission-stale');
    expect((await coordinator.get(`/api/submissions/${checking}`).expect(200)).body.status).toBe('open');
    // The worker takes its job up too late.
    await checkSubmission(server.context, checking);
    expect((await coordinator.get(`/api/submissions/${checking}`).expect(200)).body).toMatchObject({ status: 'open', preview: null });
  });

  it('has files with the old code refused from then on, also where the registry did not know it', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    await replace([
      { from: anna, to: carl },
      { from: ben, to: dora },
    ]).expect(200);
    for (const [month, code] of [
      ['2026-02', anna],
      ['2026-03', ben],
    ] as const) {
      const checked = await uploadMonth(server, coordinator, site, month, filesOf(monthOf(code, second)));
      expect(checked.preview).toBeNull();
      expect(checked.findings.map((group) => group.rule)).toContain('F38');
    }
    await submitMonth(server, coordinator, site, '2026-04', monthOf(dora, second));
    expect((await contents(site)).codes).toEqual([carl, dora]);
  });

  it('may go on to a third code, and back to the first', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    await replace([{ from: anna, to: ben }]).expect(200);
    await replace([{ from: ben, to: carl }]).expect(200);
    const known = async () =>
      (await server.database.owner.query('select from_code, to_code from replaced_codes where site_id = $1 order by 1', [site.id])).rows;
    expect(await known()).toEqual([
      { from_code: anna, to_code: carl },
      { from_code: ben, to_code: carl },
    ]);
    await replace([{ from: carl, to: anna }]).expect(200);
    expect(await known()).toEqual([
      { from_code: ben, to_code: anna },
      { from_code: carl, to_code: anna },
    ]);
    await submitMonth(server, coordinator, site, '2026-02', monthOf(anna));
    expect((await contents(site)).codes).toEqual([anna]);
  });
});

describe('two codes of one person', () => {
  it('become one: rows of both stay, and what both say stays once', async () => {
    // The same person under two codes; the second coordinator’s month has another day.
    const later = { session_day: 40, session_no: 1 };
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const again = monthOf(ben, { session: later });
    await submitMonth(server, coordinator, site, '2026-02', { ...again, bouts: [rowOf('bouts', { participant: ben, ...later })] });
    const { body } = await replace([{ from: ben, to: anna }]).expect(200);
    expect(body).toMatchObject({ replaced: 1, unknown: 0, joined: 1, rows: 2 });
    const held = async (table: string) =>
      (await server.database.owner.query(`select count(*)::int as n from ${table} where site_id = $1`, [site.id])).rows[0].n;
    expect(await Promise.all(['participants', 'consents', 'sessions', 'bouts', 'course_facts'].map(held))).toEqual([1, 1, 2, 2, 1]);
    const facts = await server.database.owner.query('select participant, sessions, bouts from course_facts where site_id = $1', [site.id]);
    expect(facts.rows).toEqual([{ participant: anna, sessions: 2, bouts: 2 }]);
  });

  it('become a third one', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    await submitMonth(server, coordinator, site, '2026-02', {
      ...monthOf(ben, { session: { session_day: 40 } }),
      bouts: [rowOf('bouts', { participant: ben, session_day: 40 })],
    });
    const { body } = await replace([
      { from: anna, to: carl },
      { from: ben, to: carl },
    ]).expect(200);
    expect(body).toMatchObject({ replaced: 2, joined: 1 });
    expect((await contents(site)).codes).toEqual([carl]);
  });

  it('stay two where they contradict each other; tables and numbers are named, no code is, and nothing has changed', async () => {
    await submitMonth(
      server,
      coordinator,
      site,
      '2026-01',
      together(
        monthOf(anna),
        monthOf(ben, { ...second, session: { upright_min: 31 } }),
        monthOf(carl, { person: { days_injury_to_index: 400 } }),
      ),
    );
    const before = await contents(site);
    const revision = await revisionOf(site);
    const refused = await replace([
      { from: carl, to: dora },
      { from: ben, to: anna },
    ]);
    expect([refused.status, codeOf(refused.body)]).toEqual([409, 'codes-collide']);
    expect(refused.body.detail).toContain('1 in participants, 1 in sessions.');
    for (const code of [anna, ben, carl, dora]) expect(JSON.stringify(refused.body)).not.toContain(code);
    expect(await contents(site)).toEqual(before);
    expect(await revisionOf(site)).toBe(revision);
    expect((await server.database.owner.query('select from replaced_codes where site_id = $1', [site.id])).rowCount).toBe(0);
  });
});

describe('a batch that cannot be understood', () => {
  it.each([
    [
      'a code replaced twice',
      [
        { from: anna, to: carl },
        { from: anna, to: dora },
      ],
      '/body/codes/1/from',
    ],
    [
      'a chain',
      [
        { from: anna, to: ben },
        { from: ben, to: carl },
      ],
      '/body/codes/0/to',
    ],
    [
      'two codes exchanged',
      [
        { from: anna, to: ben },
        { from: ben, to: anna },
      ],
      '/body/codes/0/to',
    ],
    ['a code replaced by itself', [{ from: anna, to: anna }], '/body/codes/0/to'],
    ['a local number', [{ from: '4711', to: carl }], '/body/codes/0/from'],
    ['a code in small letters', [{ from: anna, to: carl.toLowerCase() }], '/body/codes/0/to'],
    ['nothing', [], '/body/codes'],
  ])('is refused as a whole: %s', async (_what, codes, pointer) => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const refused = await replace(codes);
    expect([refused.status, codeOf(refused.body)]).toEqual([400, 'invalid-input']);
    expect(refused.body.errors.map((issue: { pointer: string }) => issue.pointer)).toContain(pointer);
    for (const { from, to } of codes) {
      expect(JSON.stringify(refused.body)).not.toContain(from);
      expect(JSON.stringify(refused.body)).not.toContain(to);
    }
    expect((await contents(site)).codes).toEqual([anna]);
  });

  it('may be as large as a registry: ten thousand pairs', async () => {
    const codes = Array.from({ length: 10_000 }, (_, index) => ({
      from: participantCode(100_000 + index),
      to: participantCode(200_000 + index),
    }));
    expect((await replace(codes).expect(200)).body).toMatchObject({ replaced: 0, unknown: 10_000 });
  });
});

describe('who may replace codes', () => {
  it('is the coordinator of the site; elsewhere the site is not there', async () => {
    const pair = [{ from: anna, to: carl }];
    for (const role of ['therapist', 'researcher', 'steward', 'administrator'] as const) {
      const person = await makePerson(server, { grants: [{ role, ...(role === 'therapist' ? { site } : {}) }] });
      expect((await replace(pair, person)).status, role).toBe(403);
    }
    expect((await replace(pair, otherCoordinator)).status).toBe(404);
    expect((await replace(pair, coordinator, { ...site, id: randomUUID() })).status).toBe(404);
  });
});

describe('at once', () => {
  it('with a commit of the site, one waits for the other and the loser is told', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(monthOf(anna, { session: { upright_min: 33 } })));
    const [committed, replaced] = await Promise.all([
      coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest }),
      replace([{ from: anna, to: carl }]),
    ]);
    expect(replaced.status).toBe(200);
    if (committed.status !== 200) expect(codeOf(committed.body)).toBe('submission-stale');
    expect((await contents(site)).codes).toEqual([carl]);
  });

  it('with another batch, every code ends as one of them says', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const answers = await Promise.all([replace([{ from: anna, to: carl }]), replace([{ from: anna, to: dora }])]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
    expect(answers.map((answer) => answer.body.replaced).sort()).toEqual([0, 1]);
    expect((await contents(site)).codes).toHaveLength(1);
  });
});

describe('a connection lost half-way', () => {
  it('leaves everything as it was', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const before = await contents(site);
    const blocker = new Client({ connectionString: server.database.ownerUrl });
    await blocker.connect();
    await blocker.query('begin');
    // Held back where the rows have their new codes and the history has not.
    await blocker.query('lock table row_history in access exclusive mode');
    const answer = replace([{ from: anna, to: carl }]).then((response) => response);
    const waiting = async (): Promise<number | undefined> =>
      (
        await server.database.owner.query(
          "select pid from pg_stat_activity where wait_event_type = 'Lock' and query like '%replace_codes_in_history%' and datname = current_database()",
        )
      ).rows[0]?.pid;
    let pid = await waiting();
    while (pid === undefined) pid = await waiting();
    await server.database.owner.query('select pg_terminate_backend($1)', [pid]);
    const refused = await answer;
    await blocker.query('rollback');
    await blocker.end();
    expect([refused.status, codeOf(refused.body)]).toEqual([503, 'busy']);
    expect(await contents(site)).toEqual(before);
    // And the same batch does it.
    expect((await replace([{ from: anna, to: carl }]).expect(200)).body.replaced).toBe(1);
  });
});

describe('releases and exports', () => {
  it('keep the codes they were made with, and find the consent of the person under the code of today', async () => {
    await submitMonth(server, coordinator, site, '2026-01', monthOf(anna));
    const steward = await makePerson(server, { grants: [{ role: 'steward' }] });
    const release = (await steward.post('/api/releases', { note: 'Before the codes were replaced' }).expect(201)).body.number as number;
    await replace([{ from: anna, to: ben }]).expect(200);
    await replace([{ from: ben, to: carl }]).expect(200);
    const frozen = await server.database.owner.query('select participant from release_courses where release_number = $1 and site_id = $2', [
      release,
      site.id,
    ]);
    expect(frozen.rows).toEqual([{ participant: anna }]);
    const consents = await asActor(server.database.app, registry, (tx) => readNewestConsents(tx, [{ siteId: site.id, participant: anna }]));
    expect(consents.get(`${site.id} ${anna}`)).toMatchObject({ participant: carl, status: 'active' });
  });

  it('every table with participants is either re-mapped or keeps its codes on purpose', async () => {
    const { rows } = await server.database.owner.query(
      "select table_name from information_schema.columns where table_schema = 'public' and column_name = 'participant' order by 1",
    );
    const replacedIn = [...tableKeys, 'course_facts', 'outcome_facts'];
    // Staged rows belong to previews that are stale; releases never change; exports are found by way of `replaced_codes`.
    const kept = [
      ...tableKeys.map((table) => `staged_${table}`),
      'release_courses',
      'release_outcomes',
      'release_sessions',
      'export_pseudonyms',
    ];
    expect(rows.map((row) => row.table_name)).toEqual([...replacedIn, ...kept].sort());
  });
});
