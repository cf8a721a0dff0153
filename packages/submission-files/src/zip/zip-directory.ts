/**
 * The files in a zip archive, by its central directory (PKWARE APPNOTE 6.3.10, section 4.3), all checked before any is
 * unpacked: number, names, claimed sizes and ratios, places that must not overlap, and agreement with the local headers.
 *
 * Own reader because no package does this in browser and server alike: fflate's goes by the local headers alone, so that
 * what it unpacks can be another set of files than the directory lists. Unpacking itself is fflate's.
 */
import type { WorkbookLimits } from '../limits.ts';
import { UnreadableFile } from '../reading/unreadable-file.ts';
import { damaged } from './damaged.ts';
import { isUnsafeName } from './unsafe-name.ts';

export interface ZipEntry {
  readonly name: string;
  readonly isDeflated: boolean;
  readonly packed: Uint8Array;
  /** Bytes unpacked, as the directory claims. */
  readonly size: number;
  readonly crc: number;
}

/** Entries by name in lower case: names of parts of a workbook are the same in any case (ECMA-376-2, 6.2.2.3). */
export type ZipDirectory = ReadonlyMap<string, ZipEntry>;

const endMark = 0x06054b50;
const directoryMark = 0x02014b50;
const localMark = 0x04034b50;
const endLength = 22;
const directoryLength = 46;
const localLength = 30;
const longestComment = 0xffff;
/** What a field holds when the real number stands in a ZIP64 record; no archive within the limits needs one. */
const inZip64 = 0xffffffff;

const encryptedFlag = 1;
const unixHost = 3;
const fileTypeMask = 0xf000;
const symbolicLink = 0xa000;
const stored = 0;
const deflated = 8;

/** Below this a high ratio does no harm, and a part of one repeated tag can have one. */
const ratioMattersFrom = 1_000_000;

interface Listed {
  readonly name: string;
  readonly rawName: Uint8Array;
  readonly method: number;
  readonly crc: number;
  readonly packedSize: number;
  readonly size: number;
  readonly offset: number;
}

/** @throws UnreadableFile */
export function readZipDirectory(bytes: Uint8Array, limits: WorkbookLimits): ZipDirectory {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = findEnd(view);
  const count = view.getUint16(end + 10, true);
  const start = view.getUint32(end + 16, true);
  const isWhole =
    view.getUint16(end + 4, true) === 0 &&
    view.getUint16(end + 6, true) === 0 &&
    view.getUint16(end + 8, true) === count &&
    start + view.getUint32(end + 12, true) === end;
  if (!isWhole) throw damaged('The list of its parts is not where it should be.');
  if (count > limits.entries) throw tooMuch(`The workbook has more than ${limits.entries.toLocaleString('en')} parts.`);

  const listed: Listed[] = [];
  let at = start;
  for (let index = 0; index < count; index += 1) {
    const { entry, next } = readListed(view, bytes, at, end);
    listed.push(entry);
    at = next;
  }
  if (at !== end) throw damaged('The list of its parts has another length than it says.');
  refuseBomb(listed, limits);
  return unpackable(listed, view, bytes, start);
}

/** The record at the end of the archive; its comment must end with the file, so that nothing is hidden behind it. */
function findEnd(view: DataView): number {
  const last = view.byteLength - endLength;
  for (let at = last; at >= Math.max(0, last - longestComment); at -= 1)
    if (view.getUint32(at, true) === endMark && view.getUint16(at + 20, true) === last - at) return at;
  throw damaged('It ends too early.');
}

function readListed(view: DataView, bytes: Uint8Array, at: number, end: number): { readonly entry: Listed; readonly next: number } {
  if (at + directoryLength > end || view.getUint32(at, true) !== directoryMark) throw damaged('The list of its parts is cut off.');
  const nameLength = view.getUint16(at + 28, true);
  const next = at + directoryLength + nameLength + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
  if (next > end) throw damaged('The list of its parts is cut off.');

  const rawName = bytes.subarray(at + directoryLength, at + directoryLength + nameLength);
  const name = new TextDecoder().decode(rawName);
  const fileType = view.getUint8(at + 5) === unixHost ? view.getUint16(at + 40, true) & fileTypeMask : 0;
  if (isUnsafeName(name) || fileType === symbolicLink) throw damaged('It has a part whose name leads out of the workbook.');
  if (view.getUint16(at + 8, true) & encryptedFlag) {
    throw new UnreadableFile('F40', 'The workbook is protected by a password.', 'Take the password off and send the workbook again.', null);
  }
  const entry = {
    name,
    rawName,
    method: view.getUint16(at + 10, true),
    crc: view.getUint32(at + 16, true),
    packedSize: view.getUint32(at + 20, true),
    size: view.getUint32(at + 24, true),
    offset: view.getUint32(at + 42, true),
  };
  if ([entry.packedSize, entry.size, entry.offset].includes(inZip64)) throw tooMuch('A part of the workbook is larger than 4 GB.');
  return { entry, next };
}

function refuseBomb(listed: readonly Listed[], limits: WorkbookLimits): void {
  const size = listed.reduce((sum, entry) => sum + entry.size, 0);
  if (size > limits.unpackedBytes)
    throw tooMuch(`The workbook unpacks to more than ${(limits.unpackedBytes / 1_000_000).toLocaleString('en')} MB.`);
  const isBomb = listed.some((entry) => entry.size > ratioMattersFrom && entry.size > entry.packedSize * limits.unpackRatio);
  if (isBomb) throw tooMuch(`A part of the workbook unpacks to more than ${limits.unpackRatio} times its size.`);
}

/** Holds the list against the local headers. Entries that share bytes would let a small archive unpack without end. */
function unpackable(listed: readonly Listed[], view: DataView, bytes: Uint8Array, directoryStart: number): ZipDirectory {
  const entries = new Map<string, ZipEntry>();
  let free = 0;
  for (const entry of [...listed].sort((a, b) => a.offset - b.offset)) {
    const { name, method, offset, packedSize, size, crc } = entry;
    if (offset < free || offset + localLength > directoryStart || view.getUint32(offset, true) !== localMark)
      throw damaged('Its parts do not stand where its list says.');
    const nameStart = offset + localLength;
    const nameEnd = nameStart + view.getUint16(offset + 26, true);
    const dataStart = nameEnd + view.getUint16(offset + 28, true);
    free = dataStart + packedSize;
    if (free > directoryStart) throw damaged('Its parts do not stand where its list says.');
    if (!sameBytes(bytes.subarray(nameStart, nameEnd), entry.rawName) || view.getUint16(offset + 8, true) !== method)
      throw damaged('A part has another name or form than in the list of parts.');
    if ((method !== stored && method !== deflated) || (method === stored && size !== packedSize))
      throw damaged('A part is packed in a way that workbooks do not use.');
    const key = name.toLowerCase();
    if (entries.has(key)) throw damaged('It has two parts of the same name.');
    entries.set(key, { name, isDeflated: method === deflated, packed: bytes.subarray(dataStart, free), size, crc });
  }
  return entries;
}

const sameBytes = (a: Uint8Array, b: Uint8Array): boolean => a.length === b.length && a.every((byte, index) => byte === b[index]);

const tooMuch = (found: string): UnreadableFile =>
  new UnreadableFile('F03', found, 'Send a workbook with nothing in it but the tables, and a large month in parts.', null);
