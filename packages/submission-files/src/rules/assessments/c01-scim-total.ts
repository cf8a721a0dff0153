import type { Rule } from '../../checking/rule.ts';

const parts = ['scim3_self_care', 'scim3_resp_sphincter', 'scim3_mobility_room', 'scim3_mobility_in_out'];

export const scimTotal: Rule = {
  id: 'C01',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const total of visit.scored('scim3_total')) {
        const scores = parts.map((part) => visit.scored(part).find(({ trial }) => trial === total.trial)?.value);
        // Whole points: the sum is exact. A part that was not scored leaves nothing to compare.
        const sum = scores.reduce<number | undefined>(
          (kept, score) => (kept === undefined || score === undefined ? undefined : kept + score),
          0,
        );
        if (sum !== undefined && sum !== total.value)
          report.add(visit.table, total.row, 'value', 'A total that differs from the sum of its four parts.');
      }
    }
  },
};
