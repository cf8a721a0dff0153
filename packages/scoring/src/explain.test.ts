import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constructedCases } from '../reference/constructed-cases.ts';
import { flatResults } from '../reference/flat-results.ts';
import { withCell } from '../reference/open-cells.ts';
import { randomExam, seededRandom, withTagged, withUntested } from '../reference/random-exams.ts';
import { cellPlaces, writtenIn } from './cell-key.ts';
import { classify } from './classify.ts';
import type { Exam } from './exam.ts';
import { explain, explainResult, resultNames, resultOf } from './explain.ts';
import type { Side } from './segments.ts';
import type { TraceStep } from './trace-step.ts';

function step(id: string, result: TraceStep['result'], side?: Side): TraceStep {
  const exam = constructedCases.find((constructed) => constructed.id === id)?.exam as Exam;
  return explain(exam).find((found) => found.result === result && found.side === side) as TraceStep;
}

describe('the explanation of a classification', () => {
  it('names the first altered dermatome for the sensory level', () => {
    expect(step('case-02', 'sensoryLevel', 'left')).toEqual({
      result: 'sensoryLevel',
      side: 'left',
      value: 'C6',
      because:
        'Going down from C2, C7 (light touch 1, pin prick 1) is the first dermatome that is not normal in both modalities. The level is the last normal segment, C6.',
      cells: ['lt_l_c7', 'pp_l_c7'],
    });
    expect(step('case-21', 'sensoryLevel', 'right').because).toContain('S4-5 itself is never a level');
    expect(step('case-15', 'sensoryLevel', 'right').because).toContain('No dermatome above it is tested, so the level is C1');
    expect(step('case-14', 'sensoryLevel', 'right').because).toContain('normal in every dermatome');
  });

  it('names the muscle that ends the search, or the segments without one', () => {
    expect(step('case-02', 'motorLevel', 'left')).toMatchObject({
      value: 'C6',
      because: 'C6 (grade 4) is the first key muscle below 5. It reaches 3, so it is the level.',
      cells: ['m_l_c6'],
    });
    expect(step('case-07', 'motorLevel', 'right').because).toContain('does not reach 3, so the level is the segment above it, C5');
    expect(step('case-01', 'motorLevel', 'right').because).toContain('between T2 and T12');
    expect(step('case-15', 'motorLevel', 'right').because).toContain('lies above C4');
    expect(step('case-20', 'motorLevel', 'right').because).toContain('lies below S1');
    expect(step('case-22', 'motorLevel', 'right').because).toContain('not normal down to T2, so the level is T1');
    expect(step('case-14', 'motorLevel', 'left')).toMatchObject({ value: 'S3', cells: ['vac'] });
  });

  it('says why the grade is C and not B, and C and not D', () => {
    const { because, cells } = step('case-07', 'ais');
    expect(because).toContain('Preserved at S4-5: deep anal pressure and right sensation (light touch 1, pin prick 1).');
    expect(because).toContain('On the right, movement more than three levels below the motor level C5: T1 (grade 1).');
    expect(because).toContain('motor incomplete, not B');
    expect(because).toContain('0 of the 18 key muscles below the level of injury C5 reach grade 3; half would be 9');
    expect(cells).toEqual(expect.arrayContaining(['dap', 'lt_r_s4_5', 'pp_r_s4_5', 'm_r_t1', 'm_l_s1']));
  });

  it('says why the grade is D at exactly half, and with no muscle to count', () => {
    expect(step('case-09', 'ais').because).toContain(
      '5 of the 10 key muscles below the level of injury T10 reach grade 3; half would be 5, so at least half do',
    );
    expect(step('case-21', 'ais').because).toContain('No key muscle lies below the level of injury S3');
  });

  it('says why the grade is A, B, C by a non-key muscle, E or none', () => {
    expect(step('case-01', 'ais').because).toContain('all four scores at S4-5 are 0');
    expect(step('case-36', 'ais').because).toContain('nothing moves more than three levels below the right motor level L1');
    expect(step('case-37', 'ais').because).toContain('a non-key muscle at L4');
    expect(step('case-37', 'zppMotor', 'right').because).toContain('non-key muscle at L4');
    const normal: Exam = { ...(constructedCases.find(({ id }) => id === 'case-14')?.exam as Exam), vac: 'Yes' };
    const grade = (exam: Exam) => explain(exam).find(({ result }) => result === 'ais')?.because;
    expect(grade(normal)).toContain('an earlier deficit is on record');
    expect(grade({ ...normal, earlierDeficit: false })).toContain('no grade is given');
  });

  it('names the cells that keep a result open, and only those', () => {
    expect(step('case-26', 'motorLevel', 'left')).toMatchObject({
      value: 'C5, C6',
      because: 'Not determinable. Knowing left key muscle C6 (NT) could narrow it.',
      cells: ['m_l_c6'],
    });
    expect(step('case-28', 'completeness').cells).toEqual(['lt_r_s4_5', 'pp_r_s4_5', 'lt_l_s4_5', 'pp_l_s4_5', 'dap']);
    expect(step('case-28', 'zppSensory', 'left').cells).toEqual(['lt_l_s4_5', 'pp_l_s4_5', 'dap']);
    expect(step('case-29', 'ais').because).toContain('It is B if');
    expect(step('case-38', 'ais').because).toContain('At every level of injury the exam allows, fewer than half');
  });

  it('says when tagged cells change a result', () => {
    expect(step('case-30', 'motorLevel', 'right').because).toContain('Cells tagged for another condition change this result.');
    expect(step('case-30', 'motorLevel', 'left').because).not.toContain('tagged');
  });

  it('tells the values of classify, in order, for any exam, and always says why', () => {
    fc.assert(
      fc.property(fc.nat(), fc.constantFrom('noise' as const, 'levelled' as const), fc.nat({ max: 2 }), (seed, kind, opened) => {
        const random = seededRandom(seed);
        let exam = randomExam(random, kind);
        if (opened > 0) exam = withUntested(random, exam);
        if (opened > 1) exam = withTagged(random, exam);
        const steps = explain(exam);
        const values = Object.values(flatResults(classify(exam))).map((result) => result.values.join(', '));
        expect(steps.map(({ value }) => value)).toEqual(values);
        for (const { because, cells } of steps) {
          expect(because).toMatch(/^[A-Z].*\.$/);
          expect(because).not.toMatch(/undefined|NaN| {2}/);
          expect(new Set(cells).size).toBe(cells.length);
        }
      }),
      { seed: 71, numRuns: 400 },
    );
  });

  it('says of one result alone what it says of it among all', () => {
    const random = seededRandom(73);
    for (let exams = 0; exams < 20; exams += 1) {
      const exam = withUntested(random, randomExam(random, 'levelled'));
      expect(resultNames.map((name) => explainResult(exam, name))).toEqual(explain(exam));
      expect(resultNames.map((name) => resultOf(classify(exam), name))).toEqual(Object.values(flatResults(classify(exam))));
    }
  });

  it('names just the cells that could narrow an open result alone, or says that only several together could', () => {
    const kinds = new Set<string>();
    fc.assert(
      fc.property(fc.nat(), (seed) => {
        const random = seededRandom(seed);
        const exam = withUntested(random, randomExam(random, 'levelled'));
        const results = Object.values(flatResults(classify(exam)));
        for (const [index, { because, cells }] of explain(exam).entries()) {
          const open = results[index]?.values.length ?? 0;
          if (open < 2) continue;
          const narrows = (settled: Exam) => (Object.values(flatResults(classify(settled)))[index]?.values.length ?? 0) < open;
          const alone = [
            ...cellPlaces.filter((place) => {
              if (writtenIn(exam, place) !== 'NT') return false;
              const scores = place.modality === 'motor' ? ['0', '1', '2', '3', '4', '5'] : ['0', '1', '2'];
              return scores.some((score) => narrows(withCell(exam, place, score)));
            }),
            ...(['vac', 'dap'] as const)
              .filter((key) => exam[key] === 'NT' && (narrows({ ...exam, [key]: 'Yes' }) || narrows({ ...exam, [key]: 'No' })))
              .map((key) => ({ key })),
          ].map(({ key }) => key);
          kinds.add(alone.length > 0 ? 'alone' : 'together');
          if (alone.length > 0) expect(cells).toEqual(alone);
          expect(because).toContain(alone.length > 0 ? 'Knowing ' : 'Only several of these together');
        }
      }),
      { seed: 72, numRuns: 400 },
    );
    expect([...kinds].sort()).toEqual(['alone', 'together']);
  });
});
