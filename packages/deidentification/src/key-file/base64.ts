/** Bytes as base64 and back, with what both browsers and Node have. */

export function toBase64(bytes: Uint8Array): string {
  let binary = '';
  for (const byte of bytes) binary += String.fromCharCode(byte);
  return btoa(binary);
}

/** @throws RangeError when the text is not canonical base64 */
export function fromBase64(text: string): Uint8Array<ArrayBuffer> {
  if (!/^[A-Za-z0-9+/]*={0,2}$/.test(text) || text.length % 4 !== 0) throw new RangeError('not base64');
  const bytes = Uint8Array.from(atob(text), (character) => character.charCodeAt(0));
  if (toBase64(bytes) !== text) throw new RangeError('not base64');
  return bytes;
}
