/** A file chosen in this browser that the registry does not have yet, and what may happen to it. */
import type { Looked } from './look-through.ts';
import type { FileKey, SentFile } from './submissions.queries.ts';

export interface OutgoingFile {
  readonly id: number;
  readonly file: File;
  /** `null`: its name does not tell; the reader has to. */
  readonly table: FileKey | null;
  /** What was found in it as a file of this table; `null` until it has been looked through. */
  readonly looked: Looked | null;
  /** How much has left, from 0 to 1; `null` while it waits. */
  readonly sent: number | null;
  /** Why it was not looked through, or did not arrive. */
  readonly error: unknown;
}

export const isLookedAt = ({ table, looked, error }: OutgoingFile): boolean => table !== null && looked === null && error === null;

/** It identifies somebody, or nobody knows whether it does: it does not leave this browser. */
export const isStopped = ({ looked }: OutgoingFile): boolean => looked !== null && (looked.identifies || looked.isUnread);

export const mayBeSent = (file: OutgoingFile): boolean => file.table !== null && file.looked !== null && !isStopped(file);

/** The file of the registry in whose place one would come. */
export const heldAs = (key: FileKey | null, held: readonly SentFile[]): SentFile | undefined =>
  held.find(({ table }) => (table ?? 'workbook') === key);

/** What keeps these files from being sent, in words; `null` when nothing does. */
export function obstacleOf(files: readonly OutgoingFile[]): string | null {
  const without = files.find(({ table }) => table === null);
  if (without !== undefined) return `Choose the table of ${without.file.name}.`;
  const twice = files.find(({ id, table }) => files.some((other) => other.id !== id && other.table === table));
  if (twice === undefined) return null;
  return twice.table === 'workbook'
    ? 'A month has one workbook. Leave out one of the two.'
    : 'Two files are for the same table. Move one of them, or leave it out.';
}
