/** One number for the contents of many files: the same files with the same words have the same hash, whatever their dates. */
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';

function* filesBelow(path: string, isLeftOut: (path: string) => boolean): Generator<string> {
  if (isLeftOut(path) || !existsSync(path)) return;
  if (!statSync(path).isDirectory()) {
    yield path;
    return;
  }
  for (const name of readdirSync(path).sort()) yield* filesBelow(join(path, name), isLeftOut);
}

/**
 * SHA-256 over names and contents of the files at or below `paths`, hexadecimal.
 * @param root names count relative to it
 * @param isLeftOut files and folders that do not count
 */
export function contentHash(root: string, paths: readonly string[], isLeftOut: (path: string) => boolean = () => false): string {
  const hash = createHash('sha256');
  for (const path of paths) {
    for (const file of filesBelow(join(root, path), isLeftOut)) {
      const content = readFileSync(file);
      hash.update(`${relative(root, file)}\0${content.byteLength}\0`).update(content);
    }
  }
  return hash.digest('hex');
}
