import type { Modality, SensorySegment, Side } from './segments.ts';

// prettier-ignore
export const examErrorCodes = [
  'not-an-exam', 'missing', 'not-text', 'not-listed', 'tag-on-normal', 'tag-without-cause', 'unknown-segment', 'unknown-field', 'out-of-range',
] as const;
export type ExamErrorCode = (typeof examErrorCodes)[number];

// prettier-ignore
export const examWarningCodes = [
  'nt-without-reason', 'non-key-without-effect', 'normal-without-contraction', 'normal-without-pressure',
  'perianal-normal-s3-absent', 'exam-before-injury', 'exam-within-a-day', 'under-six',
] as const;
export type ExamWarningCode = (typeof examWarningCodes)[number];

/** Something wrong (`error`) or improbable (`warning`) in an exam, and where. Messages never repeat the value found. */
export interface ExamIssue {
  readonly severity: 'error' | 'warning';
  readonly code: ExamErrorCode | ExamWarningCode;
  readonly message: string;
  readonly side?: Side;
  readonly modality?: Modality;
  /** As written in the input when it is not a known segment. */
  readonly segment?: SensorySegment | (string & {});
  /** The field, where the issue is not about one cell: such as `vac`, `nonKey` or `earlierDeficit` */
  readonly field?: string;
}
