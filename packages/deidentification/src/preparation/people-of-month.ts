import type { TableKey } from '@cairnstep/dictionary';
import type { CodeBook } from '../key-file/code-book.ts';
import type { SiteKey } from '../key-file/site-key.ts';
import { normaliseLocalId } from '../pseudonyms/normalise-local-id.ts';
import { hasValidCheckCharacter } from '../pseudonyms/participant-code.ts';
import { lineOf } from '../detection/line-of.ts';
import type { LengthChange } from './month.ts';
import type { TablePlan } from './table-plan.ts';

export interface Place {
  readonly table: TableKey;
  readonly line: number;
}

export interface PeopleOfMonth {
  /** For each plan the code of each row; null where the row has no record number, or the table is not ready. */
  readonly codes: ReadonlyMap<TablePlan, readonly (string | null)[]>;
  /** Where each person stands first, in the order of the tables. */
  readonly firstPlaces: ReadonlyMap<string, Place>;
  readonly newCodes: ReadonlySet<string>;
  readonly lengthChange: LengthChange | null;
  readonly idLengths: ReadonlyMap<number, number>;
}

/** Finds or makes the code of everybody in the files. A cell that holds a participant code already keeps it. */
export async function peopleOfMonth(plans: readonly TablePlan[], key: SiteKey, book: CodeBook): Promise<PeopleOfMonth> {
  const codes = new Map<TablePlan, (string | null)[]>();
  const firstPlaces = new Map<string, Place>();
  const newCodes = new Set<string>();
  const localIds = new Set<string>();

  for (const plan of plans) {
    const ofRows: (string | null)[] = [];
    codes.set(plan, ofRows);
    for (const [row, cells] of plan.raw.rows.entries()) {
      const cell = (plan.isReady && plan.participant !== null && cells[plan.participant]?.trim()) || '';
      const localId = normaliseLocalId(cell, key.normalisation);
      if (localId === '') {
        ofRows.push(null);
        continue;
      }
      const isCode = await hasValidCheckCharacter(cell);
      const { code, isNew } = isCode ? { code: book.presentCodeOf(cell), isNew: false } : await book.codeOf(localId);
      if (!isCode) localIds.add(localId);
      if (isNew) newCodes.add(code);
      if (!firstPlaces.has(code)) firstPlaces.set(code, { table: plan.raw.table, line: lineOf(plan.raw, row) });
      ofRows.push(code);
    }
  }
  return { codes, firstPlaces, newCodes, ...lengthsOf(localIds, key) };
}

function lengthsOf(localIds: ReadonlySet<string>, key: SiteKey): Pick<PeopleOfMonth, 'lengthChange' | 'idLengths'> {
  const idLengths = new Map<number, number>();
  for (const { length } of localIds) idLengths.set(length, (idLengths.get(length) ?? 0) + 1);
  if (key.idLengths.size === 0 || localIds.size === 0) return { lengthChange: null, idLengths };
  const newLengths = [...idLengths].reduce((sum, [length, count]) => sum + (key.idLengths.has(length) ? 0 : count), 0);
  return { lengthChange: { ids: localIds.size, newLengths }, idLengths };
}
