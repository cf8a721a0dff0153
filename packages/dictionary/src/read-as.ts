import { history } from './history.ts';
import type { Revision, RowChange } from './history.ts';
import type { Row, TableKey } from './types.ts';

function applyChange(row: Row, change: RowChange): Row {
  if (change.kind === 'recoded') {
    const value = row[change.column];
    const code = typeof value === 'string' && Object.hasOwn(change.codes, value) ? change.codes[value] : undefined;
    return code === undefined ? row : { ...row, [change.column]: code };
  }
  if (!(change.from in row)) return row;
  if (change.to in row) throw new RangeError(`the row has both ${change.from} and its newer name ${change.to}`);
  const { [change.from]: value, ...rest } = row;
  return { ...rest, [change.to]: value };
}

/**
 * A row that was written under an older version, as a row of the newest. A row of the newest version comes back as it is.
 *
 * @param version the version the row was written under
 * @param revisions the versions known, oldest first
 * @throws RangeError when the version is not known, or the row holds a column under its old and its new name
 */
export function readAs(version: string, table: TableKey, row: Row, revisions: readonly Revision[] = history): Row {
  const known = revisions.findIndex((revision) => revision.version === version);
  if (known === -1) throw new RangeError(`the dictionary has no version ${version}`);
  const changes = revisions.slice(known + 1).flatMap((revision) => revision.changes);
  return changes.filter((change) => change.table === table).reduce(applyChange, row);
}
