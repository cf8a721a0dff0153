/**
 * Walking speed in m/s from a timed distance.
 * @param distance metres, 0 or more
 * @param time seconds, more than 0
 * @throws RangeError when either is not such a number.
 */
export function walkingSpeed(distance: number, time: number): number {
  if (!Number.isFinite(distance) || distance < 0) throw new RangeError('The distance must be a number of metres, 0 or more.');
  if (!Number.isFinite(time) || time <= 0) throw new RangeError('The time must be a number of seconds above 0.');
  return distance / time;
}

/** Tolerance for speeds a clinic measured itself; published tables carry errors of 0.01 m/s. */
export const speedTolerance = 0.005;

// A difference of exactly the tolerance must pass although binary fractions cannot hold it.
const rounding = 1e-9;

/**
 * Whether a recorded speed (m/s) is the distance (m) over the time (s), within a tolerance (m/s).
 * @throws RangeError when distance or time is out of range.
 */
export function speedAgrees(recorded: number, distance: number, time: number, tolerance = speedTolerance): boolean {
  return Math.abs(recorded - walkingSpeed(distance, time)) <= tolerance + rounding;
}
