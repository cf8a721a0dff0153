/**
 * Time and memory of classifying exams, beside the npm package `isncsci` 2.0.6 in the same process.
 * Run alone: npx tsx --conditions=@cairnstep/source packages/scoring/bench/classify.bench.ts
 */
import { fileURLToPath } from 'node:url';
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { classify } from '@cairnstep/scoring';
import type { Exam } from '@cairnstep/scoring';
import type { Scenario } from '../../../infra/bench/scenario.ts';
import { classifyByPeer, toPeerExam } from '../reference/peer.ts';
import { randomExam, seededRandom, withManyUntested, withTagged, withUntested } from '../reference/random-exams.ts';

const peerName = 'isncsci 2.0.6';
const examsPerRound = 2_000;
const rounds = 15;

/** Goals: 12 µs for an exam without open cells and five times faster than the peer; 2 ms with twenty cells unknown. */
const determinateGoal = 12;
const timesFaster = 5;
const twentyUnknownGoal = 2;
const memoryGoal = 1;
/** One kilobyte, in MB: less is told as this much, so that a ratio remains. */
const leastMemoryTold = 0.001;

function makeExams(seed: number, open: (random: () => number, exam: Exam) => Exam): Exam[] {
  const random = seededRandom(seed);
  return Array.from({ length: examsPerRound }, (_, index) => open(random, randomExam(random, index % 2 === 0 ? 'noise' : 'levelled')));
}

/** Median over rounds of the time per item, in microseconds of processor time, so that a busy machine changes it little. */
function microseconds<T>(items: readonly T[], work: (item: T) => unknown): number {
  const times: number[] = [];
  for (let round = 0; round < rounds; round++) {
    const before = process.cpuUsage();
    for (const item of items) work(item);
    const { user, system } = process.cpuUsage(before);
    times.push((user + system) / items.length);
  }
  return times.sort((one, other) => one - other)[Math.floor(rounds / 2)]!;
}

/** The slowest single exam, in milliseconds, each exam's time being the best of a few tries. */
function slowest<T>(items: readonly T[], work: (item: T) => unknown): number {
  const times = items.map((item) => {
    const tries = Array.from({ length: 5 }, () => {
      const before = process.hrtime.bigint();
      work(item);
      return Number(process.hrtime.bigint() - before) / 1e6;
    });
    return Math.min(...tries);
  });
  return Math.max(...times);
}

/** Memory still held after 100,000 exams, in MB. */
function megabytesHeld<T>(items: readonly T[], work: (item: T) => unknown): number {
  setFlagsFromString('--expose-gc');
  const collectGarbage = runInNewContext('gc') as () => void;
  const pass = () => {
    for (const item of items) work(item);
  };
  pass();
  collectGarbage();
  const before = process.memoryUsage().heapUsed;
  for (let done = 0; done < 100_000; done += items.length) pass();
  collectGarbage();
  return Math.max(leastMemoryTold, (process.memoryUsage().heapUsed - before) / 1e6);
}

function timeScenario(name: string, seed: number, open: (random: () => number, exam: Exam) => Exam): Scenario {
  return {
    name,
    run: async () => {
      const exams = makeExams(seed, open);
      const peer = microseconds(exams.map(toPeerExam), classifyByPeer);
      return { ours: microseconds(exams, classify), peer, unit: 'µs', peerName, goal: Math.min(determinateGoal, peer / timesFaster) };
    },
  };
}

export const scenarios: readonly Scenario[] = [
  timeScenario('classify an exam, all cells tested', 1, (_random, exam) => exam),
  timeScenario('classify an exam, 1 to 4 cells not tested', 2, withUntested),
  timeScenario('classify an exam, 1 or 2 cells tagged', 3, withTagged),
  {
    name: 'classify an exam, 20 cells not tested, slowest of 2,000',
    run: async () => {
      const exams = makeExams(4, (random, exam) => withManyUntested(random, exam, 20));
      return {
        ours: slowest(exams, classify),
        peer: slowest(exams.map(toPeerExam), classifyByPeer),
        unit: 'ms',
        peerName,
        goal: twentyUnknownGoal,
      };
    },
  },
  {
    name: 'memory held after classifying 100,000 exams',
    run: async () => {
      const exams = makeExams(5, withUntested);
      return {
        ours: megabytesHeld(exams, classify),
        peer: megabytesHeld(exams.map(toPeerExam), classifyByPeer),
        unit: 'MB',
        peerName,
        goal: memoryGoal,
      };
    },
  },
];

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  for (const { name, run } of scenarios) {
    const { ours, peer, unit, goal } = await run();
    const verdict = goal === undefined ? '' : `, goal ${goal.toFixed(1)} ${unit}`;
    console.log(`${name}: ${ours.toFixed(3)} ${unit}, ${peerName} ${peer.toFixed(3)} ${unit}, ${(peer / ours).toFixed(1)} to 1${verdict}`);
  }
}
