/**
 * A month from the bytes of its files to committed rows, every check on, over HTTP: beside COPY of the same bytes into tables without key,
 * index or rule, on the same server.
 */
import { setTimeout as wait } from 'node:timers/promises';
import type { Submission } from '@cairnstep/contract';
import { from as copyFrom } from 'pg-copy-streams';
import { pipeline } from 'node:stream/promises';
import { largeMonth, monthOfBouts, type MonthSize } from '../../../packages/submission-files/bench/month-of-bouts.ts';
import { makePerson, makeSite } from '../../../tests/support/people.ts';
import { watchMemory } from '../memory.ts';
import { withProduct, type RunningProduct } from '../running-product.ts';
import type { Scenario } from '../scenario.ts';

type Files = Readonly<Record<string, Uint8Array>>;

const smallMonth: MonthSize = { ...largeMonth, participants: largeMonth.participants / 10 };
const warmUpMonth: MonthSize = { ...largeMonth, participants: 4 };

interface Upload {
  /** Seconds: files sent, read and checked, committed. */
  readonly sent: number;
  readonly checked: number;
  readonly committed: number;
  readonly total: number;
  /** MB above what they held before. */
  readonly apiMemory: number;
  readonly workerMemory: number;
}

/** Ten times as often as the page asks. */
const pollEveryMs = 100;

async function upload({ api, worker, people }: RunningProduct, files: Files): Promise<Upload> {
  const site = await makeSite(people);
  const { cookie } = await makePerson(people, { grants: [{ role: 'coordinator', site }] });
  const ask = async <T>(method: string, path: string, body?: Uint8Array | object): Promise<T> => {
    const isFile = body instanceof Uint8Array;
    const answer = await fetch(`${api.url}${path}`, {
      method,
      headers: { Cookie: cookie, 'X-Cairnstep-Request': '1', 'Content-Type': isFile ? 'text/csv' : 'application/json' },
      ...(body === undefined ? {} : { body: isFile ? (body as Uint8Array<ArrayBuffer>) : JSON.stringify(body) }),
    });
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${await answer.text()}`);
    return (await answer.json()) as T;
  };
  const ofApi = watchMemory(api.pid);
  const ofWorker = watchMemory(worker.pid);
  const times = [performance.now()];
  const { id } = await ask<Submission>('POST', '/api/submissions', { siteId: site.id, month: '2026-01' });
  for (const [table, bytes] of Object.entries(files))
    await ask('PUT', `/api/submissions/${id}/files/${table}?fileName=${table}.csv`, bytes);
  times.push(performance.now());
  let submission = await ask<Submission>('POST', `/api/submissions/${id}/check`, {});
  while (submission.status === 'checking') {
    await wait(pollEveryMs);
    submission = await ask<Submission>('GET', `/api/submissions/${id}`);
  }
  times.push(performance.now());
  if (submission.findings.length > 0)
    throw new Error(`The month is not clean: ${submission.findings.map((group) => group.rule).join(', ')}.`);
  await ask('POST', `/api/submissions/${id}/commit`, { previewDigest: submission.preview?.digest });
  times.push(performance.now());
  const [begun = 0, sent = 0, checked = 0, done = 0] = times;
  return {
    sent: (sent - begun) / 1000,
    checked: (checked - sent) / 1000,
    committed: (done - checked) / 1000,
    total: (done - begun) / 1000,
    apiMemory: ofApi(),
    workerMemory: ofWorker(),
  };
}

/** Seconds for the bytes of the same files. */
async function copyBare({ cluster }: RunningProduct, files: Files): Promise<number> {
  const client = await cluster.connect();
  const copies = Object.entries(files).map(([table, bytes]) => {
    const header = new TextDecoder().decode(bytes.subarray(0, bytes.indexOf(0x0d)));
    return { table, header, bytes };
  });
  for (const { table, header } of copies) await client.query(`create table bare_${table} as select ${header} from ${table} with no data`);
  const begun = performance.now();
  await client.query('begin');
  for (const { table, header, bytes } of copies) {
    await pipeline([bytes], client.query(copyFrom(`copy bare_${table} (${header}) from stdin (format csv, header)`)));
  }
  await client.query('commit');
  const seconds = (performance.now() - begun) / 1000;
  for (const { table } of copies) await client.query(`drop table bare_${table}`);
  await client.end();
  return seconds;
}

interface Pair {
  readonly ours: Upload;
  readonly peer: number;
}

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

async function measure(product: RunningProduct, size: MonthSize): Promise<Pair> {
  const files = monthOfBouts(size);
  const peers: number[] = [];
  for (let round = 0; round < 3; round += 1) peers.push(await copyBare(product, files));
  const uploads: Upload[] = [];
  for (let round = 0; round < 3; round += 1) uploads.push(await upload(product, files));
  const byTime = [...uploads].sort((a, b) => a.total - b.total);
  const ours = byTime[1] as Upload;
  // Memory grows at the first and is used again: the largest growth counts.
  const most = (of: (one: Upload) => number) => Math.max(...uploads.map(of));
  return { ours: { ...ours, apiMemory: most((one) => one.apiMemory), workerMemory: most((one) => one.workerMemory) }, peer: median(peers) };
}

let measured: Promise<{ small: Pair; large: Pair }> | undefined;
/** Both sizes on one running product, the smaller first; the scenarios share it. */
const measureBoth = () =>
  (measured ??= withProduct(async (product) => {
    await upload(product, monthOfBouts(warmUpMonth));
    return { small: await measure(product, smallMonth), large: await measure(product, largeMonth) };
  }));

const boutsOf = ({ participants, sessionsEach, boutsEach }: MonthSize): number => participants * sessionsEach * boutsEach;
const seconds = (value: number): string => `${value.toFixed(2)} s`;

const scenarioOf = (size: MonthSize, which: 'small' | 'large'): Scenario => ({
  name: `upload, ${boutsOf(size).toLocaleString('en')} bouts`,
  run: async () => {
    const { ours, peer } = (await measureBoth())[which];
    return {
      ours: ours.total,
      peer,
      unit: 's',
      peerName: 'COPY of the same files into bare tables, PostgreSQL 15',
      // A quarter of the rate of COPY.
      goal: 4 * peer,
      note:
        `sent ${seconds(ours.sent)}, read and checked ${seconds(ours.checked)}, committed ${seconds(ours.committed)}; ` +
        `memory of the API +${ours.apiMemory.toFixed(0)} MB, of the worker +${ours.workerMemory.toFixed(0)} MB`,
    };
  },
});

export const scenarios: readonly Scenario[] = [
  scenarioOf(smallMonth, 'small'),
  scenarioOf(largeMonth, 'large'),
  {
    name: 'upload, ten times the rows',
    run: async () => {
      const { small, large } = await measureBoth();
      return {
        ours: large.ours.total / small.ours.total,
        peer: large.peer / small.peer,
        unit: 'times',
        peerName: 'the same of COPY',
      };
    },
  },
];
