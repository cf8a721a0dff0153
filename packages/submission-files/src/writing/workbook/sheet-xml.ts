/** The part of one sheet, in pieces (ECMA-376-1, 18.3.1; the order of elements is that of 18.3.1.99). */
import { columnLetters } from '../../table/header-row.ts';
import { formatNumber } from '../format-number.ts';
import { styleNumber } from './cell-styles.ts';
import { escapeXml } from './escape-xml.ts';
import type { PlannedColumn, PlannedRow, PlannedSheet, PlannedValidation, PlannedValue } from './sheet-plan.ts';

const lastRow = 1_048_576;
const spreadsheet = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const officeDocument = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';

/** @param isOpen Whether the workbook opens on this sheet. */
export async function* sheetXml(sheet: PlannedSheet, isOpen: boolean): AsyncGenerator<string> {
  yield `<worksheet xmlns="${spreadsheet}" xmlns:r="${officeDocument}"><sheetViews>${viewXml(sheet, isOpen)}</sheetViews><sheetFormatPr defaultRowHeight="15"/>`;
  if (sheet.columns.length > 0) yield `<cols>${sheet.columns.map(columnXml).join('')}</cols>`;
  yield '<sheetData>';
  const letters = sheet.columns.map((_, position) => columnLetters(position));
  for await (const row of sheet.rows) yield rowXml(row, letters, sheet.columns);
  yield '</sheetData>';
  if (sheet.hasFilter) yield `<autoFilter ref="A1:${columnLetters(sheet.columns.length - 1)}1"/>`;
  yield* validationsXml(sheet.validations ?? []);
  const links = sheet.links?.() ?? [];
  if (links.length > 0)
    yield `<hyperlinks>${links.map(({ cell, target }) => `<hyperlink ref="${cell}" location="${escapeXml(target)}"/>`).join('')}</hyperlinks>`;
  const codes = (sheet.codeColumns ?? []).map((column) => wholeColumn(column));
  if (codes.length > 0) yield `<ignoredErrors><ignoredError sqref="${codes.join(' ')}" numberStoredAsText="1"/></ignoredErrors>`;
  if (sheet.notes) yield '<legacyDrawing r:id="rId1"/>';
  yield '</worksheet>';
}

/** The cells of a column below the header. */
function wholeColumn(column: number): string {
  const letters = columnLetters(column);
  return `${letters}2:${letters}${lastRow}`;
}

function viewXml({ frozen }: PlannedSheet, isOpen: boolean): string {
  const selected = isOpen ? ' tabSelected="1"' : '';
  if (!frozen) return `<sheetView${selected} workbookViewId="0"/>`;
  const { rows, columns } = frozen;
  const splits = `${columns > 0 ? ` xSplit="${columns}"` : ''}${rows > 0 ? ` ySplit="${rows}"` : ''}`;
  const pane = columns > 0 ? 'bottomRight' : 'bottomLeft';
  return `<sheetView${selected} workbookViewId="0"><pane${splits} topLeftCell="${columnLetters(columns)}${rows + 1}" activePane="${pane}" state="frozen"/></sheetView>`;
}

function columnXml({ width, style }: PlannedColumn, position: number): string {
  const place = position + 1;
  return `<col min="${place}" max="${place}" width="${width}" customWidth="1"${style ? ` style="${styleNumber(style)}"` : ''}/>`;
}

function rowXml({ line, cells, style, styles, height }: PlannedRow, letters: readonly string[], columns: readonly PlannedColumn[]): string {
  let xml = height === undefined ? `<row r="${line}">` : `<row r="${line}" ht="${height}" customHeight="1">`;
  for (let position = 0; position < cells.length; position += 1) {
    const value = cells[position] ?? null;
    const own = styles?.get(position) ?? style;
    if (value === null && own === undefined) continue;
    const look = own ?? columns[position]?.style;
    xml += `<c r="${letters[position] ?? columnLetters(position)}${line}"${look ? ` s="${styleNumber(look)}"` : ''}${valueXml(value)}`;
  }
  return `${xml}</row>`;
}

function valueXml(value: PlannedValue): string {
  if (value === null) return '/>';
  if (typeof value === 'number') return `><v>${formatNumber(value)}</v></c>`;
  const preserves = value.trim() === value ? '' : ' xml:space="preserve"';
  return ` t="inlineStr"><is><t${preserves}>${escapeXml(value)}</t></is></c>`;
}

function* validationsXml(validations: readonly PlannedValidation[]): Generator<string> {
  if (validations.length === 0) return;
  yield `<dataValidations count="${validations.length}">`;
  for (const validation of validations) yield validationXml(validation);
  yield '</dataValidations>';
}

function validationXml({ column, allows, title, prompt, refusal }: PlannedValidation): string {
  const said = `promptTitle="${escapeXml(title)}" prompt="${escapeXml(prompt)}" showInputMessage="1" allowBlank="1" sqref="${wholeColumn(column)}"`;
  const refuses = `showErrorMessage="1" errorTitle="${escapeXml(title)}" error="${escapeXml(refusal)}"`;
  switch (allows.kind) {
    case 'anything':
      return `<dataValidation ${said}/>`;
    case 'list':
      return `<dataValidation type="list" ${allows.isOpen ? '' : `${refuses} `}${said}><formula1>${escapeXml(allows.range)}</formula1></dataValidation>`;
    case 'whole':
    case 'decimal':
      return `<dataValidation type="${allows.kind}" operator="between" ${refuses} ${said}><formula1>${formatNumber(allows.min)}</formula1><formula2>${formatNumber(allows.max)}</formula2></dataValidation>`;
  }
}
