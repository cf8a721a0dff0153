/**
 * Time of the interval audit (goal: a table of 30 x 6 under 50 ms), of protecting it, and of the linked audit.
 * Run: npx tsx --conditions @cairnstep/source packages/disclosure/bench/tables.bench.ts
 */
import { intervalAudit, linkedIntervalAudit, linkSlices, loadLinearSolver, protectTable } from '../src/index.ts';
import { countsWithALongTail, seededRandom, timed } from './bench-tools.ts';

const random = seededRandom(2);
const table = (rows: number, columns: number, mean: number) => countsWithALongTail(random, rows, columns, mean);

for (const mean of [4, 12, 40]) {
  const counted = table(30, 6, mean);
  const { hidden, audit } = protectTable(counted);
  console.log(`30 x 6, mean ${String(mean)}, ${String(audit.intervals.length)} hidden, proven least: ${String(audit.provenLeast)}`);
  console.log(`  interval audit: ${timed(() => intervalAudit(counted, hidden))}`);
  console.log(`  protectTable: ${timed(() => protectTable(counted))}`);
}

const solver = await loadLinearSolver();
const slices = ['men', 'women'].map((name) => {
  const counted = table(10, 6, 8);
  return { name, table: counted, hidden: protectTable(counted).hidden };
});
const all = { counts: slices[0]?.table.counts.map((row, i) => row.map((n, j) => n + (slices[1]?.table.counts[i]?.[j] ?? 0))) ?? [] };
const linked = linkSlices(slices, protectTable(all).hidden);
console.log(`linked audit of 2 slices of 10 x 6 and all of them: ${timed(() => linkedIntervalAudit(solver, linked), 3)}`);
