import type { Submission } from './submission.ts';

/** What the bouts of one session add up to. */
export interface BoutSums {
  readonly bouts: number;
  /** Minutes walked: bouts of walking only. */
  readonly walkingMin: number;
  /** Minutes of rest between the bouts; the rest behind the last one is not counted. */
  readonly restsBetweenMin: number;
  /** Steps and metres of the walking bouts; null when there is no such bout or one lacks the number. */
  readonly steps: number | null;
  readonly distanceM: number | null;
}

/** The sums of a session by its row, null when none of its bouts is known. Made in one pass over the bouts. */
export function boutSums(submission: Submission): (session: number) => BoutSums | null {
  const bouts = submission.table('bouts');
  const sessions = submission.table('sessions').length;
  const duration = bouts.column('duration_s');
  const rest = bouts.column('rest_after_s');
  const activity = bouts.column('activity');
  const number = bouts.column('bout_no');
  const steps = bouts.column('steps');
  const distance = bouts.column('distance_m');
  const { sessionOfBout } = submission;

  const counts = new Uint32Array(sessions);
  const walks = new Uint32Array(sessions);
  const walkedS = new Float64Array(sessions);
  const restedS = new Float64Array(sessions);
  const lastNumber = new Float64Array(sessions).fill(-Infinity);
  const lastRestS = new Float64Array(sessions);
  // NaN once a walking bout lacks the number: adding to it leaves it so.
  const stepSums = new Float64Array(sessions);
  const distanceSums = new Float64Array(sessions);

  for (let row = 0; row < bouts.length; row += 1) {
    const session = sessionOfBout[row] ?? -1;
    if (session < 0) continue;
    counts[session]! += 1;
    const restS = rest.number(row) ?? 0;
    restedS[session]! += restS;
    const order = number.number(row) ?? 0;
    if (order >= lastNumber[session]!) {
      lastNumber[session] = order;
      lastRestS[session] = restS;
    }
    if (activity.word(row) !== 'walking') continue;
    walks[session]! += 1;
    walkedS[session]! += duration.number(row) ?? 0;
    stepSums[session]! += steps.number(row) ?? Number.NaN;
    distanceSums[session]! += distance.number(row) ?? Number.NaN;
  }

  const sumOf = (sums: Float64Array, session: number): number | null => {
    const sum = sums[session] ?? Number.NaN;
    return walks[session] && !Number.isNaN(sum) ? sum : null;
  };
  return (session) =>
    counts[session]
      ? {
          bouts: counts[session],
          walkingMin: walkedS[session]! / 60,
          restsBetweenMin: (restedS[session]! - lastRestS[session]!) / 60,
          steps: sumOf(stepSums, session),
          distanceM: sumOf(distanceSums, session),
        }
      : null;
}
