/** What the running start says about itself, for commands beside it: `run.json` in the data folder. */
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';

const Run = z.object({
  /** Where browsers reach the product. */
  address: z.string(),
  mailAddress: z.string(),
  providerAddress: z.string(),
});
export type Run = z.infer<typeof Run>;

const fileIn = (dataFolder: string): string => join(dataFolder, 'run.json');

export function readRun(dataFolder: string): Run | undefined {
  return existsSync(fileIn(dataFolder)) ? Run.parse(JSON.parse(readFileSync(fileIn(dataFolder), 'utf8'))) : undefined;
}

export function writeRun(dataFolder: string, run: Run): void {
  writeFileSync(fileIn(dataFolder), JSON.stringify(run, null, 2), { mode: 0o600 });
}

export function removeRun(dataFolder: string): void {
  rmSync(fileIn(dataFolder), { force: true });
}
