/**
 * Names of files hold names of people ("smith_john_march.csv"), and no list of names is complete. So a name may be shown only
 * when it is made of the registry's own words; any other file is called by its table.
 */
import { dictionary } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';

const wordsIn = (text: string): string[] => text.toLowerCase().match(/\p{L}+|\d+/gu) ?? [];

const usual = `csv xlsx txt cairnstep registry month monthly template table tables data file files export upload submission training workbook
  finding findings exam isncsci assessment session bout event consent participant final draft new old copy clean cleaned prepared checked
  corrected correction mended version v of the and for from`;
const known: ReadonlySet<string> = new Set([...wordsIn(usual), ...dictionary.tables.flatMap(({ key, name }) => wordsIn(`${key} ${name}`))]);

/** What a file's name may hold besides the registry's words. */
export interface FileOf {
  readonly table: TableKey | 'workbook';
  readonly siteCode: string;
  /** `2026-11` */
  readonly month: string;
}

/** The name as it may be sent, kept and shown. */
export function showableFileName(given: string, { table, siteCode, month }: FileOf): string {
  const own = new Set([...wordsIn(siteCode), ...wordsIn(month), month.replace('-', '')]);
  const others = wordsIn(given).filter((word) => !known.has(word) && !own.has(word));
  // One short number may tell versions apart; several may be a date.
  const isVersion = others.length === 1 && /^\d{1,2}$/.test(others[0] ?? '');
  const isShowable = /^[\p{L}\d ._()-]*$/u.test(given) && (others.length === 0 || isVersion);
  if (isShowable) return given;
  return table === 'workbook' ? 'workbook.xlsx' : `${table}.csv`;
}
