/** Secrets of one data folder, drawn once and kept in a file that only its owner reads. */
import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';

const draw = (): string => randomBytes(32).toString('base64url');
const Secret = z.string().min(32).default(draw);

const Secrets = z.object({
  databaseAdminPassword: Secret,
  databaseLoginPassword: Secret,
  sessionSecret: Secret,
  oidcClientSecret: Secret,
  /** Of the demonstration's site systems, which submit without a person. */
  siteSystemSecret: Secret,
});
export type Secrets = Readonly<z.infer<typeof Secrets>>;

/** Reads `secrets.json` of the folder, drawing what it does not hold yet. */
export function secretsOf(dataFolder: string): Secrets {
  const file = join(dataFolder, 'secrets.json');
  const known: unknown = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {};
  const secrets = Secrets.parse(known);
  // Written aside and moved into place: a start that dies here leaves either the old file or the new one.
  writeFileSync(`${file}.new`, JSON.stringify(secrets, null, 2), { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return secrets;
}
