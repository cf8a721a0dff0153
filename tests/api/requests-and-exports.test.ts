/** From an access request to rows: votes, mails, consent, protection, download. */
import { createHash } from 'node:crypto';
import { strFromU8, unzipSync } from 'fflate';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { AccessRequest, DataExport, Grid, RequestForm } from '../../packages/contract/src/index.ts';
import type { z } from 'zod';
import { buildExport } from '../../services/api/src/features/exports/build-export.ts';
import { examCells } from '../support/exams.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { completeForm, emptyForm } from '../support/request-form.ts';
import { participantCode, rowOf, type Overrides } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { submitMonth } from '../support/submit-month.ts';

type Request = z.output<typeof AccessRequest>;

let server: TestServer;
const sites: TestSite[] = [];
const coordinators: TestPerson[] = [];
let researcher: TestPerson;
let member: TestPerson;
let stranger: TestPerson;
let steward: TestPerson;
let secondSteward: TestPerson;

/** Of every ten people at a site: eight consent to research, one to another condition only, one has withdrawn. */
const consentOf = (number: number): Overrides => {
  if (number % 10 === 8) return { permission: 'DS', condition: 'non_traumatic_sci' };
  return { permission: 'GRU' };
};
const peoplePerSite = 20;

async function submitSite(index: number): Promise<void> {
  const site = sites[index];
  const coordinator = coordinators[index];
  if (!site || !coordinator) throw new Error('sites are made first');
  const numbers = Array.from({ length: peoplePerSite }, (_, i) => i);
  const code = (number: number) => participantCode(1000 * (index + 1) + number);
  const speed = (participant: string, value: number, day: number, timepoint: string) =>
    rowOf('assessments', { participant, value, assessment_day: day, timepoint, time_s: Number((10 / value).toFixed(2)) });
  await submitMonth(server, coordinator, site, '2026-01', {
    participants: numbers.map((n) =>
      rowOf('participants', {
        participant: code(n),
        age_at_index: 25 + ((n * 7 + index) % 50),
        sex: n % 4 === 0 ? 'female' : 'male',
        injury_year: 2000 + n,
        days_injury_to_index: 700 + n,
      }),
    ),
    consents: numbers.map((n) => rowOf('consents', { participant: code(n), ...consentOf(n) })),
    exams: numbers.map((n) =>
      rowOf('exams', { participant: code(n), exam_day: -2, ...examCells(n % 2 === 0 ? 'T4' : 'T11', n % 4 < 2 ? 'C' : 'D') }),
    ),
    sessions: numbers.map((n) => rowOf('sessions', { participant: code(n), upright_min: 30, steps_total: null, distance_total_m: null })),
    bouts: numbers.map((n) => rowOf('bouts', { participant: code(n) })),
    assessments: numbers.flatMap((n) => [speed(code(n), 0.3 + n / 100, -1, 'baseline'), speed(code(n), 0.4 + n / 80, 40, 'end_of_course')]),
  });
}

const withdraw = (index: number, number: number): Promise<unknown> => {
  const participant = participantCode(1000 * (index + 1) + number);
  return submitMonth(server, coordinators[index] as TestPerson, sites[index] as TestSite, '2026-02', {
    consents: [
      rowOf('consents', {
        participant,
        consent_no: 2,
        signed_day: 60,
        ...consentOf(number),
        status: 'withdrawn',
        withdrawal_scope: 'no_further_use',
      }),
    ],
  });
};

beforeAll(async () => {
  server = await startTestServer();
  for (let i = 0; i < 3; i += 1) {
    const site = await makeSite(server);
    sites.push(site);
    coordinators.push(await makePerson(server, { grants: [{ role: 'coordinator', site }] }));
    await submitSite(i);
  }
  await withdraw(0, 9);
  researcher = await makePerson(server, { grants: [{ role: 'researcher' }], name: 'Lead', institution: 'Lakeside University' });
  member = await makePerson(server, { grants: [{ role: 'researcher' }], name: 'Member' });
  stranger = await makePerson(server, { grants: [{ role: 'researcher' }], name: 'Other researcher' });
  steward = await makePerson(server, { grants: [{ role: 'steward' }], name: 'First steward', institution: 'Registry office' });
  secondSteward = await makePerson(server, { grants: [{ role: 'steward' }], name: 'Second steward', institution: 'Lakeside University' });
  await steward.post('/api/releases', { note: 'for the tests' }).expect(201);
});
afterAll(() => server.close());

