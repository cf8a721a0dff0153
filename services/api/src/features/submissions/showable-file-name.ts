/**
 * Names of files hold names of people ("smith_john_march.csv"), and no list of names is complete. So a name is kept only when it is made of the
 * registry's own words; any other file is called by its table.
 */
import { dictionary } from '@cairnstep/dictionary';
import type { FileKey } from './file-key.ts';

const wordsIn = (text: string): string[] => text.toLowerCase().match(/\p{L}+|\d+/gu) ?? [];

const usual =
  'csv xlsx txt cairnstep registry month monthly template table tables data file files export upload submission training workbook finding findings exam isncsci ' +
  'assessment session bout event consent participant final draft new old copy clean cleaned prepared checked corrected correction mended ' +
  'version v of the and for from';
const known: ReadonlySet<string> = new Set([...wordsIn(usual), ...dictionary.tables.flatMap(({ key, name }) => wordsIn(`${key} ${name}`))]);

/** The name as it may be kept and shown. */
export function showableFileName(
  given: string,
  key: FileKey,
  { siteCode, month }: { readonly siteCode: string; readonly month: string },
): string {
  const own = new Set([...wordsIn(siteCode), ...wordsIn(month), month.replace('-', '')]);
  const others = wordsIn(given).filter((word) => !known.has(word) && !own.has(word));
  // One short number may tell versions apart; several may be a date.
  const isShowable =
    /^[\p{L}\d ._()-]*$/u.test(given) && (others.length === 0 || (others.length === 1 && /^\d{1,2}$/.test(others[0] ?? '')));
  return isShowable ? given : key === 'workbook' ? 'workbook.xlsx' : `${key}.csv`;
}
