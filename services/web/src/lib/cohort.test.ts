import { describe, expect, it } from 'vitest';
import { cohortIn, cohortPhrases, cohortSearch, formatCells, parseCells } from './cohort.ts';

describe('a cohort in the address', () => {
  it('reads back as it was written, in the order of the grid', () => {
    const cells = parseCells('t1_t9.D-c5_c8.D.C');
    expect(cells).toEqual([
      { levelGroup: 'c5_c8', grade: 'C' },
      { levelGroup: 'c5_c8', grade: 'D' },
      { levelGroup: 't1_t9', grade: 'D' },
    ]);
    expect(formatCells(cells)).toBe('c5_c8.C.D-t1_t9.D');
    expect(parseCells(formatCells(cells))).toEqual(cells);
  });

  it('leaves out what the registry does not know, and holds each cell once', () => {
    expect(parseCells('c5_c8.C.F.C-x9.A-c5_c8.C')).toEqual([{ levelGroup: 'c5_c8', grade: 'C' }]);
    expect(parseCells(null)).toEqual([]);
    expect(parseCells('')).toEqual([]);
  });

  it('is carried along with the outcome it was chosen by', () => {
    const cohort = { outcome: 'tmwt_ss', inDevice: true, cells: parseCells('t1_t9.D') };
    expect(String(cohortSearch(cohort))).toBe('outcome=tmwt_ss&in-device=yes&cells=t1_t9.D');
    expect(cohortIn(cohortSearch(cohort))).toEqual(cohort);
    expect(cohortIn(new URLSearchParams('cells=t1_t9.D'))).toBeNull();
  });

  it('leaves the address when nothing is chosen', () => {
    expect(formatCells([])).toBeNull();
  });
});

describe('a cohort in words', () => {
  it('names groups, grades, and what cannot be determined', () => {
    expect(cohortPhrases(parseCells('c5_c8.A.C.D.ND-t1_t9.D-l1_l5.A.B.C.D.E.ND-ND.ND'))).toEqual([
      'C5–C8: AIS A, C and D and grade not determinable',
      'T1–T9: AIS D',
      'L1–L5: every grade',
      'Level not determinable: grade not determinable',
    ]);
  });
});
