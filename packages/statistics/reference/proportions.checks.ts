/** Single proportions and their differences against R and the figures of Newcombe's papers. */

import { chiSquareTest, clopperPearsonProportion, fisherTwoByTwo, newcombeDifference, wilsonProportion } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { limits, membersOf } from './figures.ts';
import fixture from './proportions.json' with { type: 'json' };

const { source, tolerance } = fixture;

export const proportionChecks: readonly ReferenceCheck[] = [
  ...fixture.single.flatMap(({ events, total, share, wilson, clopperPearson }): ReferenceCheck[] => [
    {
      id: `Wilson ${events} of ${total}`,
      method: 'proportion-wilson',
      source,
      compute: () => membersOf(wilsonProportion(events, total), (one) => ({ share: one.estimate, limits: limits(one.interval) })),
      expected: { share, limits: wilson },
      tolerance,
    },
    {
      id: `Clopper-Pearson ${events} of ${total}`,
      method: 'proportion-clopper-pearson',
      source,
      compute: () => membersOf(clopperPearsonProportion(events, total), (one) => ({ share: one.estimate, limits: limits(one.interval) })),
      expected: { share, limits: clopperPearson },
      tolerance,
    },
  ]),
  ...fixture.differences.flatMap(({ first, second, difference, newcombe, fisherP, zPooled }): ReferenceCheck[] => {
    const name = `${first.events} of ${first.total} against ${second.events} of ${second.total}`;
    const table = [
      [first.events, first.total - first.events],
      [second.events, second.total - second.events],
    ] as const satisfies readonly (readonly number[])[];
    const comparable = zPooled !== undefined;
    return [
      {
        id: `Newcombe ${name}`,
        method: 'proportion-difference',
        source,
        compute: () => membersOf(newcombeDifference(first, second), (one) => ({ difference: one.estimate, limits: limits(one.interval) })),
        expected: { difference, limits: newcombe },
        tolerance,
      },
      // Without an event, or without anybody free of it, there is nothing to compare; R answers p = 1.
      ...(comparable
        ? [
            {
              id: `Fisher ${name}`,
              method: 'fisher-two-by-two',
              source,
              compute: () => membersOf(fisherTwoByTwo([[...table[0]], [...table[1]]]), (one) => one.test.p),
              expected: fisherP,
              tolerance,
            },
            {
              id: `z of pooled shares ${name}`,
              method: 'chi-square',
              source,
              compute: () => membersOf(chiSquareTest(table), (one) => Math.sqrt(one.statistic)),
              expected: zPooled,
              tolerance,
            },
          ]
        : []),
    ];
  }),
];
