import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import { levels } from '@cairnstep/scoring';

const levelsBelow = limitOf('E03', 'levelsBelow');
const placeOf = (level: string): number => levels.findIndex((each) => each === level);

export const nonKeyMuscleHasEffect: Rule = {
  id: 'E03',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const sides = [
      { side: 'right', column: 'non_key_r' },
      { side: 'left', column: 'non_key_l' },
    ] as const;
    for (let row = 0; row < table.fileRows; row += 1) {
      for (const { side, column } of sides) {
        const segment = table.column(column).word(row);
        const motorLevels = segment === null ? undefined : exams.classification(row)?.motorLevel[side].values;
        if (segment === null || !motorLevels) continue;
        // Of several possible motor levels the highest decides: below it the entry may have an effect.
        const highest = Math.min(...motorLevels.map(placeOf));
        if (placeOf(segment) - highest <= levelsBelow)
          report.add(table, row, column, `A non-key muscle no more than ${levelsBelow} levels below the motor level.`);
      }
    }
  },
};
