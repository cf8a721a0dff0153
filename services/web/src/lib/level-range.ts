/** The run of spinal segments from C1 to S4-5, and ranges of it as people type them. */

export const segments = [
  'C1', 'C2', 'C3', 'C4', 'C5', 'C6', 'C7', 'C8',
  'T1', 'T2', 'T3', 'T4', 'T5', 'T6', 'T7', 'T8', 'T9', 'T10', 'T11', 'T12',
  'L1', 'L2', 'L3', 'L4', 'L5',
  'S1', 'S2', 'S3', 'S4-5',
] as const; // prettier-ignore
export type Segment = (typeof segments)[number];

/** Both ends belong to it; `from` is never below `to`. */
export interface LevelRange {
  readonly from: Segment;
  readonly to: Segment;
}

export const wholeSpine: LevelRange = { from: 'C1', to: 'S4-5' };

const one = 'S4[-_]?5|[CTLS]\\d{1,2}';
const written = new RegExp(`^(${one})(?:\\s*(?:-|\u2013|to)\\s*(${one}))?$`, 'i');

/** Reads `C5-T6`, `c5 to t6`, `T4` or `S4-5`, whichever end comes first; `null` when it is none of these. */
export function parseLevelRange(text: string): LevelRange | null {
  const match = written.exec(text.trim());
  const first = segmentNamed(match?.[1]);
  const second = match?.[2] === undefined ? first : segmentNamed(match[2]);
  return first === null || second === null ? null : rangeBetween(first, second);
}

export function formatLevelRange({ from, to }: LevelRange): string {
  if (from === to) return from;
  return from === 'S4-5' || to === 'S4-5' ? `${from} to ${to}` : `${from}-${to}`;
}

export function rangeBetween(a: Segment, b: Segment): LevelRange {
  return segments.indexOf(a) <= segments.indexOf(b) ? { from: a, to: b } : { from: b, to: a };
}

export function isWithin(segment: Segment, range: LevelRange): boolean {
  const at = segments.indexOf(segment);
  return segments.indexOf(range.from) <= at && at <= segments.indexOf(range.to);
}

/** The segment a written level means; `null` for `INT` and anything else outside the column. */
export function segmentNamed(text: string | undefined): Segment | null {
  const name = text?.toUpperCase().replace(/^S4[-_]?5?$/, 'S4-5');
  return segments.find((segment) => segment === name) ?? null;
}
