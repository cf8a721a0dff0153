import { setImmediate as nextTurn } from 'node:timers/promises';

/** All pieces of a file. Between them others get their turn: a large workbook takes seconds to write. */
export async function allOf(pieces: AsyncIterable<Uint8Array>): Promise<Buffer> {
  const all: Uint8Array[] = [];
  for await (const piece of pieces) {
    all.push(piece);
    await nextTurn();
  }
  return Buffer.concat(all);
}
