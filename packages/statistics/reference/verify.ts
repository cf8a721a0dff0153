/**
 * npm run verify:statistics: holds every method to figures from outside the project and reports how near it comes. Exit code 1 when a
 * gate fails. Writes nothing, unless asked by `--write` to renew the table that the Methods page ships.
 */

import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { certifiedSets } from './certified-sets.ts';
import { evidence } from './evidence.ts';
import { evidenceTableText } from './evidence-table-text.ts';
import { evidenceTable, methodPages } from '../src/index.ts';
import { gates, report } from './verification.ts';

const rows = evidence();
const sets = certifiedSets();
const isWriting = process.argv.includes('--write');
if (isWriting) {
  const path = fileURLToPath(new URL('../src/method-pages/evidence-table.ts', import.meta.url));
  writeFileSync(path, await evidenceTableText(rows, sets, path));
}

const judged = gates(rows, { pages: methodPages, table: isWriting ? rows : evidenceTable });
console.log(report(rows, sets, judged));
if (judged.some(({ failures }) => failures.length > 0)) process.exitCode = 1;
