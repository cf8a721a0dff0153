import type { ReadLimits } from '../limits.ts';
import type { ByteSource } from './byte-source.ts';
import { UnreadableFile } from './unreadable-file.ts';

/** Small pieces are put together, so that a sender of single bytes does not make every one a piece of work. */
const pieceSize = 65_536;

export interface Piece {
  readonly bytes: Uint8Array;
  readonly last: boolean;
}

/**
 * The bytes of a file in pieces of a workable size, counted against the limit as they arrive.
 * @throws UnreadableFile as soon as there are more bytes than allowed.
 */
export async function* gatherBytes(source: ByteSource, limits: ReadLimits): AsyncGenerator<Piece> {
  let total = 0;
  let held = new Uint8Array(pieceSize);
  let filled = 0;
  const count = (bytes: number): void => {
    total += bytes;
    if (total > limits.bytes)
      throw new UnreadableFile(
        'F03',
        `The file is larger than ${(limits.bytes / 1_000_000).toLocaleString('en')} MB.`,
        'Send the month in smaller parts.',
        null,
      );
  };

  const chunks = source instanceof Uint8Array ? piecesOf(source) : source;
  for await (const chunk of chunks) {
    count(chunk.length);
    let from = 0;
    while (from < chunk.length) {
      const taken = Math.min(chunk.length - from, pieceSize - filled);
      held.set(chunk.subarray(from, from + taken), filled);
      filled += taken;
      from += taken;
      if (filled === pieceSize) {
        yield { bytes: held, last: false };
        held = new Uint8Array(pieceSize);
        filled = 0;
      }
    }
  }
  yield { bytes: held.subarray(0, filled), last: true };
}

async function* piecesOf(bytes: Uint8Array): AsyncGenerator<Uint8Array> {
  for (let from = 0; from < bytes.length; from += pieceSize) yield bytes.subarray(from, from + pieceSize);
}
