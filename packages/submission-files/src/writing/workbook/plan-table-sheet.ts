import { describeRange, describeRequirement, tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import { exampleCells } from '../../table/example-cells.ts';
import { isTextColumn } from './is-text-column.ts';
import type { ListColumns } from './list-columns.ts';
import type { CellStyle } from './cell-styles.ts';
import type { PlannedRow, PlannedSheet, PlannedValidation } from './sheet-plan.ts';
import { templateHeader } from './template-header.ts';

/** So much of a prompt or refusal is shown (ECMA-376-1, 18.3.1.32). */
const longestPrompt = 255;

/** What fits of the sentences, the most important first. */
function prompt(sentences: readonly string[]): string {
  let text = '';
  for (const sentence of sentences) if (text.length + sentence.length + 1 <= longestPrompt) text += (text === '' ? '' : ' ') + sentence;
  return text;
}

function allowed(variable: Variable, lists: ListColumns): PlannedValidation['allows'] {
  const { type, hard, measuredBy } = variable;
  const list = lists.listOf(variable);
  if (list) return { kind: 'list', range: list.range, isOpen: type === 'pseudonym' };
  if (!hard || measuredBy || isTextColumn(variable)) return { kind: 'anything' };
  return { kind: type === 'integer' ? 'whole' : 'decimal', min: hard.min, max: hard.max };
}

function validation(variable: Variable, column: number, lists: ListColumns): PlannedValidation {
  const { key, definition, hard, unit, measuredBy } = variable;
  const allows = allowed(variable, lists);
  const range = hard && !measuredBy ? describeRange(hard, unit) : undefined;
  return {
    column,
    allows,
    title: key,
    prompt: prompt([definition, ...(range === undefined ? [] : [`Allowed: ${range}.`]), `To be filled: ${describeRequirement(variable)}.`]),
    refusal: allows.kind === 'list' ? 'Choose one of the codes of the list.' : `Allowed: ${range}.`,
  };
}

const asValue = (variable: Variable, text: string): string | number | null => {
  if (text === '') return null;
  return isTextColumn(variable) ? text : Number(text);
};

/** The sheet of one table in the template: the header, and the example row. */
export function planTableSheet(key: TableKey, lists: ListColumns): PlannedSheet {
  const { name, variables } = tableOf(key);
  const example = exampleCells(key);
  const styles = (look: (variable: Variable) => CellStyle) => new Map(variables.map((variable, position) => [position, look(variable)]));
  const rows: PlannedRow[] = [
    {
      line: 1,
      cells: variables.map(templateHeader),
      styles: styles(({ required }) => (required.when === 'always' ? 'requiredHeader' : 'header')),
      height: 60,
    },
    {
      line: 2,
      cells: variables.map((variable) => asValue(variable, example.get(variable.key) ?? '')),
      styles: styles((variable) => (isTextColumn(variable) ? 'exampleText' : 'example')),
    },
  ];
  return {
    name,
    columns: variables.map((variable) => ({
      width: variable.type === 'pseudonym' ? 26 : 16,
      ...(isTextColumn(variable) ? { style: 'text' as const } : {}),
    })),
    rows,
    frozen: { rows: 1, columns: 1 },
    validations: variables.map((variable, column) => validation(variable, column, lists)),
    codeColumns: variables.flatMap((variable, column) => (isTextColumn(variable) ? [column] : [])),
  };
}
