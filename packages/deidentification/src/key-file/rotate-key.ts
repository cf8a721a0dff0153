import { drawSecret } from '../pseudonyms/keyed-hash.ts';
import type { ReplacedCode } from '../preparation/month.ts';
import { CodeBook } from './code-book.ts';
import type { SiteKey } from './site-key.ts';

export interface KeyChange {
  readonly key: SiteKey;
  /** Codes for the registry to re-map, old to new, in one batch. */
  readonly replaced: readonly ReplacedCode[];
}

/**
 * A key with a new secret, and new codes for the people named. Everybody else is carried over when their record number is met again: the
 * older secret stays in the key file until then.
 *
 * @param keyId of the new secret; none that the key has had
 * @param localIds normalised record numbers of the people to carry over now
 * @throws RangeError when the key id was used before
 */
export async function rotateKey(key: SiteKey, keyId: string, localIds: readonly string[]): Promise<KeyChange> {
  if (key.generations.some((generation) => generation.keyId === keyId))
    throw new RangeError('a rotation needs a key id that was never used');
  const fresh = { keyId, secret: drawSecret(), codes: new Map<string, string>(), replacedBy: new Map<string, string>() };
  const book = await CodeBook.open({ ...key, generations: [fresh, ...key.generations] });
  for (const localId of localIds) await book.knownCodeOf(localId);
  return { key: book.close(), replaced: book.replacedCodes };
}
