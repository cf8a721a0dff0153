import { Zip, ZipDeflate } from 'fflate';

/** One file of an archive, in pieces as they come. */
export interface ZipPart {
  readonly name: string;
  readonly content: Iterable<string> | AsyncIterable<string>;
}

/** Between fflate's fastest and its usual: on sheets a third faster than the usual level 6, and 2% larger. */
const level = 4;
/** The same content gives the same bytes whenever it is written: every file is of the first day that zip can tell. */
const firstDay = new Date(1980, 0, 1);
/** Small pieces are put together before they are packed. */
const pieceLength = 65_536;

/** Packs files one after the other into an archive, in UTF-8, and gives it away piece by piece. */
export async function* writeZip(parts: Iterable<ZipPart> | AsyncIterable<ZipPart>): AsyncGenerator<Uint8Array> {
  const encoder = new TextEncoder();
  let ready: Uint8Array[] = [];
  const taken = (): Uint8Array[] => {
    const pieces = ready;
    ready = [];
    return pieces;
  };
  const zip = new Zip((error, piece) => {
    if (error) throw error;
    ready.push(piece);
  });
  for await (const { name, content } of parts) {
    const file = new ZipDeflate(name, { level });
    file.mtime = firstDay;
    zip.add(file);
    for await (const piece of gathered(content)) {
      file.push(encoder.encode(piece), false);
      yield* taken();
    }
    file.push(new Uint8Array(0), true);
  }
  zip.end();
  yield* taken();
}

async function* gathered(content: Iterable<string> | AsyncIterable<string>): AsyncGenerator<string> {
  let held = '';
  for await (const piece of content) {
    held += piece;
    if (held.length < pieceLength) continue;
    yield held;
    held = '';
  }
  yield held;
}
