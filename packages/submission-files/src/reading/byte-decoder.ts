/**
 * Bytes to text, piece by piece, with the encoding found from the content:
 * a byte order mark decides; without one, zero bytes in every other place mean UTF-16; else the first character beyond
 * ASCII decides between UTF-8 (when it is a well-formed sequence) and Windows-1252. A file that later breaks its own
 * encoding is refused rather than guessed at. The outcome does not depend on how the bytes are cut into pieces.
 */
import { foreignContent } from './foreign-content.ts';
import { invalidUtf8, sequenceLength, unfinishedTail } from './invalid-utf8.ts';
import { UnreadableFile } from './unreadable-file.ts';

export type Encoding = 'ascii' | 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';

const saveAsCsv = 'Save the table as CSV (UTF-8) in your spreadsheet program and send that file.';
const saveAsUtf8 = 'Save the file again as CSV (UTF-8), then compare names and special characters with the original.';

/** Bytes that Windows-1252 leaves undefined; the decoder turns them into control characters of the same number. */
const undefinedInWindows1252 = /[\u0081\u008d\u008f\u0090\u009d]/;

/** UTF-16 without a mark: the header's first two characters are ASCII, so every other byte is zero. */
function unmarkedUtf16(bytes: Uint8Array): Encoding | null {
  const [a = 0, b = 0, c = 0, d = 0] = bytes;
  if (bytes.length < 4) return null;
  if (a !== 0 && b === 0 && c !== 0 && d === 0) return 'utf-16le';
  return a === 0 && b !== 0 && c === 0 && d !== 0 ? 'utf-16be' : null;
}

function join(first: Uint8Array, second: Uint8Array): Uint8Array {
  if (first.length === 0) return second;
  const joined = new Uint8Array(first.length + second.length);
  joined.set(first);
  joined.set(second, first.length);
  return joined;
}

const nothing = new Uint8Array(0);

export class ByteDecoder {
  encoding: Encoding = 'ascii';
  private started = false;
  private wide: TextDecoder | null = null;
  private tail: Uint8Array = nothing;
  private readonly utf8 = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
  private readonly windows1252 = new TextDecoder('windows-1252');

  /**
   * @param piece The next bytes; the first piece must hold at least four unless the file is shorter.
   * @param last Whether the file ends here.
   * @param lineAfter The line of the file that is reached after this text of the piece; asked only when something is wrong.
   * @throws UnreadableFile
   */
  decode(piece: Uint8Array, last: boolean, lineAfter: (text: string) => number): string {
    const bytes = this.started ? piece : this.start(piece);
    const text = this.wide ? this.wide.decode(bytes, { stream: !last }) : this.decodeNarrow(join(this.tail, bytes), last, lineAfter);
    this.refuseDamage(text, lineAfter);
    return text;
  }

  /** Looks at the beginning of the file; returns the bytes behind a mark. */
  private start(bytes: Uint8Array): Uint8Array {
    this.started = true;
    const kind = foreignContent(bytes);
    if (kind) throw new UnreadableFile('F01', `The file is ${kind}, not CSV text.`, saveAsCsv, null);
    if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) {
      this.encoding = 'utf-8';
      return bytes.subarray(3);
    }
    const marked = bytes[0] === 0xff && bytes[1] === 0xfe ? 'utf-16le' : bytes[0] === 0xfe && bytes[1] === 0xff ? 'utf-16be' : null;
    const wide = marked ?? unmarkedUtf16(bytes);
    if (!wide) return bytes;
    this.encoding = wide;
    this.wide = new TextDecoder(wide, { ignoreBOM: true });
    return bytes.subarray(marked ? 2 : 0);
  }

  private decodeNarrow(bytes: Uint8Array, last: boolean, lineAfter: (text: string) => number): string {
    if (this.encoding === 'windows-1252') return this.windows1252.decode(bytes);
    const kept = last ? 0 : unfinishedTail(bytes);
    const whole = bytes.subarray(0, bytes.length - kept);
    const bad = this.firstInvalid(whole);
    if (typeof bad === 'string') {
      this.tail = bytes.slice(bytes.length - kept);
      if (this.encoding === 'ascii' && bad.length !== whole.length) this.encoding = 'utf-8';
      return bad;
    }
    const firstBeyondAscii = whole.findIndex((byte) => byte >= 0x80);
    if (this.encoding === 'utf-8' || sequenceLength(whole, firstBeyondAscii) > 0) {
      const before = this.windows1252.decode(whole.subarray(0, bad));
      throw new UnreadableFile(
        'F02',
        'The file mixes two encodings: it begins as UTF-8 and has a byte here that UTF-8 does not allow.',
        saveAsUtf8,
        lineAfter(before),
      );
    }
    this.encoding = 'windows-1252';
    this.tail = nothing;
    return this.windows1252.decode(bytes);
  }

  /** The decoded text, or the index of the first byte that is not UTF-8. */
  private firstInvalid(bytes: Uint8Array): string | number {
    try {
      return this.utf8.decode(bytes);
    } catch {
      return invalidUtf8(bytes);
    }
  }

  private refuseDamage(text: string, lineAfter: (text: string) => number): void {
    const zero = text.indexOf('\0');
    if (zero >= 0)
      throw new UnreadableFile('F01', 'The file holds zero bytes, which no CSV text has.', saveAsCsv, lineAfter(text.slice(0, zero)));
    const lost = text.indexOf('\ufffd');
    if (lost >= 0)
      throw new UnreadableFile('F02', 'A character was lost before the file reached us.', saveAsUtf8, lineAfter(text.slice(0, lost)));
    if (this.encoding !== 'windows-1252') return;
    const unknown = text.search(undefinedInWindows1252);
    if (unknown < 0) return;
    throw new UnreadableFile(
      'F02',
      'A byte belongs to none of the encodings that are read here (UTF-8, UTF-16, Windows-1252).',
      saveAsUtf8,
      lineAfter(text.slice(0, unknown)),
    );
  }
}
