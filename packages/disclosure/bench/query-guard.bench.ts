/**
 * Time of one question against 100 answered sets among 10,000 people (goal: under 200 ms).
 * Run: npx tsx --conditions @cairnstep/source packages/disclosure/bench/query-guard.bench.ts
 */
import type { AnsweredSet } from '../src/index.ts';
import { judgeQuestion, peopleSet } from '../src/index.ts';
import { seededRandom, timed } from './bench-tools.ts';

const PEOPLE = 10_000;
const SETS = 100;
const random = seededRandom(1);
const range = (from: number, to: number) => Array.from({ length: to - from }, (_, at) => from + at);
const everyone = peopleSet(range(0, PEOPLE));
const pick = (share: number, from = 0, to = PEOPLE) => range(from, to).filter(() => random() < share);

const situations: readonly { readonly name: string; readonly sets: readonly (readonly number[])[]; readonly asked: readonly number[] }[] = [
  { name: 'cohorts of 1 to 60 percent', sets: range(0, SETS).map(() => pick(0.01 + 0.59 * random())), asked: pick(0.2) },
  { name: 'small disjoint cohorts', sets: range(0, SETS).map((at) => range(at * 40, at * 40 + 30)), asked: range(4000, 4040) },
  { name: 'nested cohorts', sets: range(0, SETS).map((at) => range(0, 1000 + at * 60)), asked: range(0, 8000) },
  { name: 'disjoint parts of the asked set', sets: range(0, SETS).map((at) => range(at * 90, at * 90 + 90)), asked: range(0, 9500) },
  { name: 'halves of one small group', sets: range(0, SETS).map(() => pick(0.5, 5000, 5060)), asked: range(5000, 5060) },
];

for (const { name, sets, asked } of situations) {
  const answered = sets.map((members): AnsweredSet => ({ project: 'p', cut: 'c', people: peopleSet(members) }));
  const question = { project: 'p', cut: 'c', people: peopleSet(asked), everyone };
  const { verdict } = judgeQuestion(question, answered);
  console.log(`${name}: ${verdict}, ${timed(() => judgeQuestion(question, answered))}`);
}
