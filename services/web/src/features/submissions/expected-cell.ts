/** What belongs in a cell, by the dictionary, for somebody who is about to type it. */
import { cellParser, describeRange, tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import type { SelectOption } from '../../ui/select.tsx';

export const variableAt = (table: TableKey, column: string): Variable | undefined =>
  tableOf(table).variables.find(({ key }) => key === column);

/**
 * "Heart rate at the end: a whole number, 30 to 250 beats/min."
 *
 * `mustBeFilled`: the rest of the row says that the cell may not stay empty, though in other rows it may.
 */
export function expectedWords(variable: Variable, mustBeFilled: boolean): string {
  const { type, name, unit, hard, measuredBy, missingCodes = [], required } = variable;
  const absence = missingCodes.length === 0 ? '' : `, or ${missingCodes.map(({ code, label }) => `${code} (${label})`).join(', ')}`;
  const may = required.when === 'always' || mustBeFilled ? '' : ' May be empty.';
  if (measuredBy !== undefined) return `${name}: a number or a grade, as the measure of the row has it${absence}.${may}`;
  switch (type) {
    case 'integer':
    case 'decimal': {
      const limits = hard === undefined ? (unit === undefined ? '' : `, in ${unit}`) : `, ${describeRange(hard, unit)}`;
      return `${name}: a ${type === 'integer' ? 'whole ' : ''}number${limits}${absence}.${may}`;
    }
    case 'pseudonym':
      return `${name}: the code made at your site, never a name or a number of the clinic.`;
    case 'code':
    case 'flag':
      return `${name}: one of its codes.${may}`;
  }
}

/** In the list of codes: leaves the cell empty. A code is never empty, so that it cannot be mistaken for one. */
export const emptyCell = '';

/** The codes to choose from; null where something is typed. */
export function codesOf(
  { type, codes = [], missingCodes = [], required }: Variable,
  mustBeFilled: boolean,
): readonly SelectOption[] | null {
  if (type !== 'code' && type !== 'flag') return null;
  const all = [...codes, ...missingCodes].map(({ code, label }) => ({
    value: code,
    label: label.toLowerCase() === code.toLowerCase() ? code : `${code}: ${label}`,
  }));
  return required.when === 'always' || mustBeFilled ? all : [...all, { value: emptyCell, label: 'Leave the cell empty' }];
}

/** Why what was typed could not be read as a value of the column; null when it can, or when only its row could tell. */
export function cellProblem(table: TableKey, column: string, value: string): string | null {
  const variable = variableAt(table, column);
  if (variable === undefined || variable.measuredBy !== undefined) return null;
  const parsed = cellParser(variable)(value.trim());
  return parsed.ok ? null : parsed.problem.message;
}
