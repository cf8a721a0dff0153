import type { Tx } from '../../database/as-actor.ts';
import type { FileKey } from './file-key.ts';

const pieceBytes = 1 << 20;

/**
 * The bytes of a file, each piece by a query of its own, so that several files can be gone through at once on one connection, which COPY does not
 * allow. As base64, because the driver makes text of whatever arrives, which is no loss only where it is text.
 */
export async function* readPieces(tx: Tx, id: string, file: FileKey): AsyncGenerator<Uint8Array> {
  for (let from = 1; ; from += pieceBytes) {
    const [row] = (await tx.query(
      "select encode(substring(content from $3 for $4), 'base64') as piece from submission_files where submission_id = $1 and table_key = $2",
      [id, file, from, pieceBytes],
    )) as { piece: string | null }[];
    if (!row?.piece) return;
    yield Buffer.from(row.piece, 'base64');
  }
}
