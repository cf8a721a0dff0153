/**
 * The bytes of a file as they were sent, by COPY in its binary format: the driver makes text of what a query answers, which takes as long as
 * reading the file.
 */
import { finished } from 'node:stream/promises';
import type { PoolClient } from 'pg';
import { to as copyTo } from 'pg-copy-streams';
import type { Tx } from '../../database/as-actor.ts';
import type { FileKey } from './file-key.ts';

/** Before the one value (PostgreSQL documentation, COPY, "Binary Format"): signature 11, flags 4, extension 4, number of fields 2, length 4 bytes. */
const headerBytes = 25;
const lengthAt = 21;

/** Piece by piece, so that memory does not grow with the file. Nothing when it is not there or has been emptied. */
export async function* readContent(tx: Tx, id: string, file: FileKey): AsyncGenerator<Uint8Array> {
  const client = (await tx.queryRunner?.connect()) as PoolClient;
  const [ofSubmission, ofFile] = [id, file].map((value) => client.escapeLiteral(value));
  const select = `select content from submission_files where submission_id = ${ofSubmission} and table_key = ${ofFile}`;
  const stream = client.query(copyTo(`copy (${select}) to stdout (format binary)`));
  let header = Buffer.alloc(0);
  let left = -1;
  try {
    for await (const chunk of stream.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
      let bytes = chunk;
      if (left < 0) {
        header = Buffer.concat([header, bytes]);
        if (header.length < headerBytes) continue;
        // -1 for a file without content.
        left = Math.max(header.readInt32BE(lengthAt), 0);
        bytes = header.subarray(headerBytes);
      }
      const piece = bytes.subarray(0, left);
      left -= piece.length;
      if (piece.length > 0) yield piece;
    }
  } finally {
    // Whoever stops reading early goes on with the same connection, which first has to hear the rest.
    stream.resume();
    await finished(stream).catch(() => undefined);
  }
}
