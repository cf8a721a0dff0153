/** A site's key file as its coordinator has it from the months before. */
import { adoptCodes, createKeyFile, saveKeyFile } from '../../../packages/deidentification/src/index.ts';
import type { SiteKey } from '../../../packages/deidentification/src/index.ts';

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
  const known = await adoptCodes(
    key,
    codes.map((code, index) => ({ localId: `H${9_000_000 + index}`, code, indexDate: '2025-03-03' })),
  );
  return saveKeyFile({ ...known, revision: 10 }, passphrase);
}
