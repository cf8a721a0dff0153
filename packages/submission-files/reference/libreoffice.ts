/**
 * Does LibreOffice open and save our workbooks without loss, and do we read what it saves? Run from the project's folder,
 * with LibreOffice Calc installed (Debian: `apt-get install --no-install-recommends libreoffice-calc`):
 *
 *   npx tsx --conditions @cairnstep/source packages/submission-files/reference/libreoffice.ts [--write]
 *
 * `--write` renews the two workbooks that `saved-by-libreoffice.test.ts` reads; do so when the dictionary changes a table.
 *
 * Result with LibreOffice 7.4.7.2 (Debian 12): no cell, list, limit, prompt, text format, note or link is lost. It ends the
 * range of a validation 1,000 rows behind the last row in use, and drops the mark that numbers stored as text are meant so,
 * which only other programs show.
 */
import { execFileSync } from 'node:child_process';
import { copyFileSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { FindingLog, readTable, writeFindingsWorkbook } from '../src/index.ts';
import { whole } from '../src/test-support/workbook-parts-of.ts';
import { filledTemplate } from './filled-template.ts';
import { workbookContents } from './workbook-contents.ts';
import type { SheetContents } from './workbook-contents.ts';

const folder = mkdtempSync(join(tmpdir(), 'libreoffice-'));
const saved = join(folder, 'saved');
const here = fileURLToPath(new URL('.', import.meta.url));

async function findingsWorkbook(): Promise<Uint8Array> {
  const rows = Array.from(
    { length: 300 },
    (_, index) => `${index + 1},${index % 3 === 0 ? 'many' : index},${index % 7 === 0 ? '=1+1' : '7.5'},<b>"&\n`,
  );
  const csv = new TextEncoder().encode(`bout_no,steps,distance_m,colour\n${rows.join('')}`);
  const log = new FindingLog();
  await readTable('bouts', csv, log);
  return whole(writeFindingsWorkbook([{ table: 'bouts', csv }], log.byRule()));
}

function convert(files: readonly string[]): void {
  const options = [
    '--headless',
    '--norestore',
    `-env:UserInstallation=file://${folder}/profile`,
    '--convert-to',
    'xlsx:Calc MS Excel 2007 XML',
  ];
  execFileSync('soffice', [...options, '--outdir', saved, ...files], { stdio: ['ignore', 'ignore', 'inherit'] });
}

/** What the one workbook has and the other has not. */
function differences(before: readonly SheetContents[], after: readonly SheetContents[]): string[] {
  const found: string[] = [];
  if (before.map(({ name }) => name).join() !== after.map(({ name }) => name).join()) found.push('other sheets');
  for (const [index, sheet] of before.entries()) {
    const other = after[index];
    for (const part of ['cells', 'validations', 'textColumns', 'notes', 'links'] as const) {
      const left = new Set<string | number>(sheet[part]);
      const right = new Set<string | number>(other?.[part]);
      for (const one of left) if (!right.has(one)) found.push(`${sheet.name}: lost of its ${part}: ${one}`);
      for (const one of right) if (!left.has(one)) found.push(`${sheet.name}: new among its ${part}: ${one}`);
    }
    const count = (part: keyof SheetContents): string =>
      `${sheet[part].toString() === '' ? 0 : (sheet[part] as readonly unknown[]).length} ${part}`;
    console.log(
      `${sheet.name}: ${[count('cells'), count('validations'), count('textColumns'), count('notes'), count('links')].join(', ')}`,
    );
  }
  return found;
}

const workbooks = { 'template.xlsx': await filledTemplate(), 'findings.xlsx': await findingsWorkbook() };
for (const [name, bytes] of Object.entries(workbooks)) writeFileSync(join(folder, name), bytes);
const byHand = join(here, 'sheets-by-hand.fods');
convert([...Object.keys(workbooks).map((name) => join(folder, name)), byHand]);

for (const [name, bytes] of Object.entries(workbooks)) {
  console.log(`\n${name}`);
  const found = differences(workbookContents(bytes), workbookContents(new Uint8Array(readFileSync(join(saved, name)))));
  console.log(found.length === 0 ? 'nothing lost, nothing new' : found.slice(0, 50).join('\n'));
  if (found.length > 0) process.exitCode = 1;
}
if (process.argv.includes('--write')) {
  mkdirSync(join(here, 'saved-by-libreoffice'), { recursive: true });
  for (const name of ['template.xlsx', 'sheets-by-hand.xlsx']) copyFileSync(join(saved, name), join(here, 'saved-by-libreoffice', name));
}
rmSync(folder, { recursive: true });
