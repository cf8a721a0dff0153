import { strFromU8, unzipSync } from 'fflate';
import { joined } from './make-zip.ts';

/** All pieces of a file together. */
export async function whole(pieces: AsyncIterable<Uint8Array>): Promise<Uint8Array> {
  const all: Uint8Array[] = [];
  for await (const piece of pieces) all.push(piece);
  return joined(all);
}

/** The parts of a workbook as text, by path. */
export function partsOf(bytes: Uint8Array): Readonly<Record<string, string>> {
  return Object.fromEntries(Object.entries(unzipSync(bytes)).map(([name, content]) => [name, strFromU8(content)]));
}

/** Attributes of all elements of a name, in the order of the part. */
export function elements(xml: string, name: string): readonly Readonly<Record<string, string>>[] {
  return [...xml.matchAll(new RegExp(`<${name}\\b([^>]*?)/?>`, 'g'))].map(([, attributes = '']) =>
    Object.fromEntries([...attributes.matchAll(/([\w:]+)="([^"]*)"/g)].map(([, key = '', value = '']) => [key, value])),
  );
}
