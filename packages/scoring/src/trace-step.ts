import type { CellKey } from './exam.ts';
import type { Side } from './segments.ts';

/** One step of the reasoning behind a classification, in plain words. */
export interface TraceStep {
  readonly result: 'sensoryLevel' | 'motorLevel' | 'nli' | 'completeness' | 'ais' | 'zppSensory' | 'zppMotor';
  readonly side?: Side;
  /** The value, or every possible value separated by commas. */
  readonly value: string;
  /** Why, as one or more sentences. */
  readonly because: string;
  /** The cells that decided. */
  readonly cells: readonly CellKey[];
}
