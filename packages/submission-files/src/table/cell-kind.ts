/**
 * What a workbook says of a cell besides its text: `number` has a decimal point whatever the screen shows; `date` is a
 * calendar date or a time; `error` is a calculation that failed; `uncalculated` is a formula that was never worked out.
 */
export type CellKind = 'text' | 'number' | 'date' | 'error' | 'uncalculated';

interface CellFault {
  readonly rule: 'F46' | 'F47';
  readonly found: string;
}

const faults: Readonly<Partial<Record<CellKind, CellFault>>> = {
  date: { rule: 'F47', found: 'A calendar date or a time of day.' },
  error: { rule: 'F46', found: 'An error of calculation in place of a value.' },
  uncalculated: { rule: 'F46', found: 'A formula whose result the file does not hold.' },
};

/** Why cells of this kind hold no value that a table can take; undefined when they may. */
export function faultOfKind(kind: CellKind): CellFault | undefined {
  return faults[kind];
}
