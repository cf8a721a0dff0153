/** Counts as anyone may see them: 1 to 10 hidden (null), the others to the nearest 5. */
import { nearestFive, SMALLEST_SHOWN } from '@cairnstep/disclosure';

export const publicCount = (count: number): number | null => (count > 0 && count < SMALLEST_SHOWN ? null : nearestFive(count));
