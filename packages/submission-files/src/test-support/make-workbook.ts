/** Small workbooks for tests, part by part as the standard lays them out. */
import { makeZip } from './make-zip.ts';
import type { ZipDraft } from './make-zip.ts';

const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const sheetSpace = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const relationshipSpace = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const packageSpace = 'http://schemas.openxmlformats.org/package/2006/relationships';

/** A cell of a test sheet; null leaves it out. `xml` stands for any `<c>` element, with its place filled in as `@`. */
export type DraftCell = string | number | boolean | null | { readonly xml: string };

export interface SheetDraft {
  readonly name: string;
  /** Rows from the first on; null leaves a row out. */
  readonly rows?: readonly (readonly DraftCell[] | null)[];
  /** Elements before and behind the rows. */
  readonly before?: string;
  readonly behind?: string;
  /** The sheet's part as it is, in place of all this. */
  readonly xml?: string;
  readonly state?: string;
}

export interface WorkbookDraft {
  readonly sheets: readonly SheetDraft[];
  readonly sharedStrings?: string;
  readonly styles?: string;
  readonly workbookProperties?: string;
  readonly contentTypes?: string;
  readonly more?: readonly ZipDraft[];
}

export const escaped = (text: string): string => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;');

const letters = (position: number): string =>
  (position < 26 ? '' : letters(Math.floor(position / 26) - 1)) + String.fromCharCode(65 + (position % 26));

function cellXml(cell: DraftCell, place: string): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return `<c r="${place}"><v>${cell}</v></c>`;
  if (typeof cell === 'boolean') return `<c r="${place}" t="b"><v>${cell ? 1 : 0}</v></c>`;
  if (typeof cell === 'string') return `<c r="${place}" t="inlineStr"><is><t>${escaped(cell)}</t></is></c>`;
  return cell.xml.replace('@', place);
}

export function sheetXml({ rows = [], before = '', behind = '' }: Omit<SheetDraft, 'name'>): string {
  const data = rows.map((row, index) =>
    row === null
      ? ''
      : `<row r="${index + 1}">${row.map((cell, position) => cellXml(cell, `${letters(position)}${index + 1}`)).join('')}</row>`,
  );
  return `${head}<worksheet xmlns="${sheetSpace}" xmlns:r="${relationshipSpace}">${before}<sheetData>${data.join('')}</sheetData>${behind}</worksheet>`;
}

/** The parts of a workbook, so that a test can spoil one of them. */
export function workbookParts({
  sheets,
  sharedStrings,
  styles,
  workbookProperties = '',
  contentTypes = '',
  more = [],
}: WorkbookDraft): ZipDraft[] {
  const listed = sheets.map(
    ({ name, state }, index) =>
      `<sheet name="${escaped(name)}" sheetId="${index + 1}"${state === undefined ? '' : ` state="${state}"`} r:id="rId${index + 1}"/>`,
  );
  const related = [
    ...sheets.map((_, index) => ['worksheet', `worksheets/sheet${index + 1}.xml`]),
    ...(sharedStrings === undefined ? [] : [['sharedStrings', 'sharedStrings.xml']]),
    ...(styles === undefined ? [] : [['styles', 'styles.xml']]),
  ].map(([kind, target], index) => `<Relationship Id="rId${index + 1}" Type="${relationshipSpace}/${kind}" Target="${target}"/>`);
  return [
    {
      name: '[Content_Types].xml',
      content: `${head}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">${contentTypes}</Types>`,
    },
    {
      name: '_rels/.rels',
      content: `${head}<Relationships xmlns="${packageSpace}"><Relationship Id="rId1" Type="${relationshipSpace}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
    },
    {
      name: 'xl/workbook.xml',
      content: `${head}<workbook xmlns="${sheetSpace}" xmlns:r="${relationshipSpace}">${workbookProperties}<sheets>${listed.join('')}</sheets></workbook>`,
    },
    { name: 'xl/_rels/workbook.xml.rels', content: `${head}<Relationships xmlns="${packageSpace}">${related.join('')}</Relationships>` },
    ...sheets.map((sheet, index) => ({ name: `xl/worksheets/sheet${index + 1}.xml`, content: sheet.xml ?? sheetXml(sheet) })),
    ...(sharedStrings === undefined
      ? []
      : [{ name: 'xl/sharedStrings.xml', content: `${head}<sst xmlns="${sheetSpace}">${sharedStrings}</sst>` }]),
    ...(styles === undefined
      ? []
      : [{ name: 'xl/styles.xml', content: `${head}<styleSheet xmlns="${sheetSpace}">${styles}</styleSheet>` }]),
    ...more,
  ];
}

export const makeWorkbook = (draft: WorkbookDraft): Uint8Array => makeZip(workbookParts(draft));
