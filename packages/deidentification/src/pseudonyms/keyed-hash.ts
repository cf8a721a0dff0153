/** HMAC-SHA-256 of several parts, kept apart by a character that none of them may hold. */

const separator = '\u001f';
const secretBytes = 32;

/** 32 bytes that only the site knows. */
export type SiteSecret = Uint8Array<ArrayBuffer>;

export function drawSecret(): SiteSecret {
  return crypto.getRandomValues(new Uint8Array(secretBytes));
}

/** @throws RangeError when the secret is not 32 bytes long */
export async function hmacKey(secret: SiteSecret): Promise<CryptoKey> {
  if (secret.length !== secretBytes) throw new RangeError(`a secret has ${secretBytes} bytes`);
  return crypto.subtle.importKey('raw', secret, { name: 'HMAC', hash: 'SHA-256' }, false, ['sign']);
}

/** @throws RangeError when a part is empty or holds the separator */
export async function keyedHash(key: CryptoKey, parts: readonly string[]): Promise<Uint8Array<ArrayBuffer>> {
  if (parts.some((part) => part === '' || part.includes(separator)))
    throw new RangeError('a part of the message is empty or holds the separator');
  const message = new TextEncoder().encode(parts.join(separator));
  return new Uint8Array(await crypto.subtle.sign('HMAC', key, message));
}
