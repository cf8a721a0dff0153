/**
 * Writes src/method-pages/evidence-table.ts, the small table that the Methods page shows, so that the page need not carry the fixtures.
 * Run after a reference check was added or changed: npx tsx --conditions @cairnstep/source packages/statistics/reference/write-evidence.ts
 */

import { writeFileSync } from 'node:fs';
import { evidence } from './evidence.ts';

/** One significant digit, upwards: the page says "at most". */
function upwards(error: number): number {
  if (error === 0) return 0;
  const unit = 10 ** Math.floor(Math.log10(error));
  return Number((Math.ceil(error / unit) * unit).toPrecision(1));
}

const rows = evidence().map(
  ({ method, source, cases, figures, worstRelativeError }) =>
    `  {\n    method: '${method}',\n    source: ${JSON.stringify(source)},\n    cases: ${cases},\n    figures: ${figures},\n    worstRelativeError: ${upwards(worstRelativeError)},\n  },\n`,
);

writeFileSync(
  new URL('../src/method-pages/evidence-table.ts', import.meta.url),
  `/** Written by reference/write-evidence.ts from the reference checks; the unit tests hold it to them. Do not edit. */

import type { EvidenceRow } from './evidence-row.ts';

export const evidenceTable: readonly EvidenceRow[] = [
${rows.join('')}];
`,
);
