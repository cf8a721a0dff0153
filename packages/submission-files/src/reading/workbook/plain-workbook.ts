/**
 * A workbook without what nobody reads: the author's name and folder, comments, images, printer settings, other sheets of
 * the template and whatever else a program puts beside the cells. Parts that stay are not unpacked.
 */
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import { escapeXml } from '../../writing/workbook/escape-xml.ts';
import { packEntries, storedEntry } from '../../zip/pack-entries.ts';
import type { ZipEntry } from '../../zip/zip-directory.ts';
import { unreadable } from '../unreadable.ts';
import type { Unreadable } from '../unreadable.ts';
import { openPackage, partOfKind } from './open-workbook.ts';
import { partAt } from './package-parts.ts';
import { meaningOfSheet } from './sheet-names.ts';

export interface PlainWorkbook {
  readonly ok: true;
  readonly bytes: Uint8Array;
}

const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const sheetSpace = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const relationshipSpace = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const packageSpace = 'http://schemas.openxmlformats.org/package/2006/relationships';
const typeSpace = 'http://schemas.openxmlformats.org/package/2006/content-types';
const typeOf = (kind: string) => `application/vnd.openxmlformats-officedocument.spreadsheetml.${kind}+xml`;

const emptySheet = `${head}<worksheet xmlns="${sheetSpace}"><sheetData/></worksheet>`;

interface KeptPart {
  readonly kind: 'worksheet' | 'sharedStrings' | 'styles';
  readonly entry: ZipEntry;
}

const relationships = (targets: readonly (readonly [kind: string, target: string])[]): string =>
  `${head}<Relationships xmlns="${packageSpace}">${targets
    .map(([kind, target], index) => `<Relationship Id="rId${index + 1}" Type="${relationshipSpace}/${kind}" Target="${target}"/>`)
    .join('')}</Relationships>`;

const contentTypes = (parts: readonly KeptPart[]): string =>
  `${head}<Types xmlns="${typeSpace}"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>${[
    ['xl/workbook.xml', 'sheet.main'],
    ...parts.map(({ kind, entry }) => [entry.name, kind]),
  ]
    .map(([name, kind]) => `<Override PartName="/${name}" ContentType="${typeOf(kind ?? '')}"/>`)
    .join('')}</Types>`;

/**
 * What of a workbook is read, as a workbook of its own, in which findings have the same places. Refuses what is no
 * workbook in XLSX form, is protected, holds macros, or claims more than the limits; what the cells hold is not looked at.
 */
export function plainWorkbook(bytes: Uint8Array, limits: WorkbookLimits = defaultWorkbookLimits): PlainWorkbook | Unreadable {
  try {
    return { ok: true, bytes: withoutTheRest(bytes, limits) };
  } catch (error) {
    return unreadable(error);
  }
}

function withoutTheRest(bytes: Uint8Array, limits: WorkbookLimits): Uint8Array {
  const { directory, list, relationships: found } = openPackage(bytes, limits);
  const parts: KeptPart[] = [];
  const listed = list.sheets.map(({ name, isHidden, relationship: id }, index) => {
    const target = found.find((relationship) => relationship.id === id);
    const meaning = meaningOfSheet(name);
    const isRead = target?.kind === 'worksheet' && meaning !== 'other';
    const part = `xl/worksheets/sheet${index + 1}.xml`;
    parts.push({
      kind: 'worksheet',
      entry: isRead ? { ...partAt(directory, target.path), name: part } : storedEntry(part, emptySheet),
    });
    // The name of a sheet nobody declared may be somebody's.
    const shown = meaning === null ? `Sheet ${index + 1}` : name;
    return `<sheet name="${escapeXml(shown)}" sheetId="${index + 1}"${isHidden ? ' state="hidden"' : ''} r:id="rId${index + 1}"/>`;
  });
  for (const kind of ['sharedStrings', 'styles'] as const) {
    const entry = partOfKind(directory, found, kind);
    if (entry) parts.push({ kind, entry: { ...entry, name: `xl/${kind}.xml` } });
  }
  const properties = list.countsFrom1904 ? '<workbookPr date1904="1"/>' : '';
  const workbook = `${head}<workbook xmlns="${sheetSpace}" xmlns:r="${relationshipSpace}">${properties}<sheets>${listed.join('')}</sheets></workbook>`;
  return packEntries([
    storedEntry('[Content_Types].xml', contentTypes(parts)),
    storedEntry('_rels/.rels', relationships([['officeDocument', 'xl/workbook.xml']])),
    storedEntry('xl/workbook.xml', workbook),
    storedEntry('xl/_rels/workbook.xml.rels', relationships(parts.map(({ kind, entry }) => [kind, entry.name.replace('xl/', '')]))),
    ...parts.map(({ entry }) => entry),
  ]);
}
