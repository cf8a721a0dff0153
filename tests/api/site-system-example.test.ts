/** The script of the page for developers, run as it stands there: curl, the local identity provider, the API, a worker. */
import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { drawFreePort } from '../../infra/network/ports.ts';
import { SubmissionReceipt } from '../../packages/contract/src/index.ts';
import { startFakeOidc, type FakeOidc } from '../../services/fake-oidc/src/index.ts';
import { makePerson, makeSite, type TestSite } from '../support/people.ts';
import { startWorkerProcess, type TestProcess } from '../support/processes.ts';
import { csvOf, rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

const script = fileURLToPath(new URL('../../services/web/src/features/public/submit-month.sh', import.meta.url));
const clientId = 'demo-system-alder';
const clientSecret = 'a secret that only the tests know';

let server: TestServer;
let provider: FakeOidc;
let worker: TestProcess;
let site: TestSite;
let folder: string;

beforeAll(async () => {
  const port = await drawFreePort();
  server = await startTestServer({ OIDC_ISSUER: `http://127.0.0.1:${port}` });
  provider = await startFakeOidc({
    port,
    clientId: server.config.OIDC_CLIENT_ID,
    clientSecret: server.config.OIDC_CLIENT_SECRET,
    redirectUris: [`${server.url}/api/sign-in/callback`],
    postLogoutRedirectUris: [],
    people: [],
    machineClients: [{ clientId, clientSecret }],
    resource: `${server.url}/api`,
  });
  worker = await startWorkerProcess(server.config);
  site = await makeSite(server);
  const administrator = await makePerson(server, { grants: [{ role: 'administrator' }] });
  await administrator.post('/api/site-systems', { siteId: site.id, subject: clientId, label: 'Training records' }).expect(201);
  folder = await mkdtemp(join(tmpdir(), 'cairnstep-month-'));
  for (const table of ['participants', 'consents'] as const) await writeFile(join(folder, `${table}.csv`), csvOf(table, [rowOf(table)]));
});
afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
  await worker.stop();
  await provider.close();
  await server.close();
});

interface Ended {
  readonly code: number;
  readonly stdout: string;
  readonly stderr: string;
}
async function run(changes: NodeJS.ProcessEnv): Promise<Ended> {
  const environment = {
    PATH: process.env['PATH'],
    REGISTRY: server.url,
    TOKEN_ENDPOINT: `${provider.issuer}/token`,
    CLIENT_ID: clientId,
    CLIENT_SECRET: clientSecret,
    FOLDER: folder,
    ...changes,
  };
  return promisify(execFile)('sh', [script], { env: environment }).then(
    ({ stdout, stderr }) => ({ code: 0, stdout, stderr }),
    (error: { code: number; stdout: string; stderr: string }) => ({ code: error.code, stdout: error.stdout, stderr: error.stderr }),
  );
}
/** For every rule that a run has named. */
const reasonsFor = ({ stderr }: Ended, reason: string): Record<string, string> =>
  Object.fromEntries([...stderr.matchAll(/REASON_[A-Z]\d+/g)].map(([name]) => [name, reason]));
const statesOf = async (month: string): Promise<string[]> =>
  (await server.database.owner.query('select status from submissions where month = $1 order by created_at', [month])).rows.map(
    (row) => row.status,
  );

describe('the example for developers', () => {
  it('submits a month and prints its receipt', async () => {
    const ended = await run({ MONTH: '2026-01' });
    expect(ended).toMatchObject({ code: 0 });
    expect(ended.stderr).toContain('participants: 1 added, 0 changed, 0 unchanged, 0 removed');
    expect(SubmissionReceipt.parse(JSON.parse(ended.stdout))).toMatchObject({ site, month: '2026-01', acceptedBy: 'Training records' });
    expect(await statesOf('2026-01')).toEqual(['accepted']);
  });

  it('takes a reason for each rule that warns, and commits nothing without one', async () => {
    // A resting heart rate that is unusual, not impossible.
    await writeFile(join(folder, 'sessions.csv'), csvOf('sessions', [rowOf('sessions', { hr_rest: 120 })]));
    const refused = await run({ MONTH: '2026-02', REASON: 'Whatever it is', REASON_F51: 'Another rule' });
    expect(refused.code).toBe(1);
    expect(refused.stdout).toBe('');
    expect(refused.stderr).toMatch(/^F22, found 1: .+ say why in REASON_F22\.$/m);
    expect(refused.stderr).toContain('Nothing was committed.');
    expect(await statesOf('2026-02')).toEqual(['checked']);
    const reason = 'Compared with the record: "120" is right';
    const ended = await run({ MONTH: '2026-02', ...reasonsFor(refused, reason) });
    expect(ended).toMatchObject({ code: 0 });
    expect(SubmissionReceipt.parse(JSON.parse(ended.stdout)).acknowledged.map((one) => one.reason)).toContain(reason);
  });

  it('removes rows of the registry only when that is said', async () => {
    await writeFile(join(folder, 'sessions.csv'), csvOf('sessions', [rowOf('sessions', { session_no: 2 })]));
    const refused = await run({ MONTH: '2026-02' });
    expect(refused.code).toBe(1);
    expect(refused.stderr).toContain('sessions: 1 added, 0 changed, 0 unchanged, 1 removed');
    expect(refused.stderr).toContain('set REMOVE=yes');
    expect(await statesOf('2026-02')).toEqual(['accepted', 'checked']);
    const ended = await run({ MONTH: '2026-02', ...reasonsFor(refused, 'Compared with the record'), REMOVE: 'yes' });
    expect(ended).toMatchObject({ code: 0 });
    expect(SubmissionReceipt.parse(JSON.parse(ended.stdout)).tables).toContainEqual(
      expect.objectContaining({ table: 'sessions', added: 1, removed: 1 }),
    );
  });

  it('checks just the folder, whatever an earlier run left in the submission', async () => {
    await writeFile(join(folder, 'sessions.csv'), csvOf('sessions', [rowOf('sessions', { hr_rest: 120 })]));
    expect((await run({ MONTH: '2026-05' })).code).toBe(1);
    await rm(join(folder, 'sessions.csv'));
    const ended = await run({ MONTH: '2026-05' });
    expect(ended).toMatchObject({ code: 0 });
    expect(SubmissionReceipt.parse(JSON.parse(ended.stdout)).files.map(({ fileName }) => fileName)).toEqual([
      'consents.csv',
      'participants.csv',
    ]);
  });

  it('stops at errors and shows them', async () => {
    await writeFile(
      join(folder, 'participants.csv'),
      csvOf('participants', [rowOf('participants')]).replace(/\r?\n/, ',no_such_column\r\n'),
    );
    const ended = await run({ MONTH: '2026-03' });
    expect(ended.code).toBe(1);
    expect(ended.stderr).toContain('The files hold errors. Nothing was committed.');
    expect(await statesOf('2026-03')).toEqual(['checked']);
  });

  it('shows a refusal and goes no further', async () => {
    const wrongSecret = await run({ MONTH: '2026-04', CLIENT_SECRET: 'a guess' });
    expect(wrongSecret.code).not.toBe(0);
    expect(wrongSecret.stderr).toContain('invalid_client');
    const tooEarly = await run({ MONTH: '2099-01' });
    expect(tooEarly.code).not.toBe(0);
    expect(tooEarly.stderr).toContain('/problems/month-not-open');
    expect(await statesOf('2026-04')).toEqual([]);
  });
});
