import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import { comparableWalks } from '../../checking/visits.ts';

// Differences of two speeds with two decimals carry binary noise.
const tolerance = limitOf('C08', 'toleranceMps') + 1e-9;

export const fastNotBelowSelfSelected: Rule = {
  id: 'C08',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const { fast, selfSelected } of comparableWalks(visit)) {
        if (fast && selfSelected && fast.number < selfSelected.number - tolerance) {
          report.addToOneOf(visit.table, [fast.row, selfSelected.row], 'value', 'A fast speed below the self-selected one.');
        }
      }
    }
  },
};
