/** What each role of the database reaches. A row that is not seen is shown, as owner, to exist. */
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { exampleRow, tableKeys } from '../../packages/dictionary/src/index.ts';
import type { Role } from '../../packages/contract/src/index.ts';
import { registry, statistics, type Actor } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { cloneDatabase, type TestDatabase } from '../support/database.ts';

let database: TestDatabase;
const siteA = randomUUID();
const siteB = randomUUID();
const researcherId = randomUUID();
const otherResearcherId = randomUUID();
const requestId = randomUUID();

const person = (role: Role, siteId: string | null = null, accountId: string = randomUUID()): Actor => ({
  kind: 'person',
  accountId,
  name: role,
  institution: null,
  grants: [{ id: randomUUID(), role, siteId }],
});
const coordinatorA = person('coordinator', siteA);
const therapistA = person('therapist', siteA);
const researcher = person('researcher', null, researcherId);
const steward = person('steward');
const administrator = person('administrator');
const systemA: Actor = { kind: 'site-system', systemId: randomUUID(), label: 'A system', siteId: siteA };

const siteTables = [
  'submissions',
  'submission_files',
  'submission_findings',
  'submission_mends',
  'row_history',
  'month_closures',
  'replaced_codes',
  'course_facts',
  'outcome_facts',
  ...tableKeys,
  ...tableKeys.map((table) => `staged_${table}`),
];

/** One row of a site in every table that holds rows of sites. */
async function fillSite(siteId: string): Promise<void> {
  const { owner } = database;
  const insert = async (table: string, row: Record<string, unknown>): Promise<void> => {
    const keys = Object.keys(row);
    await owner.query(
      `insert into ${table} (${keys.join(', ')}) values (${keys.map((_, i) => `$${i + 1}`).join(', ')})`,
      Object.values(row),
    );
  };
  const submission = randomUUID();
  await insert('sites', { id: siteId, code: siteId.slice(0, 3), name: 'A clinic', first_month: '2025-01' });
  await insert('submissions', {
    id: submission,
    site_id: siteId,
    month: '2025-01',
    status: 'open',
    created_by: randomUUID(),
    findings: '[]',
  });
  await insert('submission_files', {
    submission_id: submission,
    table_key: 'bouts',
    site_id: siteId,
    file_name: 'f',
    bytes: 1,
    sha256: 'x',
  });
  await insert('submission_findings', {
    submission_id: submission,
    ordinal: 1,
    site_id: siteId,
    rule: 'C01',
    severity: 'error',
    table_key: 'bouts',
    found: 'x',
    mend: 'x',
  });
  await insert('submission_mends', {
    submission_id: submission,
    table_key: 'bouts',
    line: 2,
    column_key: 'steps',
    site_id: siteId,
    value: '40',
  });
  await insert('safe_headers', { site_id: siteId, header: 'mobile', marked_by: randomUUID() });
  await insert('row_history', {
    site_id: siteId,
    table_key: 'bouts',
    row_key: '{}',
    change: 'changed',
    before: '{}',
    submission_id: submission,
  });
  await insert('replaced_codes', { site_id: siteId, from_code: 'P', to_code: 'Q', replaced_by: randomUUID(), replaced_at: new Date() });
  await insert('month_closures', { site_id: siteId, month: '2025-02', closed_by: randomUUID(), closed_at: new Date() });
  await insert('course_facts', {
    site_id: siteId,
    participant: 'P',
    course_no: 1,
    nli: 'T4',
    level_group: 'T1-T9',
    ais: 'A',
    sessions: 1,
    bouts: 1,
    walking_min: 1,
    distance_m: 1,
    steps: 1,
  });
  await insert('outcome_facts', { site_id: siteId, participant: 'P', course_no: 1, measure: 'tug', in_device: 'no' });
  for (const table of tableKeys) {
    const classes = table === 'exams' ? { class_nli: ['T4'], class_ais: ['A'], class_level_group: 'T1-T9' } : {};
    const row = { ...exampleRow(table), ...classes, site_id: siteId, submission_id: submission };
    await insert(table, { ...row, month: '2025-01' });
    await insert(`staged_${table}`, { ...row, line: 2 });
  }
}

