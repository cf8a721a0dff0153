/** How the parts of a workbook find each other (ECMA-376-2, 6.5: relationships). */
import { damaged } from '../../zip/damaged.ts';
import type { ZipDirectory, ZipEntry } from '../../zip/zip-directory.ts';
import { scanPart } from './scan-part.ts';

export interface Relationship {
  readonly id: string;
  /** The last word of its type: `worksheet`, `styles`. What stands before differs between the two forms of the standard. */
  readonly kind: string;
  /** Path of the part in the archive. */
  readonly path: string;
}

/** No workbook within the limits comes near it. */
const mostRelationships = 10_000;

/** A target as a path from the root of the archive. */
function resolve(target: string, folder: string): string {
  const path = target.startsWith('/') ? target.slice(1) : folder + target;
  const segments: string[] = [];
  for (const segment of path.split('/')) {
    if (segment === '..') segments.pop();
    else if (segment !== '.' && segment !== '') segments.push(segment);
  }
  return segments.join('/');
}

/**
 * What a part refers to inside the workbook; links to elsewhere are left out.
 * @param part Path of the part; '' for the workbook as a whole.
 */
export function relationshipsOf(directory: ZipDirectory, part: string): readonly Relationship[] {
  const nameStart = part.lastIndexOf('/') + 1;
  const folder = part.slice(0, nameStart);
  const entry = directory.get(`${folder}_rels/${part.slice(nameStart)}.rels`.toLowerCase());
  const found: Relationship[] = [];
  if (!entry) return found;
  scanPart(entry, {
    open(name, attributes) {
      if (name !== 'Relationship' || attributes.get('TargetMode') === 'External') return;
      const type = attributes.get('Type') ?? '';
      found.push({
        id: attributes.get('Id') ?? '',
        kind: type.slice(type.lastIndexOf('/') + 1),
        path: resolve(attributes.get('Target') ?? '', folder),
      });
      if (found.length > mostRelationships) throw damaged('Its parts refer to more parts than there can be.');
    },
    text() {},
    close() {},
  });
  return found;
}

/** @throws UnreadableFile when a part that is referred to is not there. */
export function partAt(directory: ZipDirectory, path: string): ZipEntry {
  const entry = directory.get(path.toLowerCase());
  if (!entry) throw damaged('A part of it is missing.');
  return entry;
}
