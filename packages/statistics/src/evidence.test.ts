import { describe, expect, it } from 'vitest';
import { evidence, referenceChecks } from '../reference/evidence.ts';
import { evidenceTable, methodPages } from './index.ts';

describe('the method pages', () => {
  const slugs = methodPages.map(({ slug }) => slug);

  it('have one address each and say everything', () => {
    expect(new Set(slugs).size).toBe(slugs.length);
    for (const page of methodPages) {
      expect(page.slug).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      for (const text of Object.values(page)) expect(text.trim()).not.toBe('');
    }
  });

  it('exist for every method that has evidence', () => {
    expect([...new Set(referenceChecks.map(({ method }) => method))].filter((method) => !slugs.includes(method))).toEqual([]);
  });
});

describe('evidence', () => {
  const rows = evidence();

  it('is within the tolerance everywhere', () => {
    expect(rows.filter((row) => !row.withinTolerance)).toEqual([]);
  });

  it('counts every check once and names a source for it', () => {
    expect(rows.reduce((sum, row) => sum + row.cases, 0)).toBe(referenceChecks.length);
    for (const row of rows) {
      expect(row.figures).toBeGreaterThanOrEqual(row.cases);
      expect(row.source).not.toBe('');
    }
  });

  it('is what the written table says (else run reference/write-evidence.ts)', () => {
    const named = (row: { method: string; source: string; cases: number; figures: number }) => [
      row.method,
      row.source,
      row.cases,
      row.figures,
    ];
    expect(evidenceTable.map(named)).toEqual(rows.map(named));
    rows.forEach((row, i) => {
      // The last digits may differ between processors; the order of magnitude may not.
      expect(row.worstRelativeError).toBeLessThanOrEqual(10 * Math.max(1e-15, evidenceTable[i]?.worstRelativeError ?? 0));
    });
  });

  it('shows a figure that is off as off', () => {
    const check = {
      id: 'x',
      method: 'm',
      source: 's',
      compute: () => ({ a: 1, b: [2, 0.1] }),
      expected: { a: 1, b: [2, 0] },
      tolerance: { rel: 1e-3 },
    };
    expect(evidence([check])).toEqual([
      { method: 'm', source: 's', cases: 1, figures: 3, worstRelativeError: 0.1, withinTolerance: false },
    ]);
  });
});
