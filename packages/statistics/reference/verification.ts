/** What has to hold of the evidence, and the report about it. */

import type { CertifiedSet, EvidenceRow, MethodPage } from '../src/index.ts';
import type { CheckedEvidenceRow } from './evidence.ts';

export interface Gate {
  readonly name: string;
  /** One line each; none when the gate is passed. */
  readonly failures: readonly string[];
}

/** What the Methods page ships, to be held against the checks. */
export interface ShippedEvidence {
  readonly pages: readonly Pick<MethodPage, 'slug'>[];
  readonly table: readonly EvidenceRow[];
}

/** Pages about how figures are written: there is nothing to compute from outside. */
const withoutFigures: readonly string[] = ['rounding'];

/** The last digits may differ between processors; the order of magnitude may not. */
function isOutdated(row: EvidenceRow, shipped: EvidenceRow | undefined): boolean {
  const isSame =
    shipped?.method === row.method && shipped.source === row.source && shipped.cases === row.cases && shipped.figures === row.figures;
  return !isSame || row.worstRelativeError > 10 * Math.max(1e-15, shipped.worstRelativeError);
}

export function gates(rows: readonly CheckedEvidenceRow[], { pages, table }: ShippedEvidence): Gate[] {
  const proven = new Set(rows.map(({ method }) => method));
  const slugs = new Set(pages.map(({ slug }) => slug));
  return [
    {
      name: 'Every figure is within the tolerance of its case',
      failures: rows.flatMap(({ method, disagreements }) =>
        disagreements.map(
          ({ id, path, got, want }) => `${method}, ${id}${path === '' ? '' : `, ${path}`}: ${String(got)}, not ${String(want)}`,
        ),
      ),
    },
    {
      name: 'Every method page is proven by figures from outside',
      failures: [...slugs].filter((slug) => !proven.has(slug) && !withoutFigures.includes(slug)),
    },
    { name: 'Every proven method has its page', failures: [...proven].filter((method) => !slugs.has(method)) },
    {
      name: 'The table on the Methods page says the same (else run with --write)',
      failures: [
        ...rows.filter((row, i) => isOutdated(row, table[i])).map(({ method, source }) => `${method}, ${source}`),
        ...table.slice(rows.length).map(({ method, source }) => `${method}, ${source}: no longer checked`),
      ],
    },
  ];
}

const columns: readonly { readonly header: string; readonly of: (row: EvidenceRow) => string; readonly isNumber?: boolean }[] = [
  { header: 'method', of: ({ method }) => method },
  { header: 'cases', of: ({ cases }) => String(cases), isNumber: true },
  { header: 'figures', of: ({ figures }) => String(figures), isNumber: true },
  { header: 'worst relative error', of: ({ worstRelativeError: error }) => (error === 0 ? '0' : error.toExponential(1)), isNumber: true },
  { header: 'outside source', of: ({ source }) => source },
];

function evidenceLines(rows: readonly EvidenceRow[]): string[] {
  const lines = [columns.map(({ header }) => header), ...rows.map((row) => columns.map(({ of }) => of(row)))];
  const widths = columns.map((_, column) => Math.max(...lines.map((line) => line[column]?.length ?? 0)));
  return lines.map((line) =>
    line
      .map((cell, column) => (columns[column]?.isNumber === true ? cell.padStart(widths[column] ?? 0) : cell.padEnd(widths[column] ?? 0)))
      .join('  ')
      .trimEnd(),
  );
}

function setLine({ method, set, figures }: CertifiedSet): string {
  const digits = figures.map(({ name, digits: reached, asked }) => `${name} ${reached.toFixed(1)} (${asked})`);
  return `${`${method}, ${set}`.padEnd(28)}${digits.join(', ')}`;
}

/** The report as printed: evidence per method and source, digits on certified sets, verdict per gate. */
export function report(rows: readonly EvidenceRow[], sets: readonly CertifiedSet[], judged: readonly Gate[]): string {
  const sum = (of: (row: EvidenceRow) => number): number => rows.reduce((total, row) => total + of(row), 0);
  return [
    ...evidenceLines(rows),
    '',
    `${new Set(rows.map(({ method }) => method)).size} methods, ${sum(({ cases }) => cases)} cases, ${sum(({ figures }) => figures)} figures.`,
    '',
    'Certified sets of NIST: digits agreed, that is the log relative error, at most 15 (in brackets: asked for)',
    ...sets.map(setLine),
    '',
    ...judged.flatMap(({ name, failures }) => [
      `${failures.length === 0 ? 'passed' : 'FAILED'}  ${name}`,
      ...failures.map((failure) => `          ${failure}`),
    ]),
  ].join('\n');
}
