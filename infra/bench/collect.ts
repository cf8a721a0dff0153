/** Finds the scenarios: modules that export `scenarios`, in infra/bench/scenarios and in the packages' bench folders. */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { z } from 'zod';
import type { Scenario } from './scenario.ts';

const Module = z.object({
  scenarios: z.array(
    z.custom<Scenario>((value) => typeof (value as Scenario).name === 'string' && typeof (value as Scenario).run === 'function'),
  ),
});

/** A bench folder also holds scripts that measure as soon as they are imported. */
const exportsScenarios = (file: string): boolean => /^export const scenarios\b/m.test(readFileSync(file, 'utf8'));

export async function collectScenarios(root: string): Promise<Scenario[]> {
  const packages = join(root, 'packages');
  const folders = [join(root, 'infra/bench/scenarios'), ...readdirSync(packages).map((name) => join(packages, name, 'bench'))];
  const files = folders
    .filter((folder) => existsSync(folder))
    .flatMap((folder) => readdirSync(folder).map((name) => join(folder, name)))
    .filter((file) => file.endsWith('.ts') && exportsScenarios(file));
  const found: Scenario[] = [];
  for (const file of files.sort()) found.push(...Module.parse(await import(pathToFileURL(file).href)).scenarios);
  return found;
}