beforeAll(async () => {
  database = await cloneDatabase();
  await fillSite(siteA);
  await fillSite(siteB);
  const { owner } = database;
  await owner.query(
    `insert into access_requests (id, number, status, lead_id, form, version_hash, votes_needed_because) values ($1, 'AR-2026-0001', 'draft', $2, '{}', 'x', '[]')`,
    [requestId, researcherId],
  );
  await owner.query(
    `insert into release_courses (release_number, site_id, participant, course_no, nli, level_group, ais, sessions, bouts, walking_min, distance_m, steps)
    values (1, $1, 'P', 1, 'T4', 'T1-T9', 'A', 1, 1, 1, 1, 1)`,
    [siteA],
  );
  await owner.query(`insert into export_pseudonyms values ($1, 'R1', $2, 'P')`, [randomUUID(), siteA]);
  await owner.query(`insert into mail_messages (id, event, recipient, subject, body) values ($1, 'e', 'r@test.example', 's', 'b')`, [
    randomUUID(),
  ]);
});
afterAll(() => database.close());

const count = (actor: Actor, table: string, where = 'true'): Promise<number> =>
  asActor(
    database.app,
    actor,
    async (tx) => ((await tx.query(`select count(*)::int as n from ${table} where ${where}`)) as [{ n: number }])[0].n,
  );
const thereAre = async (table: string): Promise<number> =>
  (await database.owner.query(`select count(*)::int as n from ${table}`)).rows[0].n;
const refused = { code: '42501' };

describe.each(siteTables)('rows of a site in %s', (table) => {
  it('are reached by the people of that site, by stewards and the registry, and by nobody else', async () => {
    expect(await thereAre(table)).toBe(2);
    expect(await count(coordinatorA, table)).toBe(1);
    expect(await count(coordinatorA, table, `site_id = '${siteB}'`)).toBe(0);
    expect(await count(therapistA, table)).toBe(1);
    expect(await count(systemA, table)).toBe(1);
    expect(await count(systemA, table, `site_id = '${siteB}'`)).toBe(0);
    expect(await count(registry, table)).toBe(2);
    expect(await count(steward, table)).toBe(table.startsWith('staged_') || table === 'submission_mends' ? 0 : 2);
    for (const stranger of [researcher, administrator, statistics, { kind: 'nobody' } as Actor])
      expect(await count(stranger, table)).toBe(0);
  });

  it('are written by its coordinator and its system alone', async () => {
    const copy = (actor: Actor, siteId: string) =>
      asActor(database.app, actor, async (tx) => {
        // The row goes in again under another submission or participant, and out again with the transaction.
        await tx.query(`insert into ${table} select (jsonb_populate_record(null::${table}, $1::jsonb)).*`, [await otherRow(table, siteId)]);
        throw new Error('taken back');
      });
    for (const actor of [coordinatorA, systemA]) await expect(copy(actor, siteA)).rejects.toThrow('taken back');
    for (const actor of [therapistA, steward, researcher, administrator]) await expect(copy(actor, siteA)).rejects.toMatchObject(refused);
    for (const actor of [coordinatorA, systemA]) await expect(copy(actor, siteB)).rejects.toMatchObject(refused);
  });
});

async function otherRow(table: string, siteId: string): Promise<string> {
  const { rows } = await database.owner.query(`select to_jsonb(t) as row from ${table} t where site_id = $1`, [siteId]);
  const row = rows[0].row as Record<string, unknown>;
  for (const column of ['participant', 'row_key']) if (column in row) row[column] = column === 'row_key' ? {} : 'OTHER';
  if (table.startsWith('sub')) row[table === 'submissions' ? 'id' : 'submission_id'] = randomUUID();
  if (table === 'row_history') row['id'] = 900_000;
  if (table === 'replaced_codes') row['from_code'] = 'OTHER';
  if (table === 'month_closures') row['month'] = '2025-03';
  if (table.startsWith('staged_')) row['line'] = 3;
  return JSON.stringify(row);
}

describe('headers marked as safe', () => {
  it('are read at their site, by stewards and by the registry', async () => {
    for (const actor of [coordinatorA, therapistA, systemA]) expect(await count(actor, 'safe_headers')).toBe(1);
    for (const actor of [steward, registry]) expect(await count(actor, 'safe_headers')).toBe(2);
    for (const actor of [researcher, administrator, statistics]) expect(await count(actor, 'safe_headers')).toBe(0);
  });

  it('are marked by stewards alone', async () => {
    const mark = (actor: Actor) =>
      asActor(database.app, actor, async (tx) => {
        await tx.query("insert into safe_headers (site_id, header, marked_by) values ($1, 'clock', $2)", [siteA, randomUUID()]);
        throw new Error('taken back');
      });
    await expect(mark(steward)).rejects.toThrow('taken back');
    for (const actor of [coordinatorA, therapistA, systemA, registry, administrator])
      await expect(mark(actor)).rejects.toMatchObject(refused);
    const unmark = (actor: Actor) =>
      asActor(database.app, actor, async (tx) => ((await tx.query('delete from safe_headers')) as [unknown, number])[1]);
    for (const actor of [coordinatorA, registry, administrator]) expect(await unmark(actor)).toBe(0);
  });
});

