import { damaged } from '../../zip/damaged.ts';
import type { ZipEntry } from '../../zip/zip-directory.ts';
import { scanPart } from './scan-part.ts';

/** Built-in number formats that show dates or times, the East Asian ones included (ECMA-376-1, 18.8.30). */
const isBuiltInDate = (id: number): boolean =>
  (id >= 14 && id <= 22) || (id >= 27 && id <= 36) || (id >= 45 && id <= 47) || (id >= 50 && id <= 58);

/** A workbook may have 64,000 styles. */
const mostStyles = 100_000;
/** What decides stands at the beginning; a longer code is nobody's. */
const longestCode = 1_000;

/** Whether a format code shows a date or time: a day, month, year, hour or second outside of quotes, escapes and brackets, or elapsed time in brackets. */
export function isDateFormat(code: string): boolean {
  const bare = code
    .slice(0, longestCode)
    .replace(/"[^"]*"|\\.|_.|\*./g, '')
    .replace(/\[(?!(?:h+|m+|s+)\])[^\]]*\]/gi, '');
  return /[ymdhs]/i.test(bare);
}

/** For each cell style by its number, whether it shows the number of a cell as a date or time. */
export function readDateStyles(entry: ZipEntry): readonly boolean[] {
  const formats = new Map<number, boolean>();
  const styles: boolean[] = [];
  let inCellStyles = false;
  scanPart(entry, {
    open(name, attributes, depth) {
      if (depth === 2) inCellStyles = name === 'cellXfs';
      if (name === 'numFmt' && depth === 3)
        formats.set(Number(attributes.get('numFmtId')), isDateFormat(attributes.get('formatCode') ?? ''));
      if (name !== 'xf' || depth !== 3 || !inCellStyles) return;
      const format = Number(attributes.get('numFmtId') ?? '0');
      styles.push(formats.get(format) ?? isBuiltInDate(format));
    },
    text() {},
    close() {
      if (styles.length > mostStyles || formats.size > mostStyles) throw damaged('It has more styles than a workbook can have.');
    },
  });
  return styles;
}
