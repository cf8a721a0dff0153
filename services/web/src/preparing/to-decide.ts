/** What waits for a decision about the columns of the clinic's files. */
import type { PreparedPicture, ProblemPicture, TableColumns } from './worker/protocol.ts';

const isOfColumns = ({ kind, columnNumber }: ProblemPicture): boolean => columnNumber !== null || kind === 'no-participant-column';

/** Whether somebody has to look at the columns of a table: a question is open, or some are not as the key file remembers them. */
export function hasToDecide({ table, columns }: TableColumns, problems: readonly ProblemPicture[]): boolean {
  if (columns.some(({ unknownWords }) => unknownWords.length > 0)) return true;
  if (problems.some((problem) => problem.table === table && isOfColumns(problem))) return true;
  const matchable = columns.filter(({ isMatchable }) => isMatchable);
  // Where all are new, nothing is remembered of the table: matched without a question, they are what their names say.
  return matchable.some(({ isNew }) => isNew) && matchable.some(({ isNew }) => !isNew);
}

/** How many things there are to mend or to explain; unknown words and the cells that hold them count once. */
export function countToDecide({ columns, problems }: Pick<PreparedPicture, 'columns' | 'problems'>): number {
  const explained = columns.flatMap(({ table, columns: all }) =>
    all.filter(
      ({ number, unknownWords }) =>
        unknownWords.length > 0 && !problems.some((problem) => problem.table === table && problem.columnNumber === number),
    ),
  );
  return problems.length + explained.length;
}
