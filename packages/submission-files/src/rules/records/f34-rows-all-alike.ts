import type { CheckedTable } from '../../checking/checked-table.ts';
import { partition } from '../../checking/partition.ts';
import { repeatedNumbers } from '../../checking/repeated-numbers.ts';
import { RowGroups } from '../../checking/row-groups.ts';
import type { Rule, RuleReport } from '../../checking/rule.ts';
import type { TypedColumn } from '../../table/typed-table.ts';

/** Values that never repeat together by chance. */
const measured = {
  sessions: ['upright_min', 'steps_total', 'distance_total_m', 'hr_rest', 'hr_peak', 'sbp_pre', 'sbp_post'],
  bouts: ['duration_s', 'distance_m', 'steps', 'hr_end'],
} as const;

/** Fewer values than this may agree by chance. */
const fewestValues = 3;
/** So many rows of one participant may not be alike. */
const rowsOfOnePerson = 5;
/** Nor may so many rows of a file, when they are more than this share of it. */
const rowsOfAFile = 20;
const shareOfAFile = 0.5;

/** Per row a number that is equal for rows with equal values; rarely equal for others too. -1 for rows with too few values. */
function fingerprints(table: CheckedTable, columns: readonly TypedColumn[]): Float64Array {
  const prints = new Float64Array(table.fileRows);
  for (let row = 0; row < table.fileRows; row += 1) {
    let hash = 0;
    let values = 0;
    for (const column of columns) {
      const value = column.number(row);
      // Thousandths make a whole number of every value; an empty cell has a number of its own. The multiplier is that of FNV-1a.
      hash = Math.imul(hash ^ (value === null ? 0x5bd1e995 : Math.round(value * 1000)), 0x01000193) ^ (hash >>> 15);
      if (value !== null) values += 1;
    }
    prints[row] = values < fewestValues ? -1 : hash >>> 0;
  }
  return prints;
}

/** Groups of rows that agree in all their values, told apart where only the fingerprint agrees. */
function alikeRows(table: CheckedTable, columns: readonly TypedColumn[]): number[][] {
  const prints = fingerprints(table, columns);
  const repeated = repeatedNumbers(prints, rowsOfOnePerson);
  if (repeated.size === 0) return [];
  const groups = new RowGroups(prints.map((print) => (repeated.has(print) ? print : -1)));
  return [...groups].flatMap((rows) => [...partition(rows, (row) => columns.map((column) => column.number(row)).join(' ')).values()]);
}

function reportAlike(table: CheckedTable, rows: readonly number[], report: RuleReport): void {
  for (const own of partition(rows, (row) => table.personOf(row)).values()) {
    const [first] = own;
    if (first !== undefined && own.length >= rowsOfOnePerson)
      report.add(table, first, null, `${own.length} rows of one participant that agree in every measured value.`);
  }
  const [first] = rows;
  if (first !== undefined && rows.length >= rowsOfAFile && rows.length > table.fileRows * shareOfAFile) {
    report.add(table, first, null, `${rows.length} of ${table.fileRows} rows that agree in every measured value.`);
  }
}

export const rowsAllAlike: Rule = {
  id: 'F34',
  evaluate: (submission, report) => {
    for (const key of ['sessions', 'bouts'] as const) {
      const table = submission.table(key);
      const columns = measured[key].map((name) => table.column(name));
      for (const rows of alikeRows(table, columns)) reportAlike(table, rows, report);
    }
  },
};
