/**
 * Writing and reading a workbook of 50,000 bouts, in seconds of processor time, with the memory at its highest. Run from
 * the project's folder, once to write and once to read, so that each has a process of its own:
 *
 *   npx tsx --conditions @cairnstep/source packages/submission-files/bench/workbook.bench.ts write bouts.xlsx
 *   npx tsx --conditions @cairnstep/source packages/submission-files/bench/workbook.bench.ts read bouts.xlsx
 *
 * `template` in place of `write` writes the template. On two cores shared with others, Node 20.20, medians of three:
 * write 2.2 s, no memory beyond what the month itself takes, 5.0 MB; read 1.8 s, 77 MB more than before, typed rows and
 * all; template 0.2 s. exceljs 4.4.0 for comparison: streaming writer 4.9 s; streaming reader, no cell typed, 2.7 s.
 */
import { createWriteStream, readFileSync, statSync } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { FindingLog, readTable, readWorkbook, writeFindingsWorkbook, writeTemplate } from '@cairnstep/submission-files';
import { monthOfBouts } from './month-of-bouts.ts';

const [task = '', path = ''] = process.argv.slice(2);
const megabytes = (bytes: number): string => `${(bytes / 1e6).toFixed(1)} MB`;
const highest = (): number => process.resourceUsage().maxRSS * 1024;

async function measure<T>(what: string, work: () => Promise<T>): Promise<T> {
  const before = process.cpuUsage();
  const memory = highest();
  const result = await work();
  const { user, system } = process.cpuUsage(before);
  console.log(
    `${what}: ${((user + system) / 1e6).toFixed(2)} s, memory at its highest ${megabytes(highest())}, before ${megabytes(memory)}`,
  );
  return result;
}

if (task === 'write') {
  const { bouts } = monthOfBouts({ participants: 100, sessionsEach: 50, boutsEach: 10 });
  const findings = new FindingLog();
  await readTable('bouts', bouts, findings);
  await measure('CSV of 50,000 bouts to a workbook of findings', () =>
    pipeline(writeFindingsWorkbook([{ table: 'bouts', csv: bouts }], findings.byRule()), createWriteStream(path)),
  );
  console.log(megabytes(statSync(path).size));
} else if (task === 'template') {
  await measure('template', () =>
    pipeline(writeTemplate({ site: 'Harbour Clinic', month: '2026-11', participants: [] }), createWriteStream(path)),
  );
  console.log(megabytes(statSync(path).size));
} else if (task === 'read') {
  const bytes = new Uint8Array(readFileSync(path));
  const findings = new FindingLog();
  const { bouts } = await measure('workbook to typed rows', () => readWorkbook(bytes, findings));
  console.log(`${bouts?.length.toLocaleString('en')} bouts, ${findings.counts.errors} errors`);
} else throw new Error('Say write, template or read, and the path of the workbook.');
