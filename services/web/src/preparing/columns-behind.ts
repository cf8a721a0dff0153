/** Which columns stay at the clinic, and how they are called. */
import type { TableKey } from '@cairnstep/dictionary';
import type { ColumnPicture, PreparedPicture } from './worker/protocol.ts';

/** The header; where there is none, the place. */
export const nameOfColumn = ({ header, number }: Pick<ColumnPicture, 'header' | 'number'>): string =>
  header.trim() === '' ? `column ${number}` : header;

/** Whether a column that was meant to be used stays behind, because its cells seem to identify people. */
export const isWithheld = (problems: PreparedPicture['problems'], table: TableKey, header: string): boolean =>
  problems.some((problem) => problem.kind === 'identifiers-in-column' && problem.table === table && problem.header === header);

/** Whether nothing of a column is sent, for whatever reason. */
export const staysBehind = ({ header, match }: ColumnPicture, table: TableKey, problems: PreparedPicture['problems']): boolean =>
  match.as === 'left-out' || isWithheld(problems, table, header);
