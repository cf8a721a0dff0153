import { describe, expect, it } from 'vitest';
import type { ReferenceCheck } from '../reference/agreement.ts';
import { agreement } from '../reference/agreement.ts';
import { certifiedSets as reachedDigits } from '../reference/certified-sets.ts';
import { evidence, referenceChecks } from '../reference/evidence.ts';
import { downwards, upwards } from '../reference/evidence-table-text.ts';
import { gates, report } from '../reference/verification.ts';
import type { QuestionKey } from './index.ts';
import { certifiedSets, evidenceTable, methodPages, questions } from './index.ts';

const rows = evidence();
const sets = reachedDigits();

/** A made-up check whose second figure is off by a tenth of what is published, and whose third is not there. */
const offByATenth: ReferenceCheck = {
  id: 'case',
  method: 'm',
  source: 's; data',
  compute: () => ({ a: 1, b: [2, 1.1] }),
  expected: { a: 1, b: [2, 1], c: 3 },
  tolerance: { rel: 1e-3 },
};

describe('the method pages', () => {
  it('have one address each and say everything', () => {
    const slugs = methodPages.map(({ slug }) => slug);
    expect(new Set(slugs).size).toBe(slugs.length);
    for (const { slug, title, formula, whenUsed, smallN, source, computedBy } of methodPages) {
      expect(slug).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      expect(formula.length).toBeGreaterThan(0);
      for (const text of [title, ...formula, whenUsed, smallN, source, computedBy.why]) expect(text.trim()).not.toBe('');
    }
  });

  it('leave no question without a method', () => {
    const answered = new Set(methodPages.map(({ question }) => question));
    expect(Object.keys(questions).filter((key) => !answered.has(key as QuestionKey))).toEqual([]);
  });

  it('write formulae with closed parentheses, and with braces only to lower or raise', () => {
    for (const line of methodPages.flatMap(({ formula }) => formula)) {
      const count = (sign: string) => line.split(sign).length;
      expect([line, count('(')]).toEqual([line, count(')')]);
      expect(line.replace(/[_^]\{[^{}]+\}/g, '')).not.toMatch(/[{}]|[_^](?![A-Za-z0-9])/);
    }
  });
});

describe('evidence', () => {
  it('passes every gate (else see npm run verify:statistics)', () => {
    expect(gates(rows, { pages: methodPages, table: evidenceTable }).filter(({ failures }) => failures.length > 0)).toEqual([]);
  });

  it('counts every check once and names a source for it', () => {
    expect(rows.reduce((sum, row) => sum + row.cases, 0)).toBe(referenceChecks.length);
    for (const row of rows) {
      expect(row.figures).toBeGreaterThanOrEqual(row.cases);
      expect(row.source).not.toBe('');
    }
  });

  it('shows a figure that is off as off', () => {
    expect(evidence([offByATenth])).toEqual([
      {
        method: 'm',
        source: 's',
        cases: 1,
        figures: 4,
        worstRelativeError: expect.closeTo(0.1, 12),
        disagreements: [
          { id: 'case', path: 'b.1', got: 1.1, want: 1 },
          { id: 'case', path: 'c', got: undefined, want: 3 },
        ],
      },
    ]);
  });

  it('takes an infinite figure for nothing but itself', () => {
    const check = (got: number): ReferenceCheck => ({ ...offByATenth, compute: () => got, expected: 'Infinity' });
    expect(agreement(check(Infinity)).disagreements).toEqual([]);
    for (const got of [1e300, -Infinity, NaN]) expect(agreement(check(got)).disagreements).toHaveLength(1);
  });
});

describe('the digits of the certified sets', () => {
  it('are what the page ships, but for the last digits of a processor', () => {
    expect(certifiedSets.map(({ method, set }) => ({ method, set }))).toEqual(sets.map(({ method, set }) => ({ method, set })));
    sets.forEach(({ figures }, i) => {
      const shipped = certifiedSets[i]?.figures ?? [];
      expect(shipped.map(({ name, asked }) => ({ name, asked }))).toEqual(figures.map(({ name, asked }) => ({ name, asked })));
      figures.forEach(({ digits }, j) => expect(digits).toBeGreaterThan((shipped[j]?.digits ?? 15) - 1));
    });
  });

  it('are at least those asked for', () => {
    for (const { figures } of certifiedSets) for (const { digits, asked } of figures) expect(digits).toBeGreaterThanOrEqual(asked);
  });

  it('are refused a name that nobody gave them', () => {
    const check = { ...offByATenth, id: 'NIST Invented', compute: () => ({ slope: 1 }), expected: { slope: 1 } };
    expect(() => reachedDigits([check])).toThrow('"slope"');
  });
});

describe('the report on the evidence', () => {
  const failing = evidence([offByATenth]);
  const judged = gates(failing, { pages: [{ slug: 'unproven' }], table: evidenceTable.slice(0, 2) });

  it('names what a failed gate failed on', () => {
    expect(judged.map(({ failures }) => failures)).toEqual([
      ['m, case, b.1: 1.1, not 1', 'm, case, c: undefined, not 3'],
      ['unproven'],
      ['m'],
      ['m, s', `${evidenceTable[1]?.method}, ${evidenceTable[1]?.source}: no longer checked`],
    ]);
    expect(report(failing, [], judged)).toContain(
      'FAILED  Every figure is within the tolerance of its case\n          m, case, b.1: 1.1, not 1',
    );
  });

  it('has a line for every method and source, and for every certified set', () => {
    const lines = report(rows, sets, gates(rows, { pages: methodPages, table: evidenceTable })).split('\n');
    for (const { method, source } of rows) expect(lines.some((line) => line.startsWith(method) && line.endsWith(source))).toBe(true);
    for (const { set } of sets) expect(lines.some((line) => line.includes(`, ${set} `))).toBe(true);
    expect(lines.filter((line) => line.startsWith('FAILED'))).toEqual([]);
  });

  it('notices when the shipped table falls behind', () => {
    const table = evidenceTable.map((row, i) => (i === 3 ? { ...row, cases: row.cases + 1 } : row));
    const outdated = gates(rows, { pages: methodPages, table }).flatMap(({ failures }) => failures);
    expect(outdated).toEqual([`${rows[3]?.method}, ${rows[3]?.source}`]);
  });

  it('rounds errors up and digits down, so that the page promises too little rather than too much', () => {
    expect([0, 3.1e-15, 4e-9, 0.00001, 1].map(upwards)).toEqual([0, 4e-15, 4e-9, 0.00001, 1]);
    expect([15, 12.99, 0.05].map(downwards)).toEqual([15, 12.9, 0]);
  });
});
