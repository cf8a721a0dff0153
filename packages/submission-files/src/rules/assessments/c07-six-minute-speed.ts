import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import { comparableWalks } from '../../checking/visits.ts';

const maxOfFast = limitOf('C07', 'maxOfFast');
const addedToFast = limitOf('C07', 'addedToFastMps');
const minOfSelfSelected = limitOf('C07', 'minOfSelfSelected');
const maxOfSelfSelected = limitOf('C07', 'maxOfSelfSelected');

export const sixMinuteSpeed: Rule = {
  id: 'C07',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const { sixMinutes, fast, selfSelected } of comparableWalks(visit)) {
        if (!sixMinutes) continue;
        const speed = sixMinutes.number;
        const rows = [sixMinutes.row, ...(fast ? [fast.row] : []), ...(selfSelected ? [selfSelected.row] : [])];
        if (fast && speed > maxOfFast * fast.number + addedToFast) {
          report.addToOneOf(visit.table, rows, 'value', 'A speed over six minutes above the fast speed over 10 metres.');
        } else if (selfSelected && (speed < minOfSelfSelected * selfSelected.number || speed > maxOfSelfSelected * selfSelected.number)) {
          report.addToOneOf(visit.table, rows, 'value', 'A speed over six minutes far from the self-selected speed over 10 metres.');
        }
      }
    }
  },
};
