import { classify } from './classify.ts';
import { ExamCheck } from './exam-check.ts';
import type { ExamIssue } from './exam-issue.ts';
import type { Exam } from './exam.ts';
import { recordWarnings } from './record-warnings.ts';

export interface ValidatedExam {
  readonly exam: Exam;
  /** Improbable findings and missing reasons. The exam can be classified all the same. */
  readonly warnings: readonly ExamIssue[];
}

/**
 * Checks anything that claims to be an exam. Every problem is located by side, modality and segment or by field, all of
 * them at once; bad input never yields an exam. With the exam come warnings, those of `classify` among them.
 */
export function validateExam(input: unknown): ValidatedExam | { readonly issues: readonly ExamIssue[] } {
  const check = new ExamCheck();
  const exam = check.exam(input);
  if (exam === undefined) return { issues: check.issues };
  return { exam, warnings: [...recordWarnings(exam), ...classify(exam).warnings] };
}
