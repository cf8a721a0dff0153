/** What the sheet gives: levels, grade, zones and totals so far, and what is wrong with it or improbable. */
import { classify, columnOfIssue, explainResult, resultOf, validateExam } from '@cairnstep/scoring';
import type { CellKey, Classification, Exam, ExamIssue, ResultName, TraceStep } from '@cairnstep/scoring';
import { blankCells, examInput } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';
import { allCells } from './places.ts';

export interface SheetIssue extends ExamIssue {
  /** The cell it is about, where it is about one. */
  readonly cell: CellKey | undefined;
}

export interface Reading {
  /** The sheet with blank cells read as NT: what is settled holds whatever they will be. */
  readonly exam: Exam;
  readonly classification: Classification;
  readonly blank: readonly CellKey[];
  /** Errors first. Blank cells are no issue of their own. */
  readonly issues: readonly SheetIssue[];
}

export function readSheet(sheet: ExamSheet): Reading {
  const blank = blankCells(sheet);
  // A tag that lacks its cause is reported, and counts as it is marked until then.
  const read = validateExam({ ...examInput(sheet, 'NT'), tagCause: 'other' });
  if (!('exam' in read)) throw new Error('The sheet holds a cell that no key can write.');
  const checked = validateExam(examInput(sheet));
  const errors = 'issues' in checked ? checked.issues.filter(({ code }) => code !== 'missing') : [];
  const issues = [...errors, ...read.warnings]
    .map((issue): SheetIssue => ({ ...issue, cell: cellOf(issue) }))
    .filter(({ cell }) => cell === undefined || !blank.includes(cell));
  return { exam: read.exam, classification: classify(read.exam), blank, issues };
}

function cellOf(issue: ExamIssue): CellKey | undefined {
  const column = columnOfIssue(issue);
  return allCells.find((key) => key === column);
}

/** Why a result came out; null while it is open and cells are blank. */
export function whyOf({ exam, classification, blank }: Reading, name: ResultName): TraceStep | null {
  if (blank.length > 0 && resultOf(classification, name).values.length > 1) return null;
  return explainResult(exam, name);
}
