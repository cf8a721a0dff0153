/** Whether bytes are a workbook that may be read at all, and where its parts are. */
import type { WorkbookLimits } from '../../limits.ts';
import { damaged } from '../../zip/damaged.ts';
import { readZipDirectory } from '../../zip/zip-directory.ts';
import type { ZipDirectory, ZipEntry } from '../../zip/zip-directory.ts';
import { foreignContent } from '../foreign-content.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { readDateStyles } from './date-styles.ts';
import { partAt, relationshipsOf } from './package-parts.ts';
import type { Relationship } from './package-parts.ts';
import { scanPart } from './scan-part.ts';
import { readSharedTexts } from './shared-texts.ts';
import type { SheetSurroundings } from './sheet-reader.ts';
import { readWorkbookPart } from './workbook-part.ts';

export interface SheetPart {
  readonly name: string;
  readonly isHidden: boolean;
  readonly entry: ZipEntry;
}

export interface OpenWorkbook {
  readonly sheets: readonly SheetPart[];
  readonly surroundings: SheetSurroundings;
}

const saveAsXlsx = 'Save the tables as XLSX in your spreadsheet program, or each table as CSV, and send that file.';

const notAWorkbook = (found: string, mend = saveAsXlsx): UnreadableFile => new UnreadableFile('F40', found, mend, null);

const zipMark = [0x50, 0x4b, 0x03, 0x04];
const compoundFileMark = [0xd0, 0xcf, 0x11, 0xe0];
/** Name of the stream that holds an encrypted workbook inside a compound file, in UTF-16 (MS-OFFCRYPTO, 1.3.2). */
const encryptedStream = new Uint8Array(Array.from('EncryptedPackage', (letter) => [letter.charCodeAt(0), 0]).flat());

const startsWith = (bytes: Uint8Array, start: readonly number[]): boolean => start.every((byte, index) => bytes[index] === byte);

function includes(bytes: Uint8Array, sought: Uint8Array): boolean {
  const first = sought[0] ?? 0;
  for (let at = bytes.indexOf(first); at >= 0; at = bytes.indexOf(first, at + 1))
    if (sought.every((byte, index) => bytes[at + index] === byte)) return true;
  return false;
}

function refuseOtherContent(bytes: Uint8Array): void {
  if (startsWith(bytes, zipMark)) return;
  if (bytes.length === 0) throw notAWorkbook('The file is empty.');
  if (startsWith(bytes, compoundFileMark) && includes(bytes, encryptedStream))
    throw notAWorkbook('The workbook is protected by a password.', 'Take the password off and send the workbook again.');
  throw notAWorkbook(`The file is ${foreignContent(bytes) ?? 'text or of an unknown kind'}, not a workbook in XLSX form.`);
}

/** Content types of macros and of what may hold them, whatever the parts are called (ECMA-376-2, 6.2.3). */
const macroType = /macroEnabled|vbaProject|macrosheet/i;

function refuseMacros(directory: ZipDirectory): void {
  let hasMacros = [...directory.keys()].some((name) => name.endsWith('vbaproject.bin'));
  const types = directory.get('[content_types].xml');
  if (directory.has('mimetype')) throw notAWorkbook('The file is a spreadsheet or document in another form, such as ODS.');
  if (!types) throw notAWorkbook('The file is a zip archive that holds no workbook.');
  scanPart(types, {
    open(_, attributes) {
      if (macroType.test(attributes.get('ContentType') ?? '')) hasMacros = true;
    },
    text() {},
    close() {},
  });
  if (hasMacros)
    throw notAWorkbook('The workbook holds macros or is of a kind that may.', 'Save it as XLSX without macros and send that file.');
}

/** The part of this kind among the relationships; undefined when the workbook has none. */
function partOfKind(directory: ZipDirectory, relationships: readonly Relationship[], kind: string): ZipEntry | undefined {
  const found = relationships.find((relationship) => relationship.kind === kind);
  return found && partAt(directory, found.path);
}

/**
 * Checks the archive and reads what the sheets refer to.
 * @throws UnreadableFile
 */
export function openWorkbook(bytes: Uint8Array, limits: WorkbookLimits): OpenWorkbook {
  refuseOtherContent(bytes);
  const directory = readZipDirectory(bytes, limits);
  refuseMacros(directory);
  const main = relationshipsOf(directory, '').find(({ kind }) => kind === 'officeDocument');
  if (!main) throw notAWorkbook('The file is a zip archive that holds no workbook.');
  if (main.path.toLowerCase().endsWith('.bin')) throw notAWorkbook('The workbook is in a binary form.');
  const { sheets, countsFrom1904 } = readWorkbookPart(partAt(directory, main.path), limits.sheets);
  if (sheets.length === 0) throw notAWorkbook('The file is a document or presentation, not a workbook.');

  const relationships = relationshipsOf(directory, main.path);
  const texts = partOfKind(directory, relationships, 'sharedStrings');
  const styles = partOfKind(directory, relationships, 'styles');
  const parts = sheets.flatMap(({ name, isHidden, relationship: id }) => {
    const target = relationships.find((relationship) => relationship.id === id);
    if (!target) throw damaged('A sheet of its list is missing.');
    return target.kind === 'worksheet' ? [{ name, isHidden, entry: partAt(directory, target.path) }] : [];
  });
  if (new Set(parts.map(({ entry }) => entry)).size !== parts.length) throw damaged('Two of its sheets are the same part.');
  return {
    sheets: parts,
    surroundings: {
      sharedTexts: texts ? readSharedTexts(texts, limits) : [],
      dateStyles: styles ? readDateStyles(styles) : [],
      countsFrom1904,
    },
  };
}
