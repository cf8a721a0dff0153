import { KeyFileRefusal } from '@cairnstep/deidentification';
import type { RefusalCode } from './protocol.ts';

/** Why the worker does not do what it was asked. The message may be shown as it is; it never holds a cell. */
export class Refusal extends Error {
  constructor(
    readonly code: RefusalCode,
    message: string,
  ) {
    super(message);
    this.name = 'Refusal';
  }
}

/** An error as it may be told: the text of one that nobody foresaw could hold a cell, so it is not passed on. */
export function refusalOf(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof KeyFileRefusal) return new Refusal(error.code, error.message);
  return new Refusal('failed', 'Something went wrong inside this page. Nothing was sent. Load the page again and open the key file again.');
}
