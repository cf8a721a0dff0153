/** Locks the content of a key file with a passphrase: PBKDF2-HMAC-SHA-256 to AES-256-GCM, the header as additional data. */
import { fromBase64, toBase64 } from './base64.ts';
import { canonicalJson } from './canonical-json.ts';
import { requireHeader } from './key-file-header.ts';
import type { KeyFileHeader } from './key-file-header.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';

export interface SealedContent {
  readonly header: KeyFileHeader;
  /** Base64, the tag at its end. */
  readonly ciphertext: string;
}

/** A registry of one site, with tens of thousands of codes, is far smaller. */
const longestFile = 32_000_000;

const utf8 = new TextEncoder();

/** What is bound to the cipher text. */
export const additionalData = (header: KeyFileHeader): string => canonicalJson(header);

async function keyFrom(passphrase: string, { kdf }: KeyFileHeader): Promise<CryptoKey> {
  const base = await crypto.subtle.importKey('raw', utf8.encode(passphrase.normalize('NFKC')), 'PBKDF2', false, ['deriveKey']);
  const derivation = { name: 'PBKDF2', hash: 'SHA-256', iterations: kdf.iterations, salt: fromBase64(kdf.salt) };
  return crypto.subtle.deriveKey(derivation, base, { name: 'AES-GCM', length: 256 }, false, ['encrypt', 'decrypt']);
}

const cipherFor = (header: KeyFileHeader) => ({
  name: 'AES-GCM',
  iv: fromBase64(header.cipher.iv),
  additionalData: utf8.encode(additionalData(header)),
  tagLength: 128,
});

/** @throws KeyFileRefusal when the header asks for too little or too much work */
export async function seal(content: string, header: KeyFileHeader, passphrase: string): Promise<SealedContent> {
  requireHeader(header);
  const encrypted = await crypto.subtle.encrypt(cipherFor(header), await keyFrom(passphrase, header), utf8.encode(content));
  return { header, ciphertext: toBase64(new Uint8Array(encrypted)) };
}

/** @throws KeyFileRefusal when the passphrase is wrong or anything in the header or content was altered */
export async function unseal({ header, ciphertext }: SealedContent, passphrase: string): Promise<string> {
  requireHeader(header);
  const key = await keyFrom(passphrase, header);
  try {
    const content = await crypto.subtle.decrypt(cipherFor(header), key, fromBase64(ciphertext));
    return new TextDecoder('utf-8', { fatal: true }).decode(content);
  } catch {
    throw new KeyFileRefusal('cannot-be-opened');
  }
}

/** @throws KeyFileRefusal when the text is no key file, or its header asks for too little or too much work */
export function readSealed(file: string): SealedContent {
  if (file.length > longestFile) throw new KeyFileRefusal('not-a-key-file');
  let parsed: unknown;
  try {
    parsed = JSON.parse(file);
  } catch {
    throw new KeyFileRefusal('not-a-key-file');
  }
  const { header, ciphertext } = (parsed ?? {}) as Readonly<Record<string, unknown>>;
  if (typeof ciphertext !== 'string') throw new KeyFileRefusal('not-a-key-file');
  return { header: requireHeader(header), ciphertext };
}

export const writeSealed = (sealed: SealedContent): string => JSON.stringify(sealed, null, 1);
