import type { CellKey } from '@cairnstep/scoring';
import { resultNames, resultOf } from '@cairnstep/scoring';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { blankSheet, codeFor } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';
import { allCells, isAnswer, placeOf } from './places.ts';
import { readSheet, whyOf } from './reading.ts';

const scoresOf = (key: CellKey): readonly string[] =>
  isAnswer(key) ? ['yes', 'no'] : placeOf(key)?.modality === 'motor' ? ['0', '1', '2', '3', '4', '5'] : ['0', '1', '2'];

const withWritten = (written: ExamSheet['written'], rest: Partial<ExamSheet> = {}): ExamSheet => ({ ...blankSheet, ...rest, written });
const everyCell = (code: (key: CellKey) => string) => Object.fromEntries(allCells.map((key) => [key, code(key)]));
const normal = (key: CellKey) => scoresOf(key).at(isAnswer(key) ? 0 : -1) ?? '';

describe('the reading of a sheet', () => {
  it('leaves open only what the blank cells can still change', () => {
    const scores = fc.tuple(...allCells.map((key) => fc.constantFrom(...scoresOf(key))));
    fc.assert(
      fc.property(scores, fc.nat({ max: allCells.length }), (chosen, count) => {
        const full = Object.fromEntries(allCells.map((key, index) => [key, chosen[index]]));
        const partly = Object.fromEntries(allCells.slice(0, count).map((key, index) => [key, chosen[index]]));
        const before = readSheet(withWritten(partly));
        const after = readSheet(withWritten(full));
        expect(before.blank).toHaveLength(allCells.length - count);
        for (const name of resultNames) {
          const open = resultOf(before.classification, name).values;
          expect(open).toEqual(expect.arrayContaining([...resultOf(after.classification, name).values]));
        }
      }),
      { seed: 41, numRuns: 60 },
    );
  });

  it('explains a settled result at once and an open one only on a full sheet', () => {
    const few = readSheet(withWritten({ lt_r_c2: '1' }));
    expect(resultOf(few.classification, { result: 'nli' }).values).toEqual(['C1']);
    expect(whyOf(few, { result: 'nli' })?.value).toBe('C1');
    expect(whyOf(few, { result: 'ais' })).toBeNull();
    const notTested = readSheet(withWritten({ ...everyCell(normal), m_r_c5: 'NT' }, { ntReason: 'pain' }));
    expect(whyOf(notTested, { result: 'motorLevel', side: 'right' })?.because).toContain(
      'Not determinable. Knowing right key muscle C5 (NT)',
    );
  });

  it('places each issue at its cell, and does not count blank cells among them', () => {
    expect(readSheet(blankSheet).issues).toEqual([]);
    const { issues } = readSheet(withWritten({ lt_r_c2: '1*', pp_l_s3: '0', pp_l_s4_5: '2', dap: 'NT', lt_r_c3: 'NT' }));
    expect(issues.map(({ code, severity, cell }) => [code, severity, cell])).toEqual([
      ['tag-without-cause', 'error', 'lt_r_c2'],
      ['nt-without-reason', 'warning', 'lt_r_c3'],
      ['nt-without-reason', 'warning', 'dap'],
      ['perianal-normal-s3-absent', 'warning', 'pp_l_s4_5'],
    ]);
  });

  it('takes one reason for all cells not tested, and another where a cell has its own', () => {
    const written = { lt_r_c2: 'NT', lt_r_c3: 'NT' };
    const missing = (sheet: ExamSheet) =>
      readSheet(sheet)
        .issues.filter(({ code }) => code === 'nt-without-reason')
        .map(({ cell }) => cell);
    expect(missing(withWritten(written, { ntReasons: { lt_r_c2: 'pain' } }))).toEqual(['lt_r_c3']);
    expect(missing(withWritten(written, { ntReason: 'medical' }))).toEqual([]);
  });

  it('warns of a non-key muscle without effect', () => {
    const { issues } = readSheet(withWritten(everyCell(normal), { nonKey: { right: 'L3', left: null } }));
    expect(issues.map(({ code, field, side }) => [code, field, side])).toContainEqual(['non-key-without-effect', 'nonKey', 'right']);
  });

  it('grades a normal exam E only with an earlier deficit', () => {
    const grade = (earlierDeficit: boolean | null) =>
      readSheet(withWritten(everyCell(normal), { earlierDeficit })).classification.ais.values;
    expect([grade(true), grade(false), grade(null)]).toEqual([['E'], ['none'], ['none']]);
  });

  it('can be written only in the codes of the dictionary', () => {
    expect(codeFor('lt_r_c2', ' nt* ')).toBe('NT*');
    expect(codeFor('lt_r_c2', '2*')).toBeUndefined();
    expect(codeFor('vac', 'YES')).toBe('yes');
  });
});
