import { keyMuscles, levels, sides } from '@cairnstep/scoring';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Grade } from '../case-mix.ts';
import { Random } from '../random.ts';
import { draftSheet } from './draft-sheet.ts';
import { classifySheet, muscleLevels, shows } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';
import { recoveredSheet } from './recovered-sheet.ts';
import { unclearCells } from './unclear-cells.ts';

const grades: readonly Grade[] = ['A', 'B', 'C', 'D'];
const impaired = fc.record({
  seed: fc.nat(),
  nli: fc.constantFrom(...levels.slice(1, levels.indexOf('S1'))),
  grade: fc.constantFrom(...grades),
});

function motorScore(sheet: ExamSheet): number {
  return sides.reduce((sum, side) => sum + sheet[side].muscles.reduce((kept, grade) => kept + grade, 0), 0);
}

describe('an invented exam', () => {
  it('shows the level and grade it was invented for', () => {
    fc.assert(
      fc.property(impaired, ({ seed, nli, grade }) => shows(classifySheet(draftSheet(Random.of(seed), { nli, grade })), { nli, grade })),
      { seed: 4711, numRuns: 300 },
    );
  });

  it('is possible for grades A, B and D, not for C, where no key muscle lies below the level', () => {
    const random = Random.of(1, 'sacral');
    for (const nli of ['S1', 'S2', 'S3'] as const) {
      for (const grade of ['A', 'B', 'D'] as const)
        expect(shows(classifySheet(draftSheet(random, { nli, grade })), { nli, grade })).toBe(true);
      expect(() => draftSheet(random, { nli, grade: 'C' })).toThrow(/No exam was found/);
    }
  });

  it('is normal throughout for grade E', () => {
    const { nli, ais, totals } = classifySheet(draftSheet(Random.of(1), { nli: 'INT', grade: 'E' }));
    expect([nli.values, ais.values, totals.uems, totals.lems]).toEqual([['INT'], ['E'], 50, 50]);
  });

  it('has full strength above the motor level', () => {
    fc.assert(
      fc.property(impaired, ({ seed, nli, grade }) => {
        const sheet = draftSheet(Random.of(seed), { nli, grade });
        return sides.every((side) =>
          keyMuscles.every((_, index) => (muscleLevels[index] ?? 0) >= levels.indexOf(nli) || sheet[side].muscles[index] === 5),
        );
      }),
      { seed: 4712, numRuns: 100 },
    );
  });
});

describe('an exam after some recovery', () => {
  const recovery = fc.record({ points: fc.integer({ min: 0, max: 15 }), levelGained: fc.boolean(), converts: fc.boolean() });
  const next: Readonly<Record<Grade, Grade>> = { A: 'B', B: 'C', C: 'D', D: 'D', E: 'E' };

  it('shows what it says it shows, and loses no strength', () => {
    fc.assert(
      fc.property(impaired, recovery, ({ seed, nli, grade }, { points, levelGained, converts }) => {
        const random = Random.of(seed);
        const before = { sheet: draftSheet(random, { nli, grade }), finding: { nli, grade } };
        const after = recoveredSheet(random, before, { points, levelGained, grade: converts ? next[grade] : grade });
        expect(shows(classifySheet(after.sheet), after.finding)).toBe(true);
        expect(motorScore(after.sheet)).toBeGreaterThanOrEqual(motorScore(before.sheet));
      }),
      { seed: 4713, numRuns: 150 },
    );
  });

  it('leaves the exam before it as it was', () => {
    const random = Random.of(8);
    const finding = { nli: 'T8', grade: 'C' } as const;
    const before = { sheet: draftSheet(random, finding), finding };
    const copy = structuredClone(before);
    recoveredSheet(random, before, { points: 10, levelGained: true, grade: 'D' });
    expect(before).toEqual(copy);
  });
});

describe('unclear cells', () => {
  it('change nothing, or leave just the named result open with the true one among the possible', () => {
    fc.assert(
      fc.property(impaired, ({ seed, nli, grade }) => {
        const random = Random.of(seed);
        const shown = { sheet: draftSheet(random, { nli, grade }), finding: { nli, grade } };
        const { marks, open } = unclearCells(random, shown);
        const found = classifySheet(shown.sheet, marks);
        if (open === undefined) return shows(found, shown.finding);
        return found[open].values.length > 1 && found.nli.values.includes(nli) && found.ais.values.includes(grade);
      }),
      { seed: 4714, numRuns: 400 },
    );
  });
});