const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');
const begin = async (form: RequestForm, who = researcher): Promise<Request> =>
  (await who.post('/api/access-requests', { form }).expect(201)).body as Request;
const submit = async (form: RequestForm = completeForm, who = researcher): Promise<Request> => {
  const draft = await begin(form, who);
  return (await who.post(`/api/access-requests/${draft.id}/submit`).expect(200)).body as Request;
};
const vote = (who: TestPerson, request: Request, choice: 'approve' | 'decline') =>
  who.post(`/api/access-requests/${request.id}/votes`, {
    versionHash: request.versionHash,
    vote: choice,
    reason: 'a proper use within consent',
    noConflict: true,
  });
const mailsAbout = async (event: string): Promise<string[]> =>
  (await server.database.owner.query('select recipient from mail_messages where event like $1 order by recipient', [`${event}%`])).rows.map(
    (row: { recipient: string }) => row.recipient,
  );
const approved = async (form: RequestForm = completeForm): Promise<Request> => {
  const request = await submit(form);
  return (await vote(steward, request, 'approve').expect(200)).body as Request;
};
const built = async (request: Request): Promise<DataExport> => {
  const asked = (await researcher.post(`/api/access-requests/${request.id}/exports`).expect(202)).body as DataExport;
  await buildExport(server.context, asked.id);
  return (await researcher.get('/api/exports').expect(200)).body.exports.find((one: DataExport) => one.id === asked.id) as DataExport;
};
const download = (who: TestPerson, id: string) =>
  who
    .get(`/api/exports/${id}/file`)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
const lines = (text: string): string[][] =>
  text
    .trimEnd()
    .split('\r\n')
    .map((line) => line.split(','));

