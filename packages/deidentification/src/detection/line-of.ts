import type { TextTable } from './text-table.ts';

/** The line of a row in its file: the header stands on line 1 unless the file says otherwise. */
export const lineOf = ({ lines }: Pick<TextTable, 'lines'>, row: number): number => lines?.[row] ?? row + 2;
