import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const highMobility = limitOf('C12', 'highMobility');

export const mobilityWithoutWalking: Rule = {
  id: 'C12',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      const level = visit.scored('wisci2').find(({ value }) => value === 0);
      const mobility = visit.scored('scim3_mobility_in_out').find(({ value }) => value >= highMobility);
      if (level && mobility)
        report.addToOneOf(visit.table, [mobility.row, level.row], 'value', 'High mobility of a person who does not walk.');
    }
  },
};
