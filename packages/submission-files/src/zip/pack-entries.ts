import { crc32 } from './crc32.ts';
import { joined } from './joined.ts';
import type { ZipEntry } from './zip-directory.ts';

/** A part that is not packed: short, or not worth it. */
export function storedEntry(name: string, text: string): ZipEntry {
  const bytes = new TextEncoder().encode(text);
  return { name, isDeflated: false, packed: bytes, size: bytes.length, crc: crc32(bytes) };
}

/** 1 January 1980, the first day that zip can tell (PKWARE APPNOTE 4.4.6). */
const firstDay = 0x0021;
const version = 20;
/** Names are in UTF-8 (PKWARE APPNOTE 4.4.4). */
const utf8 = 0x0800;

type Field = readonly [value: number, bytes: 2 | 4];

const record = (fields: readonly Field[]): Uint8Array =>
  Uint8Array.from(fields.flatMap(([value, bytes]) => Array.from({ length: bytes }, (_, index) => (value >>> (8 * index)) & 0xff)));

function fieldsOf({ isDeflated, packed, size, crc }: ZipEntry, nameLength: number): readonly Field[] {
  return [
    [version, 2],
    [utf8, 2],
    [isDeflated ? 8 : 0, 2],
    [0, 2],
    [firstDay, 2],
    [crc, 4],
    [packed.length, 4],
    [size, 4],
    [nameLength, 2],
    [0, 2],
  ];
}

/** An archive of entries as they are packed already; nothing is unpacked for it. */
export function packEntries(entries: readonly ZipEntry[]): Uint8Array {
  const pieces: Uint8Array[] = [];
  const directory: Uint8Array[] = [];
  let offset = 0;
  for (const entry of entries) {
    const name = new TextEncoder().encode(entry.name);
    const fields = fieldsOf(entry, name.length);
    const local = [record([[0x04034b50, 4], ...fields]), name, entry.packed];
    // Comment, disk and attributes: none; then the place of the local header.
    directory.push(record([[0x02014b50, 4], [version, 2], ...fields, [0, 2], [0, 2], [0, 2], [0, 4], [offset, 4]]), name);
    pieces.push(...local);
    offset += local.reduce((sum, { length }) => sum + length, 0);
  }
  const directoryLength = directory.reduce((sum, { length }) => sum + length, 0);
  const count = entries.length;
  const end = record([
    [0x06054b50, 4],
    [0, 2],
    [0, 2],
    [count, 2],
    [count, 2],
    [directoryLength, 4],
    [offset, 4],
    [0, 2],
  ]);
  return joined([...pieces, ...directory, end]);
}
