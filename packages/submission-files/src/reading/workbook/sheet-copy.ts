import { columnLetters } from '../../table/header-row.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import { escapeXml } from '../../writing/workbook/escape-xml.ts';
import type { SheetRange } from './cell-reference.ts';
import type { SheetEvents } from './sheet-reader.ts';

/** Writes down again what is read of a sheet: its cells with their kinds, what is hidden and what is merged. */
export class SheetCopy implements SheetEvents {
  private columns = '';
  private rows = '';
  private hasBegun = false;
  private merges = '';

  hiddenColumns(first: number, last: number): void {
    this.columns += `<col min="${first + 1}" max="${last + 1}" hidden="1"/>`;
  }

  row(cells: readonly string[], kinds: readonly CellKind[], count: number, line: number, isHidden: boolean): void {
    this.rows += `<row r="${line}"${isHidden ? ' hidden="1"' : ''}>`;
    for (let position = 0; position < count; position += 1) {
      const text = cells[position];
      if (text) this.rows += `<c r="${columnLetters(position)}${line}"${cellXml(text, kinds[position] ?? 'text')}</c>`;
    }
    this.rows += '</row>';
  }

  merged({ firstColumn, firstRow, lastColumn, lastRow }: SheetRange): void {
    this.merges += `<mergeCell ref="${columnLetters(firstColumn)}${firstRow}:${columnLetters(lastColumn)}${lastRow}"/>`;
  }

  /** Not kept. */
  image(): void {}

  /** What has been written since the last time. */
  take(): string {
    const taken = this.begin() + this.rows;
    this.rows = '';
    return taken;
  }

  /** To be called behind the last row. */
  end(): string {
    const merges = this.merges === '' ? '' : `<mergeCells>${this.merges}</mergeCells>`;
    return `${this.take()}</sheetData>${merges}`;
  }

  private begin(): string {
    if (this.hasBegun) return '';
    this.hasBegun = true;
    return `${this.columns === '' ? '' : `<cols>${this.columns}</cols>`}<sheetData>`;
  }
}

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '\r': '&#13;' };
const asValue = (text: string): string => `<v>${text.replace(/[&<>\r]/g, (character) => entities[character] ?? character)}</v>`;

/** Characters that XML cannot hold; only inline texts have a way to write them. */
const unwritable = /(?![\t\n\r])[\p{Cc}\p{Cs}\ufffe\uffff]/u;

/** The rest of a cell's element, so that it is read as the same text of the same kind. */
function cellXml(text: string, kind: CellKind): string {
  switch (kind) {
    case 'text':
      return unwritable.test(text) ? ` t="inlineStr"><is><t xml:space="preserve">${escapeXml(text)}</t></is>` : ` t="str">${asValue(text)}`;
    case 'number':
      return `>${asValue(text)}`;
    case 'date':
      return ` t="d">${asValue(text)}`;
    case 'error':
      return ` t="e">${asValue(text)}`;
    case 'uncalculated':
      return ' t="str"><f>0</f>';
  }
}
