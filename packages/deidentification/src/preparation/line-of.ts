import type { RawTable } from './month.ts';

/** The line of a row in its file: the header stands on line 1 unless the file says otherwise. */
export const lineOf = ({ lines }: RawTable, row: number): number => lines?.[row] ?? row + 2;
