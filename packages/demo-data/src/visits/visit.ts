/** One assessment visit of a participant. */
import type { Speed } from '../people/walking.ts';

export type Timepoint = 'baseline' | 'interim' | 'end_of_course' | 'follow_up_3m' | 'follow_up_6m' | 'follow_up_12m';

export interface Visit {
  /** Calendar day. */
  readonly day: number;
  readonly timepoint: Timepoint;
  readonly course: number;
  /** Progress through the course: 0 at the baseline, 1 at its end and later. */
  readonly progress: number;
  readonly speed: Speed;
  /** Motor scores of the exam that belongs to the visit; undefined without one, or when a muscle was not testable. */
  readonly uems: number | undefined;
  readonly lems: number | undefined;
  /** Whether the walking tests are done in a powered device as well. */
  readonly powered: boolean;
}
