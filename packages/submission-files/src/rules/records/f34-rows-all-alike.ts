import type { CheckedTable } from '../../checking/checked-table.ts';
import type { Rule } from '../../checking/rule.ts';

/** Values that never repeat together by chance. */
const measured = {
  sessions: ['upright_min', 'steps_total', 'distance_total_m', 'hr_rest', 'hr_peak', 'sbp_pre', 'sbp_post'],
  bouts: ['duration_s', 'distance_m', 'steps', 'hr_end'],
} as const;

/** Fewer values than this may agree by chance. */
const fewestValues = 3;
/** Rows of one participant that may be alike, and the share of a whole file that may be. */
const rowsOfOnePerson = 5;
const fewestOfAFile = 20;
const shareOfAFile = 0.5;

function likeness(table: CheckedTable, keys: readonly string[]): (row: number) => string | null {
  const columns = keys.map((key) => table.column(key));
  return (row) => {
    const values = columns.map((column) => column.number(row));
    return values.filter((value) => value !== null).length < fewestValues ? null : values.join(' ');
  };
}

interface Alike {
  readonly first: number;
  count: number;
}

export const rowsAllAlike: Rule = {
  id: 'F34',
  evaluate: (submission, report) => {
    for (const key of ['sessions', 'bouts'] as const) {
      const table = submission.table(key);
      const likenessOf = likeness(table, measured[key]);
      const ofPerson = new Map<string, Alike>();
      const ofFile = new Map<string, Alike>();
      const count = (groups: Map<string, Alike>, group: string, row: number): void => {
        const known = groups.get(group);
        if (known) known.count += 1;
        else groups.set(group, { first: row, count: 1 });
      };
      for (let row = 0; row < table.fileRows; row += 1) {
        const values = likenessOf(row);
        if (values === null) continue;
        count(ofPerson, `${table.personOf(row)} ${values}`, row);
        count(ofFile, values, row);
      }
      for (const { first, count: rows } of ofPerson.values()) {
        if (rows >= rowsOfOnePerson) report.add(table, first, null, `${rows} rows of one participant that agree in every measured value.`);
      }
      for (const { first, count: rows } of ofFile.values()) {
        if (rows >= fewestOfAFile && rows > table.fileRows * shareOfAFile)
          report.add(table, first, null, `${rows} of ${table.fileRows} rows that agree in every measured value.`);
      }
    }
  },
};
