export { keyMuscles, levels, modalities, sensorySegments, sides } from './segments.ts';
export type { KeyMuscle, Level, Modality, SegmentLevel, SensorySegment, Side } from './segments.ts';
export { observations } from './exam.ts';
export type { CellKey, Exam, Observation, SideExam } from './exam.ts';
export { examErrorCodes, examWarningCodes } from './exam-issue.ts';
export type { ExamErrorCode, ExamIssue, ExamWarningCode } from './exam-issue.ts';
export { aisGrades, completenessValues } from './classification.ts';
export type { AisGrade, Classification, Completeness, Determined, Total, Totals, Zone } from './classification.ts';
export type { TraceStep } from './trace-step.ts';
