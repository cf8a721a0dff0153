import { Inflate } from 'fflate';
import { crc32 } from './crc32.ts';
import { damaged } from './damaged.ts';
import type { ZipEntry } from './zip-directory.ts';

/** Bytes given to the inflater at a time. They can become a thousand times as many at once. */
const pieceSize = 16_384;

/**
 * Unpacks an entry piece by piece, and never further than the size that the directory claims.
 * @throws UnreadableFile where the content is not what the directory says.
 */
export function* unpack({ packed, isDeflated, size, crc }: ZipEntry): Generator<Uint8Array> {
  let unpacked = 0;
  let checksum = 0;
  for (const piece of isDeflated ? inflate(packed) : pieces(packed)) {
    unpacked += piece.length;
    if (unpacked > size) throw damaged('A part unpacks to more than it says.');
    checksum = crc32(piece, checksum);
    yield piece;
  }
  if (unpacked !== size || checksum !== crc) throw damaged('A part has changed since it was written.');
}

function* pieces(bytes: Uint8Array): Generator<Uint8Array> {
  for (let from = 0; from < bytes.length; from += pieceSize) yield bytes.subarray(from, from + pieceSize);
}

function* inflate(packed: Uint8Array): Generator<Uint8Array> {
  let ready: Uint8Array[] = [];
  const inflater = new Inflate((piece) => ready.push(piece));
  for (let from = 0; from < packed.length; from += pieceSize) {
    const isLast = from + pieceSize >= packed.length;
    try {
      inflater.push(packed.subarray(from, from + pieceSize), isLast);
    } catch {
      throw damaged('A part cannot be unpacked.');
    }
    yield* ready;
    ready = [];
  }
}
