/** A site's key file as its coordinator has it from the months before. */
import { createKeyFile, normaliseLocalId, saveKeyFile } from '../../../packages/deidentification/src/index.ts';
import type { SiteKey } from '../../../packages/deidentification/src/index.ts';
import { hmacKey, keyedHash } from '../../../packages/deidentification/src/pseudonyms/keyed-hash.ts';

export const passphrase = 'bafo rina tuke sobi malu pegi';

export interface KeyFile {
  readonly name: string;
  readonly mimeType: string;
  readonly buffer: Buffer;
}

/** As `Buffer`s are handed to a file chooser. */
export const keyFile = (text: string, name = 'site-key.json'): KeyFile => ({
  name,
  mimeType: 'application/json',
  buffer: Buffer.from(text),
});

/**
 * @param codes Codes that the registry holds of the site, each given to an invented record number.
 */
export async function siteKey(site: string, codes: readonly string[]): Promise<{ readonly key: SiteKey; readonly file: string }> {
  const { key } = await createKeyFile({ site, keyId: '2026-01' }, passphrase);
  const [{ secret }] = key.generations;
  const hmac = await hmacKey(secret);
  const remembered = new Map<string, string>();
  for (const [index, code] of codes.entries()) {
    const number = normaliseLocalId(`H${9_000_000 + index}`, key.normalisation);
    const hash = await keyedHash(hmac, ['sci-gait-lookup', '1', site, key.idType, number]);
    remembered.set(Buffer.from(hash.subarray(0, 16)).toString('base64'), code);
  }
  return saveKeyFile(
    {
      ...key,
      revision: 10,
      generations: [{ ...key.generations[0], codes: remembered }],
      people: new Map(codes.map((code) => [code, { indexDate: '2025-03-03' }])),
    },
    passphrase,
  );
}
