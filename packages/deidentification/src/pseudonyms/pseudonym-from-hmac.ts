import { hmacKey, keyedHash } from './keyed-hash.ts';
import type { SiteSecret } from './keyed-hash.ts';
import { codeFromBits } from './participant-code.ts';

const purpose = 'sci-gait-pid';
const recipe = '1';

/**
 * The code that follows from a record number and the site's secret. Under 45 CFR 164.514(c) such a code is derived from information about
 * the person, so a site that works by Safe Harbor draws random codes instead.
 *
 * @param idType kind of record number, such as `mrn`: the same digits of another kind are another person
 * @param localId normalised
 * @throws RangeError when site, kind or number is empty or holds U+001F, or the secret is not 32 bytes long
 */
export async function pseudonymFromHmac(secret: SiteSecret | CryptoKey, site: string, idType: string, localId: string): Promise<string> {
  const key = secret instanceof Uint8Array ? await hmacKey(secret) : secret;
  return codeFromBits(await keyedHash(key, [purpose, recipe, site, idType, localId]));
}
