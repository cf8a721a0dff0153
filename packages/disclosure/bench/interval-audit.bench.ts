/** The interval audit of a table as large as the grid can be, beside the linear programme of the same table. */
import type { Scenario } from '../../../infra/bench/scenario.ts';
import { intervalAudit, linkedIntervalAudit, linkSlices, loadLinearSolver, protectTable } from '../src/index.ts';
import { countsWithALongTail, medianTime, seededRandom } from './bench-tools.ts';

const rows = 30;
const columns = 6;
/** Few, some and many hidden cells. */
const means = [4, 12, 40];

export const scenarios: readonly Scenario[] = [
  {
    name: `interval audit, ${rows} x ${columns}`,
    run: async () => {
      const solver = await loadLinearSolver();
      const random = seededRandom(2);
      const times = means.map((mean) => {
        const table = countsWithALongTail(random, rows, columns, mean);
        const { hidden } = protectTable(table);
        const linked = linkSlices([{ name: 'everybody', table, hidden }], hidden);
        return { ours: medianTime(() => intervalAudit(table, hidden)), peer: medianTime(() => linkedIntervalAudit(solver, linked), 3) };
      });
      const slowest = times.reduce((one, other) => (one.ours >= other.ours ? one : other));
      return {
        ...slowest,
        unit: 'ms',
        peerName: 'HiGHS 1.15 (npm highs), a linear programme per hidden cell',
        goal: 50,
        note: `means of ${means.join(', ')} a cell: ${times.map(({ ours }) => `${ours.toFixed(1)} ms`).join(', ')}`,
      };
    },
  },
];
