import type { TableKey } from '@cairnstep/dictionary';
import type { TypedTable } from './table/typed-table.ts';

export type TypedTables = Readonly<Partial<Record<TableKey, TypedTable>>>;

/**
 * What the registry already holds of a site, as plain data, so that checking needs no database.
 *
 * `held` has, for every participant code that occurs in the files, the rows that stay after a commit: the accepted rows
 * of the site's other months. A row whose key also occurs in a file is overridden by the file. Load
 * - participants, consents, exams, assessments, sessions, adverse_events: all rows of those participants;
 * - bouts: only of sessions that occur in the files (bouts of other sessions are never looked at);
 * and build each table with `tableFromRows`. A table the registry has nothing of is left out.
 */
export interface RegistryContext {
  readonly held: TypedTables;
  /**
   * Held participants of the site that do not occur in the files: one row each, for the search for people entered twice.
   * Left out: only the people in the files and in `held` are compared.
   */
  readonly otherParticipants?: TypedTable;
  /** Participants of the site whose withdrawal the registry has processed; their rows are refused whatever the files say. */
  readonly withdrawn: ReadonlySet<string>;
  /** Codes of the site that were replaced by others. Left out: none were. */
  readonly replaced?: ReadonlySet<string>;
  /** Calendar year of the check, from the caller's clock, for years of injury. */
  readonly year: number;
}
