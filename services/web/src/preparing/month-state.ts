/** What the page knows of the month, and how it changes. */
import { tableName } from '../features/submissions/table-names.ts';
import { formatCount, formatNumber, formatShare } from '../lib/format.ts';
import type { Sending } from './messages.ts';
import type { KeyPicture, Picture, PreparedPicture, Progress, SourcePicture } from './worker/protocol.ts';

export interface MonthState {
  readonly picture: Picture | null;
  readonly prepared: PreparedPicture | null;
  /** What was worked out does not follow from the files and choices any more. */
  readonly isStale: boolean;
  readonly progress: Progress | null;
  /** Why the last thing was not done. */
  readonly refusal: string | null;
  /** Name of the key file saved last in this visit. */
  readonly savedAs: string | null;
  readonly sending: Sending | null;
}

export const startState: MonthState = {
  picture: null,
  prepared: null,
  isStale: false,
  progress: null,
  refusal: null,
  savedAs: null,
  sending: null,
};

export type MonthEvent =
  | { readonly kind: 'picture'; readonly picture: Picture }
  | { readonly kind: 'changed' }
  | { readonly kind: 'progress'; readonly progress: Progress | null }
  | { readonly kind: 'prepared'; readonly picture: Picture; readonly prepared: PreparedPicture }
  | { readonly kind: 'nothing-to-prepare' }
  | { readonly kind: 'refused'; readonly message: string }
  | { readonly kind: 'key-saved'; readonly picture: Picture; readonly fileName: string }
  | { readonly kind: 'sending'; readonly sending: Sending };

export function reduceMonth(state: MonthState, event: MonthEvent): MonthState {
  switch (event.kind) {
    case 'picture':
      return { ...state, picture: event.picture };
    case 'changed':
      return { ...state, isStale: true, refusal: null, sending: null };
    case 'progress':
      return { ...state, progress: event.progress };
    case 'prepared':
      return { ...state, picture: event.picture, prepared: event.prepared, isStale: false, progress: null, refusal: null };
    case 'nothing-to-prepare':
      return { ...state, prepared: null, isStale: false, progress: null };
    case 'refused':
      return { ...state, progress: null, refusal: event.message };
    case 'key-saved':
      return { ...state, picture: event.picture, savedAs: event.fileName };
    case 'sending':
      return { ...state, sending: event.sending };
  }
}

/** Why the files cannot be prepared as they stand; null when they can. */
export function obstacleOf(sources: readonly SourcePicture[]): string | null {
  // A workbook may hold sheets that are none of the registry's; a file was chosen to be used.
  const without = sources.find(({ table, sheet }) => table === null && sheet === null);
  if (without !== undefined) return `Say which table ${nameOf(without)} is, or leave it out.`;
  const twice = sources.find(({ id, table }) => table !== null && sources.some((other) => other.id > id && other.table === table));
  return twice === undefined ? null : 'Two files are for the same table. Give one of them another table, or leave it out.';
}

export const nameOf = ({ fileName, sheet }: Pick<SourcePicture, 'fileName' | 'sheet'>): string =>
  sheet === null ? fileName : `sheet ${sheet} of ${fileName}`;

/** Problems that keep a whole table from being prepared. */
const stopping: ReadonlySet<string> = new Set(['no-participant-column', 'ambiguous-date-format']);

/** A correction may bring rows of months before; where they are the most, the wrong file has probably been dropped. */
export const isOfAnotherMonth = ({ inside, dated }: NonNullable<PreparedPicture['rowsInMonth']>): boolean => inside * 2 < dated;

/** What somebody should have looked at before anything is sent, in a few words each. */
export function worthALook({ problems, lengthChange, rowsInMonth, people, newToKey }: PreparedPicture, key: KeyPicture | null): string[] {
  const things: string[] = [];
  if (rowsInMonth !== null && isOfAnotherMonth(rowsInMonth))
    things.push(
      `files that look like those of another month: ${formatShare(rowsInMonth.inside, rowsInMonth.dated)} rows of ${tableName(rowsInMonth.table)} are of the month prepared`,
    );
  if (key?.lacking != null) things.push('a key that lacks participants of the registry, who would get a second code');
  if (newToKey !== null && newToKey * 2 > people)
    things.push(
      `a key that knows ${formatNumber(people - newToKey)} of the ${formatCount(people, 'person', 'people')} in the files, as in a first month: with an older key file the others get a second code`,
    );
  if (lengthChange !== null && lengthChange.newLengths > 0) things.push('record numbers of a length that nobody had last month');
  if (problems.length > 0)
    things.push(`${formatCount(problems.length, 'thing')} to mend or to know; what cannot be read stays at the clinic`);
  return things;
}

/** What has to be done before anything can be sent, the first thing first; null when all is done. */
export function obstacleToSending({ picture, prepared, isStale }: MonthState, isLookedAt: boolean): string | null {
  const sources = picture?.sources ?? [];
  const obstacle = obstacleOf(sources);
  if (obstacle !== null) return obstacle;
  if (prepared === null || isStale) return 'Wait until the preview has been worked out.';
  if (prepared.tables.length === 0) return 'No row can be sent. Mend what stands above, under Columns.';
  if (prepared.problems.some(({ kind }) => stopping.has(kind)) || prepared.emptyTables.length > 0)
    return 'One of the files cannot be prepared yet. Mend what stands above, under Columns, or leave the file out.';
  if (worthALook(prepared, picture?.key ?? null).length > 0 && !isLookedAt) return 'Say that you have looked at what stands above.';
  return picture?.key?.isUnsaved === true ? 'Save the key file first.' : null;
}

/** Whether something would be lost if the page were closed now. */
export function isUnsaved({ picture, sending }: MonthState): boolean {
  const key: KeyPicture | null = picture?.key ?? null;
  if (key?.isUnsaved === true || (key?.codesToReplace ?? 0) > 0) return true;
  return (picture?.sources.length ?? 0) > 0 && sending?.state !== 'done';
}
