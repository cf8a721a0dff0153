/** Rows a second from bytes to typed rows, for a month of bouts. Run: npx tsx --conditions @cairnstep/source packages/submission-files/bench/read-bouts.bench.ts */
import { exampleRow } from '@cairnstep/dictionary';
import type { Row } from '@cairnstep/dictionary';
import { parse } from 'csv-parse/sync';
import { FindingLog, readTable, tableFromRows, writeCsv } from '@cairnstep/submission-files';

const rows = 200_000;
const base = exampleRow('bouts');
const codes = Array.from({ length: 400 }, (_, index) => `S${String(index).padStart(21, '0')}`);
const bout = (index: number): Row => ({
  ...base,
  participant: codes[Math.floor(index / 500)],
  session_day: Math.floor((index % 500) / 10),
  session_no: Math.floor((index % 500) / 10) + 1,
  bout_no: (index % 10) + 1,
  duration_s: 300 + (index % 97),
  distance_m: 150.5 + (index % 89) / 10,
  steps: 300 + (index % 83),
});
const bytes = new TextEncoder().encode(
  writeCsv(
    tableFromRows(
      'bouts',
      Array.from({ length: rows }, (_, index) => bout(index)),
    ),
  ),
);
console.log(`${rows} bouts, ${(bytes.length / 1e6).toFixed(1)} MB`);

async function timed(what: string, work: () => Promise<number> | number): Promise<void> {
  for (let round = 0; round < 4; round += 1) {
    const started = performance.now();
    const read = await work();
    const seconds = (performance.now() - started) / 1000;
    console.log(`${what}: ${Math.round(read / seconds).toLocaleString('en')} rows/s (${seconds.toFixed(2)} s)`);
  }
}

await timed('bytes to typed rows', async () => (await readTable('bouts', bytes, new FindingLog())).length);
await timed('csv-parse, cells as text only', () => parse(bytes).length);
