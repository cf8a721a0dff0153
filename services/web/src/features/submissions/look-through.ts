/** Looks through a file before it is sent, with the reading and the screen of the server: what would not be kept there does not leave here. */
import { countUnscreened, FindingLog, readTable, readWorkbook, TableScreen } from '@cairnstep/submission-files';
import type { TableKey } from '@cairnstep/dictionary';
import { bytesOfFile } from '../../lib/bytes-of-file.ts';
import type { FileKey } from './submissions.queries.ts';

export interface LookQuestion {
  readonly file: File;
  readonly table: FileKey;
  /** Headers that a steward has marked as safe for the site. */
  readonly safeHeaders: readonly string[];
}

/** A place and the kind of thing that was found there; never the thing itself. */
export interface LookPlace {
  readonly rule: string;
  readonly table: TableKey | null;
  readonly line: number | null;
  readonly column: string | null;
  readonly found: string;
  readonly mend: string;
  /** The same is found further down. */
  readonly hasMore: boolean;
}

export interface Looked {
  readonly identifies: boolean;
  /** Not read to its end or not in all its parts, so that nobody knows whether it identifies somebody. */
  readonly isUnread: boolean;
  /** What keeps the file from being sent. */
  readonly stops: readonly LookPlace[];
  /** What might identify somebody: a person has to look. */
  readonly doubts: readonly LookPlace[];
}

/** Anything but a participant code may be a name or a record number; the registry would keep it until the check. */
const identifying = ['F50', 'F12'];
const unreadable = ['F01', 'F02', 'F03', 'F04', 'F05', 'F40', 'F41', 'F42', 'F43', 'F48'];
const doubtful = ['F51'];

/** Only places are shown, a few of each rule; none may crowd out another. */
const kept = { perRule: 1_000, inAll: Infinity };

export async function lookThrough({ file, table, safeHeaders }: LookQuestion): Promise<Looked> {
  const log = new FindingLog(kept);
  const safe = new Set(safeHeaders);
  const screens: TableScreen[] = [];
  const optionsOf = (key: TableKey) => {
    const watch = new TableScreen(key, safe);
    screens.push(watch);
    return { watch };
  };
  if (table === 'workbook') await readWorkbook(bytesOfFile(file), log, undefined, optionsOf);
  else await readTable(table, bytesOfFile(file), log, undefined, optionsOf(table));
  for (const screen of screens) screen.report(log);
  const identifies = identifying.some((rule) => log.count(rule) > 0);
  const isUnread = countUnscreened(log) > 0;
  return {
    identifies,
    isUnread,
    stops: placesOf(log, [...identifying, ...(isUnread ? unreadable : [])]),
    doubts: placesOf(log, doubtful),
  };
}

/** The first place of each column and kind of thing, rules in the order given. */
function placesOf(log: FindingLog, rules: readonly string[]): readonly LookPlace[] {
  const byRule = new Map(log.byRule().map(({ id, kept: findings }) => [id, findings]));
  const places = new Map<string, LookPlace>();
  for (const { rule, table, line, column, found, mend } of rules.flatMap((id) => byRule.get(id) ?? [])) {
    const key = [rule, table, column, found].join(' ');
    const first = places.get(key);
    places.set(key, first === undefined ? { rule, table, line, column, found, mend, hasMore: false } : { ...first, hasMore: true });
  }
  return [...places.values()];
}