describe('the history of rows', () => {
  it('is changed by nobody but for the codes in its keys, and those only by the people of the site', async () => {
    for (const actor of [coordinatorA, systemA, steward])
      await expect(asActor(database.app, actor, (tx) => tx.query("update row_history set before = '{}'"))).rejects.toMatchObject(refused);
    const replace = (actor: Actor, siteId: string) =>
      asActor(database.app, actor, (tx) => tx.query("select replace_codes_in_history($1, array['P'], array['Q'])", [siteId]));
    for (const actor of [therapistA, steward, administrator]) await expect(replace(actor, siteA)).rejects.toMatchObject(refused);
    for (const actor of [coordinatorA, systemA]) await expect(replace(actor, siteB)).rejects.toMatchObject(refused);
    await expect(replace(coordinatorA, siteA)).resolves.toEqual([{ replace_codes_in_history: '0' }]);
  });
});

describe('rows of people and of the registry', () => {
  it('of a draft request are reached by its lead alone', async () => {
    expect(await count(researcher, 'access_requests')).toBe(1);
    for (const actor of [steward, person('researcher', null, otherResearcherId), coordinatorA, administrator])
      expect(await count(actor, 'access_requests')).toBe(0);
  });

  it('of a draft request are deleted by its lead alone, and of a request that was handed in by nobody', async () => {
    const remove = (actor: Actor, id: string) =>
      asActor(
        database.app,
        actor,
        async (tx) => ((await tx.query('delete from access_requests where id = $1', [id])) as [unknown, number])[1],
      );
    const [draft, submitted] = [randomUUID(), randomUUID()];
    for (const [id, status] of [
      [draft, 'draft'],
      [submitted, 'submitted'],
    ])
      await database.owner.query(
        `insert into access_requests (id, number, status, lead_id, form, version_hash, votes_needed_because) values ($1, $2, $2, $3, '{}', 'x', '[]')`,
        [id, status, researcherId],
      );
    for (const actor of [steward, registry, person('researcher', null, otherResearcherId), administrator])
      expect(await remove(actor, draft)).toBe(0);
    expect(await remove(researcher, submitted)).toBe(0);
    expect(await remove(researcher, draft)).toBe(1);
    await database.owner.query('delete from access_requests where id = $1', [submitted]);
  });

  it('of releases are read by the statistics of the registry, never by a person', async () => {
    expect(await count(statistics, 'release_courses')).toBe(1);
    for (const actor of [researcher, steward, coordinatorA, administrator]) expect(await count(actor, 'release_courses')).toBe(0);
  });

  it('that link exports to people, and the outbox, are reached by the registry alone', async () => {
    for (const table of ['export_pseudonyms', 'mail_messages']) {
      expect(await thereAre(table)).toBe(1);
      expect(await count(registry, table)).toBe(1);
      for (const actor of [researcher, steward, coordinatorA, administrator, statistics]) expect(await count(actor, table)).toBe(0);
    }
  });

  it("of sites' systems are reached by administrators, stewards and the registry, and not by a system itself", async () => {
    await database.owner.query(`insert into site_systems (id, site_id, issuer, subject, label) values ($1, $2, 'i', 's', 'A system')`, [
      randomUUID(),
      siteA,
    ]);
    for (const actor of [registry, steward, administrator]) expect(await count(actor, 'site_systems')).toBe(1);
    for (const actor of [systemA, coordinatorA, therapistA, researcher, statistics]) expect(await count(actor, 'site_systems')).toBe(0);
    const change = (actor: Actor) =>
      asActor(database.app, actor, async (tx) => ((await tx.query("update site_systems set status = 'disabled'")) as [unknown, number])[1]);
    for (const actor of [steward, systemA, coordinatorA]) expect(await change(actor)).toBe(0);
    expect(await change(administrator)).toBe(1);
  });

  it("of people and of requests are out of a system's reach", async () => {
    await database.owner.query("insert into accounts (id, issuer, subject, name) values ($1, 'i', 's', 'A person')", [randomUUID()]);
    for (const table of [
      'accounts',
      'grants',
      'invitations',
      'access_requests',
      'release_courses',
      'export_pseudonyms',
      'mail_messages',
      'audit_entries',
    ])
      expect(await count(systemA, table), table).toBe(0);
    expect(await count(systemA, 'sites')).toBe(1);
  });

  it('tell the people and the system of a site whom to write to about it, and nobody else', async () => {
    const account = randomUUID();
    await database.owner.query(
      "insert into accounts (id, issuer, subject, name, email) values ($1, 'i', 'c', 'A coordinator', 'c@test.example')",
      [account],
    );
    await database.owner.query(
      "insert into grants (id, account_id, role, site_id, starts_on) values ($1, $2, 'coordinator', $3, '2026-01-01')",
      [randomUUID(), account, siteA],
    );
    const addresses = (actor: Actor, siteId: string) =>
      asActor(database.app, actor, (tx) => tx.query("select coordinator_addresses($1, '2026-06-01') as email", [siteId]));
    for (const actor of [coordinatorA, systemA, registry]) expect(await addresses(actor, siteA)).toEqual([{ email: 'c@test.example' }]);
    for (const actor of [therapistA, researcher, steward, administrator])
      await expect(addresses(actor, siteA)).rejects.toMatchObject(refused);
    for (const actor of [coordinatorA, systemA]) await expect(addresses(actor, siteB)).rejects.toMatchObject(refused);
  });

  it('of sessions in the browser are out of reach of every request', async () => {
    for (const actor of [registry, steward, administrator]) await expect(count(actor, 'web_sessions')).rejects.toMatchObject(refused);
  });
});

