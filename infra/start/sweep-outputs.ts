/** The compiler never deletes: what it made of a source that is gone would still run, a removed migration for instance. */
import { existsSync, readdirSync, rmSync } from 'node:fs';
import { join, relative } from 'node:path';

const output = /\.(js|js\.map|d\.ts)$/;

/** Deletes the outputs in `<project>/dist` that have no source in `<project>/src`. Returns what was deleted. */
export function sweepOutputs(project: string): string[] {
  const dist = join(project, 'dist');
  if (!existsSync(dist)) return [];
  const orphans = readdirSync(dist, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && output.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name))
    .filter((file) => {
      const source = join(project, 'src', relative(dist, file).replace(output, ''));
      return !['.ts', '.tsx'].some((ending) => existsSync(source + ending));
    });
  for (const file of orphans) rmSync(file);
  return orphans;
}
