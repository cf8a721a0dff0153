/** Values typed in place of cells, kept in this page until they are sent all together. */
import type { CallOf, mendCells, Submission } from '@cairnstep/contract';
import { useState } from 'react';
import { cellProblem } from './expected-cell.ts';

export type Mend = CallOf<typeof mendCells>['mends'][number];
export type CellPlace = Omit<Mend, 'value'>;

export interface MendDrafts {
  readonly all: readonly Mend[];
  /** How many of them nobody could read as a value of their column. */
  readonly unreadable: number;
  readonly valueAt: (place: CellPlace) => string | undefined;
  readonly write: (place: CellPlace, value: string) => void;
  readonly drop: (place: CellPlace) => void;
  readonly clear: () => void;
}

const nothing: readonly Mend[] = [];
const isAt = (place: CellPlace) => (mend: Mend) => mend.table === place.table && mend.line === place.line && mend.column === place.column;

/** Drafts belong to the files they were typed for: when one is replaced, its lines may be others. */
export function useMendDrafts(submission: Submission): MendDrafts {
  const files = submission.files.map(({ sha256 }) => sha256).join();
  const [state, setState] = useState<{ readonly files: string; readonly drafts: readonly Mend[] }>({ files, drafts: nothing });
  const all = state.files === files ? state.drafts : nothing;
  const keep = (drafts: readonly Mend[]) => setState({ files, drafts });
  return {
    all,
    unreadable: all.filter(({ table, column, value }) => cellProblem(table, column, value) !== null).length,
    valueAt: (place) => all.find(isAt(place))?.value,
    write: (place, value) => {
      const draft = { ...place, value };
      keep(all.some(isAt(place)) ? all.map((mend) => (isAt(place)(mend) ? draft : mend)) : [...all, draft]);
    },
    drop: (place) => keep(all.filter((mend) => !isAt(place)(mend))),
    clear: () => keep(nothing),
  };
}
