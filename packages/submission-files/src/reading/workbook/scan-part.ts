import { MalformedXml } from '../../xml/malformed-xml.ts';
import { XmlScanner } from '../../xml/xml-scanner.ts';
import type { XmlHandler } from '../../xml/xml-scanner.ts';
import { damaged } from '../../zip/damaged.ts';
import { unpack } from '../../zip/unpack.ts';
import type { ZipEntry } from '../../zip/zip-directory.ts';

/** Handles the elements of one part of a workbook. */
export interface PartHandler extends XmlHandler {
  /** Row of the sheet that is being read; null in parts that have none. */
  readonly line?: number | null;
  /** Whether the rest of the part does not matter any more. */
  readonly isDone?: boolean;
}

/** Parts are in UTF-8 or UTF-16 (ECMA-376-1, 8.1); without a mark in UTF-8. */
function decoderFor(beginning: Uint8Array): TextDecoder {
  const [first, second] = beginning;
  const encoding = first === 0xff && second === 0xfe ? 'utf-16le' : first === 0xfe && second === 0xff ? 'utf-16be' : 'utf-8';
  return new TextDecoder(encoding, { fatal: true });
}

/**
 * Unpacks, decodes and scans a part; stops behind each piece, so that what was read can be taken.
 * @throws UnreadableFile where the part is damaged, with the row that was reached.
 */
export function* scanPieces(entry: ZipEntry, handler: PartHandler): Generator<void> {
  const scanner = new XmlScanner(handler);
  let decoder: TextDecoder | null = null;
  try {
    for (const piece of unpack(entry)) {
      decoder ??= decoderFor(piece);
      scanner.push(decoder.decode(piece, { stream: true }), false);
      if (handler.isDone) return;
      yield;
    }
    scanner.push(decoder?.decode() ?? '', true);
  } catch (error) {
    if (error instanceof MalformedXml) throw damaged(error.message, handler.line ?? null);
    if (error instanceof TypeError) throw damaged('A part has a character that its encoding does not have.', handler.line ?? null);
    throw error;
  }
}

/** Scans a part to its end at once. */
export function scanPart(entry: ZipEntry, handler: PartHandler): void {
  for (const _ of scanPieces(entry, handler));
}
