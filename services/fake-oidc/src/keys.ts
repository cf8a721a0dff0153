/** The provider's signing key and cookie keys, kept in a file of mode 600 when one is named. */
import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { exportJWK, generateKeyPair } from 'jose';
import { z } from 'zod';

const Keys = z.object({
  jwks: z.object({ keys: z.array(z.looseObject({ kty: z.literal('RSA'), kid: z.string() })).min(1) }),
  cookieKeys: z.array(z.string()).min(1),
});
export type ProviderKeys = z.infer<typeof Keys>;

async function makeKeys(): Promise<ProviderKeys> {
  const { privateKey } = await generateKeyPair('RS256', { extractable: true });
  const jwk = await exportJWK(privateKey);
  return {
    jwks: { keys: [{ ...jwk, kty: 'RSA', kid: randomBytes(8).toString('hex'), alg: 'RS256', use: 'sig' }] },
    cookieKeys: [randomBytes(32).toString('base64url')],
  };
}

/** The keys in `file`, made and written there the first time; fresh ones without a file. */
export async function providerKeys(file: string | undefined): Promise<ProviderKeys> {
  if (file !== undefined && existsSync(file)) return Keys.parse(JSON.parse(readFileSync(file, 'utf8')));
  const keys = await makeKeys();
  if (file !== undefined) writeFileSync(file, JSON.stringify(keys), { mode: 0o600 });
  return keys;
}
