import type { NormalisationOptions } from '../pseudonyms/normalisation-options.ts';
import { usualNormalisation } from '../pseudonyms/normalise-local-id.ts';
import { drawSecret } from '../pseudonyms/keyed-hash.ts';
import { toBase64 } from './base64.ts';
import { ivBytes, iterationLimits, saltBytes } from './key-file-header.ts';
import type { KeyFileHeader } from './key-file-header.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';
import { requirePassphrase } from './passphrase.ts';
import { readSealed, seal, unseal, writeSealed } from './seal.ts';
import { contentOf, keyFromContent } from './site-key-content.ts';
import type { PseudonymMode, SiteKey } from './site-key.ts';

export interface KeySettings {
  readonly site: string;
  /** Names the secret, such as `2026-01`; another one comes with each rotation. */
  readonly keyId: string;
  readonly mode?: PseudonymMode;
  readonly idType?: string;
  readonly normalisation?: NormalisationOptions;
}

export interface SavedKey {
  /** The key as it now stands in the file. */
  readonly key: SiteKey;
  /** The text of the file. */
  readonly file: string;
}

/** A new key with a fresh secret, and its file. Codes are random unless the site's agreement says otherwise. */
export async function createKeyFile(settings: KeySettings, passphrase: string): Promise<SavedKey> {
  const { site, keyId, mode = 'random', idType = 'mrn', normalisation = usualNormalisation } = settings;
  const key: SiteKey = {
    site,
    revision: 0,
    mode,
    idType,
    normalisation,
    generations: [{ keyId, secret: drawSecret(), codes: new Map(), replacedBy: new Map() }],
    people: new Map(),
    matches: new Map(),
    idLengths: new Map(),
  };
  return saveKeyFile(key, passphrase);
}

const drawBase64 = (bytes: number): string => toBase64(crypto.getRandomValues(new Uint8Array(bytes)));

/**
 * Writes a key with the next revision number, under a fresh salt and initialisation vector.
 *
 * @throws KeyFileRefusal when the passphrase is too short, or the iterations are out of bounds
 */
export async function saveKeyFile(key: SiteKey, passphrase: string, iterations: number = iterationLimits.usual): Promise<SavedKey> {
  requirePassphrase(passphrase);
  const saved: SiteKey = { ...key, revision: key.revision + 1 };
  const header: KeyFileHeader = {
    format: 'sci-gait-site-key',
    version: 1,
    site: key.site,
    keyId: key.generations[0].keyId,
    kdf: { name: 'PBKDF2', hash: 'SHA-256', iterations, salt: drawBase64(saltBytes) },
    cipher: { name: 'AES-GCM', keyBits: 256, tagBits: 128, iv: drawBase64(ivBytes) },
  };
  return { key: saved, file: writeSealed(await seal(contentOf(saved), header, passphrase)) };
}

export interface Expectation {
  /** The site whose key it has to be. */
  readonly site: string;
  /** Highest revision known to have been saved; an older file lacks people and would give them a second code. */
  readonly revision?: number;
}

/**
 * Opens a key file. What can be seen to be wrong is refused before the passphrase is worked on.
 *
 * @throws KeyFileRefusal
 */
export async function openKeyFile(file: string, passphrase: string, expected: Expectation): Promise<SiteKey> {
  const sealed = readSealed(file);
  const { site, keyId } = sealed.header;
  if (site !== expected.site) throw new KeyFileRefusal('other-site');
  const key = keyFromContent(await unseal(sealed, passphrase), site, keyId);
  if (key.revision < (expected.revision ?? 0)) throw new KeyFileRefusal('older-file');
  return key;
}
