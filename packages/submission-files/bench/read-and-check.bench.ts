/**
 * Rows a second from bytes to checked rows. Run from the project's folder:
 * npx tsx --conditions @cairnstep/source packages/submission-files/bench/read-and-check.bench.ts
 * Seconds are of processor time, so that a busy machine changes them little.
 */
import { FindingLog, checkSubmission, copyRows, readTable } from '@cairnstep/submission-files';
import type { TypedTables } from '@cairnstep/submission-files';
import { parse } from 'csv-parse/sync';
import { largeMonth, monthOfBouts } from './month-of-bouts.ts';

const rounds = 5;
const rows = largeMonth.participants * largeMonth.sessionsEach * largeMonth.boutsEach;
const files = monthOfBouts(largeMonth);
const context = { held: {}, withdrawn: new Set<string>(), year: 2030 };

async function measure(what: string, work: () => Promise<unknown> | unknown): Promise<void> {
  const seconds: number[] = [];
  for (let round = 0; round < rounds; round += 1) {
    const before = process.cpuUsage();
    await work();
    const { user, system } = process.cpuUsage(before);
    seconds.push((user + system) / 1e6);
  }
  const median = seconds.sort((a, b) => a - b)[Math.floor(rounds / 2)] ?? 0;
  console.log(`${what}: ${median.toFixed(2)} s, ${Math.round(rows / median).toLocaleString('en')} bouts/s`);
}

async function readAll(findings: FindingLog): Promise<TypedTables> {
  return {
    participants: await readTable('participants', files.participants, findings),
    consents: await readTable('consents', files.consents, findings),
    sessions: await readTable('sessions', files.sessions, findings),
    bouts: await readTable('bouts', files.bouts, findings),
  };
}

console.log(
  `${rows.toLocaleString('en')} bouts in ${(files.bouts.length / 1e6).toFixed(1)} MB, with the sessions, participants and consents they belong to`,
);
await measure('bytes to typed rows, bouts only', () => readTable('bouts', files.bouts, new FindingLog()));
await measure('bytes to typed and checked rows, all four files', async () => {
  const findings = new FindingLog();
  checkSubmission(await readAll(findings), context, findings);
});
const findings = new FindingLog();
const tables = await readAll(findings);
const { bouts } = tables;
if (bouts) await measure('typed rows to COPY bytes, bouts only', () => [...copyRows(bouts, [...bouts.present])]);
await measure('for comparison: cells as text by csv-parse, bouts only', () => parse(files.bouts));
checkSubmission(tables, context, findings);
console.log(
  'findings:',
  findings
    .byRule()
    .map(({ id, count }) => `${id} ${count}`)
    .join(', ') || 'none',
);
console.log(`memory at the end: ${Math.round(process.memoryUsage().rss / 1e6)} MB`);
