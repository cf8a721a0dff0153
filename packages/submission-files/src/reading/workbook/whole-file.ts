import type { ReadLimits } from '../../limits.ts';
import { joined } from '../../zip/joined.ts';
import type { ByteSource } from '../byte-source.ts';
import { gatherBytes } from '../gather-bytes.ts';

/** A zip archive is read from its end, so that its bytes must all be there first; no more of them than allowed are kept. */
export async function wholeFile(source: ByteSource, limits: ReadLimits): Promise<Uint8Array> {
  const pieces: Uint8Array[] = [];
  for await (const { bytes } of gatherBytes(source, limits)) pieces.push(bytes);
  return joined(pieces);
}
