import { keyMuscles, levels } from '@cairnstep/scoring';
import type { Level } from '@cairnstep/scoring';
import type { Rule } from '../../checking/rule.ts';

const legMuscles = keyMuscles.slice(5).map((segment) => segment.toLowerCase());
const t10 = levels.indexOf('T10');
const isT10OrHigher = (level: Level): boolean => levels.indexOf(level) <= t10;

export const gradeBWithoutLegMovement: Rule = {
  id: 'C14',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const recorded = table.column('recorded_ais');
    const sides = [
      { side: 'right', letter: 'r' },
      { side: 'left', letter: 'l' },
    ] as const;
    for (let row = 0; row < table.fileRows; row += 1) {
      if (recorded.word(row) !== 'B') continue;
      const motorLevel = exams.classification(row)?.motorLevel;
      for (const { side, letter } of sides) {
        if (!motorLevel?.[side].values.every(isT10OrHigher)) continue;
        for (const segment of legMuscles) {
          const column = `m_${letter}_${segment}`;
          if (/^[1-5]/.test(table.column(column).word(row) ?? '')) report.add(table, row, column, 'A leg muscle that moves, at grade B.');
        }
      }
    }
  },
};
