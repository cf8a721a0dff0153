/**
 * What each level of the Walking Index for Spinal Cord Injury II takes, as coded attributes: for checking a recorded level
 * against the aids of a timed test. From memory of the published table; compare with the original before other use.
 */

export const walkingAids = ['none', 'bars', 'walker', 'two_crutches', 'one_crutch', 'stick'] as const;
export type WalkingAid = (typeof walkingAids)[number];

export interface WalkingHelp {
  readonly aid: WalkingAid;
  readonly brace: boolean;
  /** Persons giving physical help. */
  readonly persons: number;
}

const withBrace = true;
const noBrace = false;

function help(aid: WalkingAid, brace: boolean, persons: number): WalkingHelp {
  return { aid, brace, persons };
}

/** Help by level, 1 to 20; nobody walks at level 0. Level 1 covers less than 10 metres, every other level 10 metres. */
const helpByLevel: ReadonlyMap<number, WalkingHelp> = new Map([
  [1, help('bars', withBrace, 2)],
  [2, help('bars', withBrace, 2)],
  [3, help('bars', withBrace, 1)],
  [4, help('bars', noBrace, 1)],
  [5, help('bars', withBrace, 0)],
  [6, help('walker', withBrace, 1)],
  [7, help('two_crutches', withBrace, 1)],
  [8, help('walker', noBrace, 1)],
  [9, help('walker', withBrace, 0)],
  [10, help('stick', withBrace, 1)],
  [11, help('two_crutches', noBrace, 1)],
  [12, help('two_crutches', withBrace, 0)],
  [13, help('walker', noBrace, 0)],
  [14, help('stick', noBrace, 1)],
  [15, help('stick', withBrace, 0)],
  [16, help('two_crutches', noBrace, 0)],
  [17, help('none', noBrace, 1)],
  [18, help('none', withBrace, 0)],
  [19, help('stick', noBrace, 0)],
  [20, help('none', noBrace, 0)],
]);

const topLevel = 20;

function checkedLevel(level: number): number {
  if (!Number.isInteger(level) || level < 0 || level > topLevel) throw new RangeError('A WISCI II level is a whole number from 0 to 20.');
  return level;
}

/**
 * The help a level names; undefined for level 0.
 * @throws RangeError when it is not a level.
 */
export function helpAtLevel(level: number): WalkingHelp | undefined {
  return helpByLevel.get(checkedLevel(level));
}

/**
 * Whether a level and the help used in a timed test can belong together: level 20 takes no help at all, a level below 20 at
 * least one kind. Level 0 belongs with no timed walk.
 * @throws RangeError when it is not a level.
 */
export function helpAgrees(level: number, used: WalkingHelp): boolean {
  if (checkedLevel(level) === 0) return false;
  const helped = used.aid !== 'none' || used.brace || used.persons > 0;
  return helped === level < topLevel;
}

/**
 * The attributes in which the help used in a timed test differs from what the level names. A test may fairly use other
 * help than the level's, so a difference is a hint and not a contradiction.
 * @throws RangeError when it is not a level, or level 0.
 */
export function helpDifferences(level: number, used: WalkingHelp): (keyof WalkingHelp)[] {
  const named = helpAtLevel(level);
  if (named === undefined) throw new RangeError('Nobody walks at WISCI II level 0.');
  return (['aid', 'brace', 'persons'] as const).filter((attribute) => named[attribute] !== used[attribute]);
}
