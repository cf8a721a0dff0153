import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const examWithinDays = limitOf('T17', 'examWithinDays');
const sides = ['r', 'l'] as const;
const muscles = ['l2', 'l3', 'l4'];

export const volitionalWithoutStrength: Rule = {
  id: 'T17',
  evaluate: (submission, report) => {
    const { exams } = submission;
    const bouts = submission.table('bouts');
    const day = bouts.column('session_day');
    const legs = sides.map((side) => ({
      controls: ['hip', 'knee'].map((joint) => bouts.column(`${joint}_${side}_control`)),
      grades: muscles.map((muscle) => exams.table.column(`m_${side}_${muscle}`)),
    }));
    for (let row = 0; row < bouts.fileRows; row += 1) {
      for (const { controls, grades } of legs) {
        const volitional = controls.find((control) => control.word(row) === 'volitional');
        const trainedOn = volitional ? day.number(row) : null;
        if (!volitional || trainedOn === null) continue;
        const exam = exams.lastBetween(bouts.personOf(row), trainedOn - examWithinDays, trainedOn);
        if (exam === null || !grades.every((grade) => grade.word(exam) === '0')) continue;
        report.add(bouts, row, volitional.variable.key, 'Volitional control of a leg in which the last exam found no movement.');
      }
    }
  },
};
