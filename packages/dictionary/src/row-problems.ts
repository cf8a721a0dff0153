import { describeRange } from './describe.ts';
import { fitsRange } from './fits-range.ts';
import { isRequired, mustBeEmpty } from './is-required.ts';
import { findMeasure } from './measures.ts';
import type { Measure, Row, Table, Variable } from './types.ts';

export type RowProblemKind = 'missing' | 'must-be-empty' | 'outside-limits' | 'never-entered' | 'stopped-early';

/** A contradiction between cells of one row. The message never holds a value. */
export interface RowProblem {
  readonly column: string;
  readonly kind: RowProblemKind;
  readonly message: string;
}

/** The measure that decides unit and limits of this cell, once the row names one. */
export function measureInRow(variable: Variable, row: Row): Measure | undefined {
  if (!variable.measuredBy) return undefined;
  const code = row[variable.measuredBy.column];
  return code === undefined ? undefined : findMeasure(`${variable.measuredBy.prefix}${code}`);
}

function valueProblem(variable: Variable, measure: Measure, row: Row): Omit<RowProblem, 'column'> | undefined {
  const value = row[variable.key];
  if (typeof value !== 'number') return undefined;
  if (!measure.entered) return { kind: 'never-entered', message: 'The registry computes this result. Leave the row out.' };
  // Of the attempt's own result; effort felt at its end is recorded all the more when it ended early.
  if (variable.measuredBy?.prefix === '' && row['attempt_status'] === 'stopped_early' && !measure.scoredWhenStoppedEarly) {
    return { kind: 'stopped-early', message: 'This measure has no result when it was stopped early. Leave the cell empty.' };
  }
  const { grades } = measure;
  if (grades ? grades.some((grade) => grade.stored === value) : fitsRange(value, measure.hard)) return undefined;
  const allowed = grades ? grades.map((grade) => grade.written).join(', ') : describeRange(measure.hard, measure.unit);
  return { kind: 'outside-limits', message: `Allowed for this measure is ${allowed}.` };
}

/**
 * What contradicts itself in one typed row: cells that must be filled or empty because of others, and results outside the limits of
 * their measure. Limits and codes of single cells are the business of the cell parser and the row schema.
 */
export function rowProblems(table: Table, row: Row): RowProblem[] {
  const problems: RowProblem[] = [];
  for (const variable of table.variables) {
    const filled = row[variable.key] !== undefined;
    if (!filled && isRequired(variable, row)) {
      problems.push({ column: variable.key, kind: 'missing', message: 'Fill in this cell.' });
    }
    if (filled && mustBeEmpty(variable, row)) {
      problems.push({ column: variable.key, kind: 'must-be-empty', message: 'Leave this cell empty, or correct the cell it depends on.' });
    }
    const measure = measureInRow(variable, row);
    const problem = measure && valueProblem(variable, measure, row);
    if (problem) problems.push({ column: variable.key, ...problem });
  }
  return problems;
}
