/** Which databases this data folder has filled with demonstration data: `seeded.json`. */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';

const Identities = z.array(z.string());
const fileIn = (dataFolder: string): string => join(dataFolder, 'seeded.json');
const read = (dataFolder: string): string[] =>
  existsSync(fileIn(dataFolder)) ? Identities.parse(JSON.parse(readFileSync(fileIn(dataFolder), 'utf8'))) : [];

export const isSeeded = (dataFolder: string, identity: string): boolean => read(dataFolder).includes(identity);

export function noteSeeded(dataFolder: string, identity: string): void {
  writeFileSync(fileIn(dataFolder), JSON.stringify([...new Set([...read(dataFolder), identity])]));
}