describe('a request', () => {
  it('keeps a draft as typed and names every gap when it is submitted', async () => {
    const draft = await begin({ ...emptyForm, title: 'Half a thought' });
    await researcher
      .put(`/api/access-requests/${draft.id}`, { form: { ...emptyForm, title: 'Half a thought', question: 'why' } })
      .expect(200);
    const refused = await researcher.post(`/api/access-requests/${draft.id}/submit`);
    expect(codeOf(refused.body)).toBe('request-incomplete');
    expect(refused.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(
      expect.arrayContaining([
        '/form/question',
        '/form/laySummary',
        '/form/purpose',
        '/form/ethicsExpiresOn',
        '/form/tables',
        '/form/termsAccepted',
      ]),
    );
    expect((await researcher.get(`/api/access-requests/${draft.id}`)).body.form.question).toBe('why');
  });

  it('reaches the desk and the mailboxes of the stewards, once', async () => {
    const request = await submit();
    expect(await mailsAbout(`request-submitted:${request.id}`)).toEqual([steward.email, secondSteward.email].sort());
    const desk = await steward.get('/api/access-requests').expect(200);
    expect(desk.body.requests.find((one: { id: string }) => one.id === request.id)).toMatchObject({ waitsForYou: true, lead: 'Lead' });
    expect((await stranger.get('/api/access-requests')).body.requests.some((one: { id: string }) => one.id === request.id)).toBe(false);
    expect((await researcher.put(`/api/access-requests/${request.id}`, { form: completeForm })).status).toBe(409);
  });

  it('names team members the registry does not know', async () => {
    const draft = await begin({ ...completeForm, team: [member.email, 'nobody@elsewhere.example'] });
    const refused = await researcher.post(`/api/access-requests/${draft.id}/submit`);
    expect(refused.body.errors).toEqual([expect.objectContaining({ pointer: '/form/team/1' })]);
  });

  it('shows a researcher rounded reach and a steward the exact one with its reasons', async () => {
    const request = await submit();
    // 60 people less the one who withdrew before the release; of them 2 a site consented to another condition only.
    expect((await steward.get(`/api/access-requests/${request.id}/reach`).expect(200)).body).toEqual({
      inCohort: 59,
      consenting: 53,
      openQuestions: [],
      reasons: [expect.objectContaining({ verdict: 'not_permitted', participants: 6 })],
    });
    expect((await researcher.get(`/api/access-requests/${request.id}/reach`).expect(200)).body).toEqual({
      inCohort: 60,
      consenting: 55,
      openQuestions: [],
      reasons: [],
    });
  });
});

describe('a draft', () => {
  it('tells whom it reaches, and which answers are missing before it can tell who consents', async () => {
    const draft = await begin({ ...completeForm, country: null, months: null });
    expect((await researcher.get(`/api/access-requests/${draft.id}/reach`).expect(200)).body).toEqual({
      inCohort: 60,
      consenting: null,
      openQuestions: ['country', 'months'],
      reasons: [],
    });
  });

  it('is deleted by its lead alone, and nothing of it stays but the entry in the log', async () => {
    const draft = await begin(completeForm);
    const path = `/api/access-requests/${draft.id}`;
    expect(draft.actions).toEqual(['edit', 'submit', 'delete']);
    for (const other of [stranger, member]) expect((await other.delete(path)).status).toBe(404);
    await researcher.delete(path).expect(200);
    expect((await researcher.get(path)).status).toBe(404);
    expect((await server.database.owner.query('select from access_requests where id = $1', [draft.id])).rowCount).toBe(0);
    const { rows } = await server.database.owner.query('select act from audit_entries where object = $1 order by seq', [draft.id]);
    expect(rows.map(({ act }) => act)).toEqual(['request.begin', 'request.delete']);
  });

  it('is deleted only until it is handed in, from when on it can be taken back', async () => {
    const request = await submit();
    const path = `/api/access-requests/${request.id}`;
    expect(request.actions).toEqual(['withdraw']);
    expect(codeOf((await researcher.delete(path)).body)).toBe('request-not-in-state');
    expect((await researcher.post(`${path}/withdraw`).expect(200)).body.status).toBe('withdrawn');
    const draft = await begin(completeForm);
    expect(codeOf((await researcher.post(`/api/access-requests/${draft.id}/withdraw`)).body)).toBe('request-not-in-state');
  });
});

describe('a decision', () => {
  it('by one steward approves, and both are told by mail', async () => {
    const request = await approved();
    expect(request).toMatchObject({ status: 'approved', votesNeeded: 1 });
    expect(await mailsAbout(`request-decided:${request.id}`)).toEqual([researcher.email, steward.email].sort());
    const seen = (await researcher.get(`/api/access-requests/${request.id}`).expect(200)).body as Request;
    expect(seen.votes).toEqual([expect.objectContaining({ steward: 'First steward', vote: 'approve' })]);
    expect(seen.actions).toContain('build-export');
  });

  it('declines with a reason that reaches the requester', async () => {
    const request = await submit();
    const declined = (await vote(steward, request, 'decline').expect(200)).body as Request;
    expect(declined.status).toBe('declined');
    const { rows } = await server.database.owner.query('select body from mail_messages where event like $1 and recipient = $2', [
      `request-decided:${request.id}%`,
      researcher.email,
    ]);
    expect(rows[0].body).toContain('a proper use within consent');
    expect(codeOf((await researcher.post(`/api/access-requests/${request.id}/exports`)).body)).toBe('request-not-in-state');
  });

  it('needs two stewards where somebody has a commercial interest; the first vote stays unseen until the second is cast', async () => {
    const request = await submit({ ...completeForm, commercialInterest: 'yes' });
    expect(request.votesNeeded).toBe(2);
    const first = (await vote(steward, request, 'approve').expect(200)).body as Request;
    expect(first.status).toBe('in_review');
    expect((await secondSteward.get(`/api/access-requests/${request.id}`)).body.votes).toEqual([]);
    expect((await researcher.get(`/api/access-requests/${request.id}`)).body.votes).toEqual([]);
    expect(codeOf((await vote(steward, request, 'approve')).body)).toBe('already-voted');
    const third = await makePerson(server, { grants: [{ role: 'steward' }], institution: 'Northern College' });
    expect((await vote(third, request, 'approve').expect(200)).body.status).toBe('approved');
  });

  it('on a request of the own institution needs a second steward from elsewhere', async () => {
    const request = await submit();
    const first = (await vote(secondSteward, request, 'approve').expect(200)).body as Request;
    expect(first).toMatchObject({ status: 'in_review', votesNeeded: 2 });
    const colleague = await makePerson(server, { grants: [{ role: 'steward' }], institution: 'Lakeside University' });
    expect(codeOf((await vote(colleague, request, 'approve')).body)).toBe('conflict-of-interest');
    expect((await vote(steward, request, 'approve').expect(200)).body.status).toBe('approved');
  });

  it('is never given by a member of the team, in either role', async () => {
    const both = await makePerson(server, { grants: [{ role: 'researcher' }, { role: 'steward' }] });
    const own = await submit(completeForm, both);
    expect(codeOf((await vote(both, own, 'approve')).body)).toBe('conflict-of-interest');
    const request = await submit({ ...completeForm, team: [both.email] });
    expect(codeOf((await vote(both, request, 'approve')).body)).toBe('conflict-of-interest');
  });

  it('is bound to the version that was read', async () => {
    const request = await submit();
    const answer = await vote(steward, { ...request, versionHash: 'c'.repeat(64) }, 'approve');
    expect(codeOf(answer.body)).toBe('request-not-in-state');
    expect((await steward.get(`/api/access-requests/${request.id}`)).body.status).toBe('submitted');
  });

  it('of one steward in two tabs counts once', async () => {
    const request = await submit({ ...completeForm, commercialInterest: 'yes' });
    const answers = await Promise.all([vote(steward, request, 'approve'), vote(steward, request, 'approve')]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect((await steward.get(`/api/access-requests/${request.id}`)).body.status).toBe('in_review');
  });
});

describe('an export', () => {
  it('holds the people whose consent allows it, under new codes, with codebook and checksums', async () => {
    const request = await approved();
    const ready = await built(request);
    expect(ready.status).toBe('ready');
    const answer = await download(researcher, ready.id).expect(200);
    expect(answer.headers['content-disposition']).toBe(`attachment; filename="${ready.number}.zip"`);
    expect(answer.headers['content-type']).toBe('application/zip');
    const files = Object.fromEntries(Object.entries(unzipSync(answer.body as Uint8Array)).map(([name, bytes]) => [name, strFromU8(bytes)]));
    expect(Object.keys(files)).toEqual(['participants.csv', 'outcomes.csv', 'codebook.csv', 'README.md', 'manifest-sha256.txt']);

    const [header, ...people] = lines(files['participants.csv'] ?? '');
    expect(header).toEqual(['participant', 'level_group', 'ais', 'age_band', 'sex']);
    expect(people.length).toBeLessThanOrEqual(53);
    expect(people.length).toBeGreaterThanOrEqual(50);
    expect(people.every((row) => /^R[0-9A-HJKMNP-TV-Z]{12}$/.test(row[0] ?? ''))).toBe(true);
    const codebook = files['codebook.csv'] ?? '';
    for (const column of header ?? []) expect(codebook).toContain(`participants,${column},`);
    for (const line of (files['manifest-sha256.txt'] ?? '').trimEnd().split('\n')) {
      const [hash, name] = line.split('  ') as [string, string];
      expect(
        createHash('sha256')
          .update(files[name] ?? '')
          .digest('hex'),
      ).toBe(hash);
    }
    // Nothing of the registry's own: no code of a site, no site, no study day.
    const everything = Object.values(files).join('\n');
    expect(everything).not.toMatch(/S0{10}/);
    for (const site of sites) expect(everything).not.toContain(site.name);

    // k-anonymity counted again from the file itself.
    const classes = new Map<string, number>();
    for (const row of people) classes.set(row.slice(1).join(), (classes.get(row.slice(1).join()) ?? 0) + 1);
    expect(Math.min(...classes.values())).toBeGreaterThanOrEqual(5);
  });

  it('gives the on-screen mean again from its rows', async () => {
    // Everyone left in the cohort consents when the two who consented elsewhere and the one withdrawn are out: compare over the export's own people.
    const request = await approved();
    const ready = await built(request);
    const files = unzipSync((await download(researcher, ready.id).expect(200)).body as Uint8Array);
    const rows = lines(strFromU8(files['outcomes.csv'] ?? new Uint8Array()))
      .slice(1)
      .filter((row) => row[1] === 'tmwt_ss' && row[2] === 'no');
    const { rows: truth } = await server.database.owner.query(
      `select avg(o.end_value - o.baseline_value) as mean, count(*)::int as n from release_outcomes o
         join export_pseudonyms x on x.export_id = $1 and x.site_id = o.site_id and x.participant = o.participant where o.measure = 'tmwt_ss' and o.release_number = 1`,
      [ready.id],
    );
    const changes = rows.map((row) => Number(row[6]) - Number(row[4]));
    expect(changes).toHaveLength(truth[0].n);
    expect(changes.reduce((sum, change) => sum + change, 0) / changes.length).toBeCloseTo(truth[0].mean, 9);
    const grid = (await researcher.get('/api/explore/grid?outcome=tmwt_ss').expect(200)).body as Grid;
    expect(grid.total).toMatchObject({ state: 'shown', n: 59 });
  });

  it('uses other codes for the same people each time', async () => {
    const request = await approved();
    const [one, two] = [await built(request), await built(request)];
    const { rows } = await server.database.owner.query(
      'select count(distinct pseudonym)::int as codes, count(distinct participant)::int as people from export_pseudonyms where export_id in ($1, $2)',
      [one.id, two.id],
    );
    expect(rows[0].codes).toBe(2 * rows[0].people);
  });

  it('is reached by the named team alone', async () => {
    const request = await approved({ ...completeForm, team: [member.email] });
    const ready = await built(request);
    await download(member, ready.id).expect(200);
    await stranger.get(`/api/exports/${ready.id}/file`).expect(404);
    expect(codeOf((await steward.get(`/api/exports/${ready.id}/file`)).body)).toBe('not-permitted');
    await supertest(server.url).get(`/api/exports/${ready.id}/file`).expect(401);
  });

  it('ends with access and with the ethics approval', async () => {
    const request = await approved();
    const ready = await built(request);
    await server.database.owner.query("update access_requests set access_ends_on = (now() at time zone 'UTC')::date - 1 where id = $1", [
      request.id,
    ]);
    expect(codeOf((await researcher.get(`/api/exports/${ready.id}/file`)).body)).toBe('access-ended');
    await server.database.owner.query("update access_requests set access_ends_on = (now() at time zone 'UTC')::date where id = $1", [
      request.id,
    ]);
    await download(researcher, ready.id).expect(200);
    await server.database.owner.query(
      `update access_requests set form = jsonb_set(form, '{ethicsExpiresOn}', '"2020-01-01"') where id = $1`,
      [request.id],
    );
    expect(codeOf((await researcher.get(`/api/exports/${ready.id}/file`)).body)).toBe('access-ended');
  });

  it('is refused when a byte of it was changed', async () => {
    const ready = await built(await approved());
    await server.database.owner.query('update exports set content = set_byte(content, 40, 1) where id = $1', [ready.id]);
    await researcher.get(`/api/exports/${ready.id}/file`).expect(500);
  });

  it('is withheld after somebody in it withdraws, and built anew without them', async () => {
    const request = await approved();
    const before = await built(request);
    await download(researcher, before.id).expect(200);
    await withdraw(1, 3);
    expect(codeOf((await researcher.get(`/api/exports/${before.id}/file`)).body)).toBe('export-stale');
    const after = await built(request);
    expect(after.status).toBe('ready');
    const gone = await server.database.owner.query(
      'select count(*)::int as n from export_pseudonyms where export_id = $1 and participant = $2',
      [after.id, participantCode(2003)],
    );
    expect(gone.rows[0].n).toBe(0);
  });

  it('is not built for too few people', async () => {
    const request = await approved({
      ...completeForm,
      cohort: { outcome: 'tmwt_ss', inDevice: false, cells: [{ levelGroup: 'c1_c4', grade: 'A' }] },
    });
    expect((await built(request)).status).toBe('failed');
  });
});
