/** The text of src/method-pages/evidence-table.ts: the evidence in the small, so that the Methods page need not carry the fixtures. */

import { format, resolveConfig } from 'prettier';
import type { CertifiedSet, EvidenceRow } from '../src/index.ts';

/** One significant digit, upwards: the page says "at most". */
export function upwards(error: number): number {
  const nearest = error.toExponential(0);
  const [digit, exponent] = nearest.split('e');
  return Number(nearest) >= error ? Number(nearest) : Number(`${Number(digit) + 1}e${exponent}`);
}

/** One decimal, downwards: the page says "at least". */
export function downwards(digits: number): number {
  return Math.floor(digits * 10) / 10;
}

/** @param path of the file it is for, which settles how it is laid out */
export async function evidenceTableText(rows: readonly EvidenceRow[], sets: readonly CertifiedSet[], path: string): Promise<string> {
  const shippedRows = rows.map(({ method, source, cases, figures, worstRelativeError }) => ({
    method,
    source,
    cases,
    figures,
    worstRelativeError: upwards(worstRelativeError),
  }));
  const shippedSets = sets.map(({ method, set, figures }) => ({
    method,
    set,
    figures: figures.map(({ name, digits, asked }) => ({ name, digits: downwards(digits), asked })),
  }));
  const text = `/** Written by npm run verify:statistics -- --write from the reference checks; the unit tests hold it to them. Do not edit. */

    import type { CertifiedSet, EvidenceRow } from './evidence-row.ts';

    export const evidenceTable: readonly EvidenceRow[] = ${JSON.stringify(shippedRows)};

    export const certifiedSets: readonly CertifiedSet[] = ${JSON.stringify(shippedSets)};
  `;
  return format(text, { ...(await resolveConfig(path)), parser: 'typescript' });
}
