import { codebookRows, dictionary, measureRows } from '@cairnstep/dictionary';
import { otherSheets } from '../../reading/workbook/sheet-names.ts';
import type { ListColumns } from './list-columns.ts';
import type { PlannedColumn, PlannedRow, PlannedSheet } from './sheet-plan.ts';
import { templateHeader } from './template-header.ts';

const wrapped = (width: number): PlannedColumn => ({ width, style: 'wrapped' });

function listSheet(
  name: string,
  columns: readonly (readonly [header: string, width: number])[],
  rows: readonly (readonly string[])[],
): PlannedSheet {
  const header: PlannedRow = { line: 1, cells: columns.map(([text]) => text), style: 'header' };
  return {
    name,
    columns: columns.map(([, width]) => wrapped(width)),
    rows: [header, ...rows.map((cells, index) => ({ line: index + 2, cells }))],
    frozen: { rows: 1, columns: 0 },
    hasFilter: true,
  };
}

/** Every column of every table: what it means and what may stand in it. */
export function planDefinitions(): PlannedSheet {
  const columns = [
    ['Sheet', 20],
    ['Header', 34],
    ['Column', 26],
    ['Definition', 60],
    ['Unit', 14],
    ['Allowed', 18],
    ['Codes', 60],
    ['Codes for a missing value', 30],
    ['To be filled', 34],
  ] as const;
  const described = new Map(codebookRows().map((row) => [`${row.table}.${row.column}`, row]));
  const rows = dictionary.tables.flatMap(({ name, variables }) =>
    variables.map((variable) => {
      const row = described.get(`${variable.table}.${variable.key}`);
      if (!row) throw new Error(`The codebook has no row for ${variable.table}.${variable.key}.`);
      return [name, templateHeader(variable), row.column, row.definition, row.unit, row.range, row.codes, row.missing, row.required];
    }),
  );
  return listSheet(otherSheets.definitions, columns, rows);
}

/** The outcome measures that a row of the assessments can be about, with the unit and the limits of their results. */
export function planMeasures(): PlannedSheet {
  const columns = [
    ['Code', 22],
    ['Outcome measure', 40],
    ['Unit', 14],
    ['Allowed', 22],
    ['Definition', 80],
  ] as const;
  return listSheet(
    otherSheets.measures,
    columns,
    measureRows().map(({ measure, name, unit, range, definition }) => [measure, name, unit, range, definition]),
  );
}

/** The lists that cells of the tables are chosen from. */
export function planLists({ columns }: ListColumns): PlannedSheet {
  const longest = Math.max(...columns.map(({ values }) => values.length));
  const rows = Array.from({ length: longest }, (_, index) => ({
    line: index + 2,
    cells: columns.map(({ values }) => values[index] ?? null),
  }));
  return {
    name: otherSheets.lists,
    columns: columns.map(() => ({ width: 26, style: 'text' })),
    rows: [{ line: 1, cells: columns.map(({ header }) => header), style: 'header', height: 45 }, ...rows],
    frozen: { rows: 1, columns: 0 },
  };
}