describe('the login of the application', () => {
  it('reaches nothing by itself', async () => {
    for (const table of ['sites', 'participants', 'accounts', 'audit_entries', 'web_sessions']) {
      await expect(database.app.query(`select 1 from ${table}`)).rejects.toMatchObject(refused);
    }
  });

  it('owns nothing and cannot become who does', async () => {
    const { rows } = await database.owner.query(
      `select rolsuper or rolbypassrls or rolinherit as strong from pg_roles where rolname in ('cairnstep_login', 'cairnstep_app') and rolname = 'cairnstep_login'`,
    );
    expect(rows).toEqual([{ strong: false }]);
    const owned = await database.owner.query(
      `select count(*)::int as n from pg_class where relowner in (select oid from pg_roles where rolname in ('cairnstep_login', 'cairnstep_app', 'cairnstep_session', 'cairnstep_jobs'))`,
    );
    expect(owned.rows[0].n).toBe(0);
    await expect(database.app.query('set role cairnstep_owner')).rejects.toMatchObject(refused);
  });

  it('keeps no scope from one transaction to the next', async () => {
    expect(await count(registry, 'sites')).toBe(2);
    await expect(database.app.query('select count(*) from sites')).rejects.toMatchObject(refused);
    const [{ left }] = await database.app.query(`select nullif(current_setting('cairnstep.roles', true), '') as left`);
    expect(left).toBeNull();
  });
});

describe('every table', () => {
  it('has row-level security, forced', async () => {
    const { rows } = await database.owner.query(
      `select relname from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p') and not (relrowsecurity and relforcerowsecurity)`,
    );
    expect(rows).toEqual([{ relname: 'schema_migrations' }]);
  });
});

describe('the audit log', () => {
  it('cannot be changed, emptied or shortened, neither by the application nor by its owner', async () => {
    await asActor(database.app, registry, (tx) =>
      tx.query(
        `insert into audit_entries values (1, now(), 'system', 'system', 'test', null, 'ok', '{}', repeat('0', 64), repeat('1', 64))`,
      ),
    );
    for (const change of [`update audit_entries set act = 'x'`, 'delete from audit_entries', 'truncate audit_entries']) {
      await expect(asActor(database.app, registry, (tx) => tx.query(change))).rejects.toMatchObject(refused);
      await expect(database.owner.query(`begin; set local role cairnstep_owner; ${change}; commit`)).rejects.toMatchObject(refused);
      await database.owner.query('rollback');
    }
    expect(await thereAre('audit_entries')).toBe(1);
  });
});
