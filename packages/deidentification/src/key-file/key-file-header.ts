/** The readable part of a key file: whose it is and how it is protected. All of it is bound to the cipher text. */
import { fromBase64 } from './base64.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';

/** OWASP Password Storage cheat sheet (2026): 600,000 iterations of PBKDF2-HMAC-SHA-256 at the least. Beyond the most, opening is a trap. */
export const iterationLimits = { least: 600_000, usual: 1_000_000, most: 10_000_000 } as const;
export const saltBytes = 16;
/** NIST SP 800-38D: 96 bits for AES-GCM. */
export const ivBytes = 12;

export interface KeyFileHeader {
  readonly format: 'sci-gait-site-key';
  readonly version: 1;
  readonly site: string;
  readonly keyId: string;
  readonly kdf: { readonly name: 'PBKDF2'; readonly hash: 'SHA-256'; readonly iterations: number; readonly salt: string };
  readonly cipher: { readonly name: 'AES-GCM'; readonly keyBits: 256; readonly tagBits: 128; readonly iv: string };
}

const isObject = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;

function isBytes(value: unknown, fits: (length: number) => boolean): boolean {
  if (typeof value !== 'string' || value.length > 200) return false;
  try {
    return fits(fromBase64(value).length);
  } catch {
    return false;
  }
}

/**
 * Checks a header before any costly work is done.
 *
 * @throws KeyFileRefusal
 */
export function requireHeader(header: unknown): KeyFileHeader {
  if (!isObject(header) || header['format'] !== 'sci-gait-site-key') throw new KeyFileRefusal('not-a-key-file');
  if (header['version'] !== 1) throw new KeyFileRefusal('unknown-version');
  const { site, keyId, kdf, cipher } = header;
  const isComplete =
    typeof site === 'string' &&
    typeof keyId === 'string' &&
    isObject(kdf) &&
    kdf['name'] === 'PBKDF2' &&
    kdf['hash'] === 'SHA-256' &&
    isBytes(kdf['salt'], (length) => length >= saltBytes) &&
    isObject(cipher) &&
    cipher['name'] === 'AES-GCM' &&
    cipher['keyBits'] === 256 &&
    cipher['tagBits'] === 128 &&
    isBytes(cipher['iv'], (length) => length === ivBytes);
  if (!isComplete) throw new KeyFileRefusal('not-a-key-file');
  requireIterations(kdf['iterations']);
  return header as unknown as KeyFileHeader;
}

/** @throws KeyFileRefusal */
export function requireIterations(iterations: unknown): void {
  if (typeof iterations !== 'number' || !Number.isSafeInteger(iterations)) throw new KeyFileRefusal('not-a-key-file');
  if (iterations < iterationLimits.least) throw new KeyFileRefusal('too-few-iterations');
  if (iterations > iterationLimits.most) throw new KeyFileRefusal('too-many-iterations');
}
