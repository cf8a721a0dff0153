/**
 * Who trains in the invented consortium: how many people of each level group and grade begin in the 24 months. Chosen so
 * that the grid of level by grade has large, small and empty cells. Few complete injuries and many of grade D, as in
 * cohorts of locomotor training (Forrest et al., PLoS ONE 2014;9:e94108: of 199 graded outpatients 20 were C and 179 D), but
 * with more A to C, because half of the clinics use powered devices.
 */
import type { AisGrade, Level, LevelGroupId } from '@cairnstep/scoring';
import type { Random } from './random.ts';

export type Grade = Exclude<AisGrade, 'none'>;

export interface Case {
  readonly nli: Level;
  readonly grade: Grade;
}

/** How often each level occurs within its group. */
const levelsInGroup: Readonly<Record<LevelGroupId, Readonly<Partial<Record<Level, number>>>>> = {
  c1_c4: { C2: 1, C3: 3, C4: 14 },
  c5_c8: { C5: 12, C6: 9, C7: 6, C8: 3 },
  t1_t9: { T1: 1, T2: 1, T3: 2, T4: 4, T5: 3, T6: 4, T7: 3, T8: 3, T9: 3 },
  t10_t12: { T10: 4, T11: 5, T12: 7 },
  l1_l5: { L1: 9, L2: 4, L3: 3, L4: 2, L5: 1 },
  s1_s3: { S1: 3, S2: 2, S3: 1 },
  intact: { INT: 1 },
};

const people: Readonly<Record<LevelGroupId, Partial<Readonly<Record<Grade, number>>>>> = {
  c1_c4: { A: 5, B: 7, C: 58, D: 88 },
  c5_c8: { A: 14, B: 16, C: 64, D: 82 },
  t1_t9: { A: 44, B: 22, C: 40, D: 25 },
  t10_t12: { A: 16, B: 10, C: 36, D: 24 },
  l1_l5: { A: 1, B: 2, C: 15, D: 22 },
  s1_s3: { B: 1, D: 5 },
  intact: { E: 3 },
};

/** The 600 people in random order. */
export function drawCases(random: Random): Case[] {
  const cases = Object.entries(people).flatMap(([group, grades]) =>
    Object.entries(grades).flatMap(([grade, count]) =>
      Array.from({ length: count }, (): Case => ({
        nli: random.weighted(levelsInGroup[group as LevelGroupId]),
        grade: grade as Grade,
      })),
    ),
  );
  return random.shuffled(cases);
}
