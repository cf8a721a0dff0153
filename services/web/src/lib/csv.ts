/** A table as text: comma-separated for a file (RFC 4180), tab-separated for the clipboard. */

export type CsvValue = string | number | null;

/** A spreadsheet runs text that begins like this as a formula; a leading apostrophe makes it text. Numbers stay numbers. */
const formula = /^[=+\-@\t\r]/;

export function toCsv(rows: readonly (readonly CsvValue[])[]): string {
  return rows.map((row) => row.map((value) => quoted(plain(value))).join(',') + '\r\n').join('');
}

export function toTabSeparated(rows: readonly (readonly CsvValue[])[]): string {
  return rows.map((row) => row.map((value) => plain(value).replace(/[\t\r\n]+/g, ' ')).join('\t')).join('\n');
}

function plain(value: CsvValue): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  return formula.test(value) ? `'${value}` : value;
}

function quoted(text: string): string {
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
