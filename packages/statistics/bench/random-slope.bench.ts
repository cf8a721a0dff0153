/**
 * How long the random slope model takes for 30,000 participants with six visits each, some missing, at nominal visit times.
 * Run: npx tsx --conditions=@cairnstep/source bench/random-slope.bench.ts
 */

import { performance } from 'node:perf_hooks';
import { randomSlopeModel, seededGenerator } from '../src/index.ts';

const participants = 30_000;
const weeks = [0, 4, 8, 12, 26, 52];

const generator = seededGenerator(31);
/** Sum of twelve fractions less six: close enough to a normal deviate for a timing. */
const deviate = (): number => Array.from({ length: 12 }, () => generator.nextFraction()).reduce((sum, value) => sum + value, -6);

const outcome: (number | null)[] = [];
const participant: string[] = [];
const week: number[] = [];
for (let i = 0; i < participants; i++) {
  const [own, pace] = [0.2 * deviate(), 0.002 * deviate()];
  for (const time of weeks) {
    outcome.push(generator.nextFraction() < 0.15 ? null : 0.4 + own + (0.004 + pace) * time + 0.1 * deviate());
    participant.push(`P${i}`);
    week.push(time);
  }
}

for (let run = 0; run < 3; run++) {
  const start = performance.now();
  const model = randomSlopeModel({ outcome, slope: { name: 'week', values: week }, predictors: [], cluster: participant });
  console.log(`random slope: ${participants} participants, ${model.n} rows: ${(performance.now() - start).toFixed(0)} ms (${model.kind})`);
}
