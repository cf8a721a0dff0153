import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import type { Visit } from '../../checking/visits.ts';

const withinDays = limitOf('C17', 'withinDays');

const largest: Readonly<Record<string, number>> = {
  tmwt_ss: limitOf('C17', 'speedMps'),
  tmwt_fast: limitOf('C17', 'speedMps'),
  six_mwt: limitOf('C17', 'sixMinuteWalkM'),
  lems: limitOf('C17', 'legMotorPoints'),
  scim3_total: limitOf('C17', 'scimTotalPoints'),
  wisci2: limitOf('C17', 'wisciLevels'),
};

interface DayResult {
  readonly visit: Visit;
  readonly row: number;
  readonly value: number;
}

/** Results that may be compared over time: same participant, measure and basis, both with the device or both without it; the best of each day. */
function series(visits: readonly Visit[]): DayResult[][] {
  const found = new Map<string, DayResult[]>();
  for (const visit of visits) {
    const basis = visit.table.column('level_basis');
    const ofDay = new Map<string, DayResult>();
    for (const measure of Object.keys(largest)) {
      for (const { row, value, inDevice } of visit.scored(measure)) {
        const key = `${visit.person} ${measure} ${inDevice} ${basis.word(row) ?? ''}`;
        const kept = ofDay.get(key);
        if (!kept || value > kept.value) ofDay.set(key, { visit, row, value });
      }
    }
    for (const [key, result] of ofDay) {
      const list = found.get(key);
      if (list) list.push(result);
      else found.set(key, [result]);
    }
  }
  return [...found.values()];
}

export const largeChange: Rule = {
  id: 'C17',
  evaluate: ({ visits }, report) => {
    for (const results of series(visits)) {
      results.sort((a, b) => a.visit.day - b.visit.day);
      const measure = results[0]?.visit.table.column('measure').word(results[0].row) ?? '';
      const limit = (largest[measure] ?? Infinity) + 1e-9;
      results.forEach((later, index) => {
        // One result a day, so that no more than `withinDays` are looked back at.
        for (let before = index - 1; before >= 0; before -= 1) {
          const earlier = results[before];
          if (!earlier || later.visit.day - earlier.visit.day > withinDays) return;
          if (Math.abs(later.value - earlier.value) <= limit) continue;
          report.addToOneOf(
            later.visit.table,
            [later.row, earlier.row],
            'value',
            `A change within ${withinDays} days that is larger than recovery lets expect.`,
          );
          return;
        }
      });
    }
  },
};
