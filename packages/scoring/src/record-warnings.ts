/** What a record of an exam lacks, or what makes the exam less reliable, whatever its scores. */
import { cellPlaces, writtenIn } from './cell-key.ts';
import { cellName } from './cell-name.ts';
import type { ExamIssue, ExamWarningCode } from './exam-issue.ts';
import type { Exam } from './exam.ts';
import { hasRemark } from './remark.ts';

const youngestUsableAge = 6;
type Where = Pick<ExamIssue, 'side' | 'modality' | 'segment' | 'field'>;

function warning(code: ExamWarningCode, message: string, where: Where): ExamIssue {
  return { severity: 'warning', code, message, ...where };
}

function missingReasons(exam: Exam): ExamIssue[] {
  const untested = cellPlaces.filter((place) => writtenIn(exam, place) === 'NT' && !hasRemark(exam.ntReason, place.key));
  const cells = untested.map(({ side, modality, segment }) =>
    warning('nt-without-reason', `The ${cellName(side, modality, segment)} is not tested, without a reason.`, {
      side,
      modality,
      segment,
    }),
  );
  const observed = (['vac', 'dap'] as const)
    .filter((field) => exam[field] === 'NT' && !hasRemark(exam.ntReason, field))
    .map((field) => warning('nt-without-reason', `${field.toUpperCase()} is not tested, without a reason.`, { field }));
  return [...cells, ...observed];
}

function circumstances(exam: Exam): ExamIssue[] {
  const { ageYears, hoursSinceInjury } = exam;
  const found: ExamIssue[] = [];
  if (ageYears !== undefined && ageYears < youngestUsableAge) {
    found.push(warning('under-six', 'The exam is not usable under six years of age.', { field: 'ageYears' }));
  }
  if (hoursSinceInjury === undefined) return found;
  if (hoursSinceInjury < 0) {
    found.push(warning('exam-before-injury', 'The exam is dated before the injury.', { field: 'hoursSinceInjury' }));
  } else if (hoursSinceInjury < 24) {
    found.push(
      warning('exam-within-a-day', 'Within a day of injury an exam is less reliable, mainly in the first four hours.', {
        field: 'hoursSinceInjury',
      }),
    );
  }
  return found;
}

export function recordWarnings(exam: Exam): ExamIssue[] {
  return [...missingReasons(exam), ...circumstances(exam)];
}
