/** Zip archives for tests, with every field of the headers open to lies. */
import { deflateSync } from 'fflate';
import { crc32 } from '../zip/crc32.ts';

export interface ZipDraft {
  readonly name: string;
  readonly content?: string | Uint8Array;
  /** What the headers say instead of the truth. */
  readonly claims?: {
    readonly size?: number;
    readonly packedSize?: number;
    readonly crc?: number;
    readonly localName?: string;
    readonly offset?: number;
    readonly flags?: number;
    readonly method?: number;
    /** Unix file mode, as a Unix program writes it. */
    readonly mode?: number;
  };
}

const encode = (text: string): Uint8Array => new TextEncoder().encode(text);

export function joined(pieces: readonly Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(pieces.reduce((sum, { length }) => sum + length, 0));
  let at = 0;
  for (const piece of pieces) {
    whole.set(piece, at);
    at += piece.length;
  }
  return whole;
}

/** Little-endian numbers of 2 or 4 bytes: `[value, bytes]`. */
function record(...fields: readonly (readonly [value: number, bytes: 2 | 4])[]): Uint8Array {
  return Uint8Array.from(fields.flatMap(([value, bytes]) => Array.from({ length: bytes }, (_, index) => (value >>> (8 * index)) & 0xff)));
}

export function makeZip(drafts: readonly ZipDraft[], comment = ''): Uint8Array {
  const pieces: Uint8Array[] = [];
  const listed: Uint8Array[] = [];
  let offset = 0;
  for (const { name, content = '', claims = {} } of drafts) {
    const bytes = typeof content === 'string' ? encode(content) : content;
    const packed = deflateSync(bytes);
    const { flags = 0, method = 8, crc = crc32(bytes), packedSize = packed.length, size = bytes.length, mode } = claims;
    const localName = encode(claims.localName ?? name);
    const listedName = encode(name);
    const common = [
      [flags, 2],
      [method, 2],
      [0, 4],
      [crc, 4],
      [packedSize, 4],
      [size, 4],
    ] as const;
    const local = joined([record([0x04034b50, 4], [20, 2], ...common, [localName.length, 2], [0, 2]), localName, packed]);
    listed.push(
      record(
        [0x02014b50, 4],
        [mode === undefined ? 20 : (3 << 8) | 20, 2],
        [20, 2],
        ...common,
        [listedName.length, 2],
        [0, 2],
        [0, 2],
        [0, 2],
        [0, 2],
        [((mode ?? 0) << 16) >>> 0, 4],
        [claims.offset ?? offset, 4],
      ),
      listedName,
    );
    pieces.push(local);
    offset += local.length;
  }
  const directory = joined(listed);
  const end = record(
    [0x06054b50, 4],
    [0, 2],
    [0, 2],
    [drafts.length, 2],
    [drafts.length, 2],
    [directory.length, 4],
    [offset, 4],
    [comment.length, 2],
  );
  return joined([...pieces, directory, end, encode(comment)]);
}
