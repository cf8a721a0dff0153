import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import { comparableWalks } from '../../checking/visits.ts';

const walkedM = limitOf('C09', 'walkedM');
const minOfFast = limitOf('C09', 'minOfFast');
const maxOfSelfSelected = limitOf('C09', 'maxOfSelfSelected');
const addedS = limitOf('C09', 'addedS');

export const upAndGoTime: Rule = {
  id: 'C09',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const { upAndGo, fast, selfSelected } of comparableWalks(visit)) {
        if (!upAndGo) continue;
        const rows = [upAndGo.row, ...(fast ? [fast.row] : []), ...(selfSelected ? [selfSelected.row] : [])];
        if (fast && upAndGo.number < minOfFast * (walkedM / fast.number)) {
          report.addToOneOf(visit.table, rows, 'value', 'A time shorter than the six metres in it take at the fast speed.');
        } else if (selfSelected && upAndGo.number > maxOfSelfSelected * (walkedM / selfSelected.number) + addedS) {
          report.addToOneOf(visit.table, rows, 'value', 'A time far longer than the self-selected speed lets expect.');
        }
      }
    }
  },
};
