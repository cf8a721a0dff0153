/**
 * Questions after earlier answers and what the guard must say. Source: the registry's own rules on overlapping queries (minimum size,
 * minimum difference, unions, one project's scope, time differencing), worked by hand: the expectation follows from the number of
 * people in the difference alone. Everybody is 600 people, registry numbers 0 to 599.
 */
interface KnownSet {
  readonly project: string;
  readonly cut: string;
  readonly members: readonly number[];
}

export interface GuardVector {
  readonly number: number;
  readonly says: string;
  readonly earlier: readonly KnownSet[];
  readonly asked: KnownSet;
  readonly expected: 'answer' | 'answer-as-before' | 'refuse';
}

const range = (from: number, to: number) => Array.from({ length: to - from }, (_, at) => from + at);
const set = (members: readonly number[], cut = '2026-01', project = 'gait after a year'): KnownSet => ({ project, cut, members });

export const guardVectors: readonly GuardVector[] = [
  { number: 1, says: 'answers for 11 people', earlier: [], asked: set(range(0, 11)), expected: 'answer' },
  { number: 2, says: 'refuses 10 people', earlier: [], asked: set(range(0, 10)), expected: 'refuse' },
  { number: 3, says: 'refuses nobody, where somebody could be', earlier: [], asked: set([]), expected: 'refuse' },
  {
    number: 4,
    says: 'gives the same answer for the same people, however they are asked for',
    earlier: [set(range(0, 24))],
    asked: set([...range(0, 24)].reverse()),
    expected: 'answer-as-before',
  },
  { number: 5, says: 'refuses 24 people less one', earlier: [set(range(0, 24))], asked: set(range(1, 24)), expected: 'refuse' },
  { number: 6, says: 'answers for 24 people less 11', earlier: [set(range(0, 24))], asked: set(range(11, 24)), expected: 'answer' },
  { number: 7, says: 'refuses 24 people and 10 more', earlier: [set(range(0, 24))], asked: set(range(0, 34)), expected: 'refuse' },
  {
    number: 8,
    says: 'refuses two disjoint answered sets together less one',
    earlier: [set(range(0, 30)), set(range(30, 60))],
    asked: set(range(1, 60)),
    expected: 'refuse',
  },
  {
    number: 9,
    says: 'refuses a colleague in the same project what the two could subtract',
    earlier: [set(range(0, 30))],
    asked: set(range(1, 30)),
    expected: 'refuse',
  },
  {
    number: 10,
    says: 'refuses the same question in the next cut when one person withdrew in between',
    earlier: [set(range(0, 30), '2025-12')],
    asked: set(range(1, 30), '2026-01'),
    expected: 'refuse',
  },
  {
    number: 11,
    says: 'answers for everybody without a site of 12',
    earlier: [set(range(0, 600))],
    asked: set(range(12, 600)),
    expected: 'answer',
  },
  {
    number: 12,
    says: 'refuses everybody without a site of 8',
    earlier: [set(range(0, 600))],
    asked: set(range(8, 600)),
    expected: 'refuse',
  },
  {
    number: 13,
    says: 'refuses on screen 23 of the 24 people whose rows the project holds',
    earlier: [set(range(100, 124))],
    asked: set(range(100, 123)),
    expected: 'refuse',
  },
];
