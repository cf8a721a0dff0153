import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import { wasUnable } from '../../checking/visits.ts';

const highBalance = limitOf('C11', 'highBalance');
const lowBalance = limitOf('C11', 'lowBalance');
const highSpeed = limitOf('C11', 'highSpeedMps');

export const balanceAndWalking: Rule = {
  id: 'C11',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const balance of visit.scored('bbs')) {
        const walks = visit.of('tmwt_ss', 'tmwt_fast').filter(({ inDevice }) => !inDevice);
        const cannotWalk = walks.find(wasUnable);
        if (balance.value >= highBalance && cannotWalk) {
          report.addToOneOf(
            visit.table,
            [balance.row, cannotWalk.row],
            'value',
            'A high balance score of a person marked unable to walk 10 metres.',
          );
        }
        const fastWalk = walks.find(({ measure, value }) => measure === 'tmwt_ss' && value !== null && value > highSpeed);
        if (balance.value <= lowBalance && fastWalk) {
          report.addToOneOf(visit.table, [balance.row, fastWalk.row], 'value', 'A very low balance score of a person who walks fast.');
        }
      }
    }
  },
};
