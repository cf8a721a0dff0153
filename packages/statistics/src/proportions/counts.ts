/** Counts as input: a count that is not a whole number, or an event more than there are people, is a mistake of the caller. */

export interface EventCount {
  readonly events: number;
  readonly total: number;
}

export function requireEventCount({ events, total }: EventCount): void {
  if (!(Number.isSafeInteger(events) && Number.isSafeInteger(total) && events >= 0 && events <= total)) {
    throw new RangeError('A proportion needs whole numbers: events from 0 up to the total.');
  }
}
