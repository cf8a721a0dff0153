/**
 * How long the random intercept model takes for a registry's worth of rows: 30,000 participants with six visits each, some missing.
 * Run: npx tsx --conditions=@cairnstep/source bench/random-intercept.bench.ts
 */

import { performance } from 'node:perf_hooks';
import { indicatorPredictors, randomInterceptModel, seededGenerator } from '../src/index.ts';

const participants = 30_000;
const visits = ['baseline', 'week 4', 'week 8', 'week 12', 'month 6', 'month 12'];

const generator = seededGenerator(30_000);
/** Sum of twelve fractions less six: close enough to a normal deviate for a timing. */
const deviate = (): number => Array.from({ length: 12 }, () => generator.nextFraction()).reduce((sum, value) => sum + value, -6);

const outcome: (number | null)[] = [];
const participant: string[] = [];
const visit: string[] = [];
const grade: string[] = [];
for (let i = 0; i < participants; i++) {
  const own = 0.2 * deviate();
  const letter = 'ABCD'[generator.nextIndex(4)] as string;
  for (const [time, name] of visits.entries()) {
    outcome.push(generator.nextFraction() < 0.15 ? null : 0.4 + 0.05 * time + own + 0.1 * deviate());
    participant.push(`P${i}`);
    visit.push(name);
    grade.push(letter);
  }
}
const predictors = [...indicatorPredictors('visit', visit, visits), ...indicatorPredictors('grade', grade, ['A', 'B', 'C', 'D'])];

const times: number[] = [];
let rows = 0;
for (let run = 0; run < 7; run++) {
  const start = performance.now();
  const model = randomInterceptModel({ outcome, predictors, cluster: participant });
  times.push(performance.now() - start);
  rows = model.n;
}
times.sort((a, b) => a - b);
console.log(
  `random intercept: ${participants} participants, ${rows} rows, ${predictors.length + 1} coefficients: median ${times[3]?.toFixed(0)} ms, fastest ${times[0]?.toFixed(0)} ms, slowest ${times[6]?.toFixed(0)} ms`,
);
