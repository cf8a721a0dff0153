/**
 * What this data folder knows about filling databases with demonstration data: `seeded.json`. The seed fills an empty
 * registry in many transactions, and in a filled one binds the demonstration's people to the local provider's address.
 */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';

const Seeds = z.record(z.string(), z.union([z.literal('begun'), z.object({ providerAddress: z.string() })]));
type Seeds = z.infer<typeof Seeds>;

const fileIn = (dataFolder: string): string => join(dataFolder, 'seeded.json');
const read = (dataFolder: string): Seeds =>
  existsSync(fileIn(dataFolder)) ? Seeds.parse(JSON.parse(readFileSync(fileIn(dataFolder), 'utf8'))) : {};

/**
 * What the seed still has to do in the database with this identity: "all" of it, only "people" because the provider's
 * address has changed, nothing, or all of it "anew" because it was broken off before it was through.
 */
export function seedNeeded(dataFolder: string, identity: string, providerAddress: string): 'all' | 'people' | 'nothing' | 'anew' {
  const known = read(dataFolder)[identity];
  if (known === undefined) return 'all';
  if (known === 'begun') return 'anew';
  return known.providerAddress === providerAddress ? 'nothing' : 'people';
}

const note = (dataFolder: string, identity: string, seed: Seeds[string]): void =>
  writeFileSync(fileIn(dataFolder), JSON.stringify({ ...read(dataFolder), [identity]: seed }, null, 2));

export const noteSeedBegun = (dataFolder: string, identity: string): void => note(dataFolder, identity, 'begun');

export const noteSeedDone = (dataFolder: string, identity: string, providerAddress: string): void =>
  note(dataFolder, identity, { providerAddress });
