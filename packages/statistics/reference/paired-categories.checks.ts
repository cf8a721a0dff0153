/** The same people classified twice, against R. */

import type { KappaWeights, TwoByTwo } from '../src/index.ts';
import { bowkerSymmetry, mcNemarTest, stuartMaxwell, transitionSummary, weightedKappa } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { figures, limits, membersOf } from './figures.ts';
import fixture from './paired-categories.json' with { type: 'json' };

const weightings: readonly KappaWeights[] = ['none', 'linear', 'quadratic'];

export const pairedCategoryChecks: readonly ReferenceCheck[] = fixture.tables.flatMap((one) => {
  const { table, mcNemar } = one;
  const check = (id: string, method: string, compute: () => unknown, expected: unknown): ReferenceCheck => ({
    id: `${id} ${one.id}`,
    method,
    source: `${fixture.source}; ${one.source}`,
    compute,
    expected,
    tolerance: fixture.tolerance,
  });
  return [
    check(
      'movement',
      'transition-summary',
      () => {
        const { signTest, ...movement } = transitionSummary(table);
        return { ...movement, signTestP: membersOf(signTest, (test) => test.p) };
      },
      one.movement,
    ),
    check('Bowker', 'bowker', () => membersOf(bowkerSymmetry(table), figures), one.bowker),
    check('Stuart-Maxwell', 'stuart-maxwell', () => membersOf(stuartMaxwell(table), figures), one.stuartMaxwell),
    ...weightings.map((weights) =>
      check(
        `kappa ${weights}`,
        'weighted-kappa',
        () =>
          membersOf(weightedKappa(table, weights), (kappa) => ({
            ...kappa,
            kappa: kappa.estimate,
            z: kappa.test.statistic,
            limits: limits(kappa.interval),
          })),
        one.kappa[weights],
      ),
    ),
    ...(mcNemar ? [check('McNemar', 'mcnemar', () => mcNemarTest(table as unknown as TwoByTwo), mcNemar)] : []),
  ];
});
