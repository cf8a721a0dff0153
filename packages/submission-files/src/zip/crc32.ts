/** Checksums of the 256 bytes, from the polynomial of ZIP and PNG, bits reversed (ISO 3309; PKWARE APPNOTE 4.4.7). */
const table = Uint32Array.from({ length: 256 }, (_, byte) => {
  let checksum = byte;
  for (let bit = 0; bit < 8; bit += 1) checksum = checksum & 1 ? (checksum >>> 1) ^ 0xedb88320 : checksum >>> 1;
  return checksum;
});

/**
 * The CRC-32 of bytes; own, because fflate keeps its to itself.
 * @param before The checksum of the bytes in front of these, 0 at the beginning.
 */
export function crc32(bytes: Uint8Array, before = 0): number {
  let checksum = ~before;
  for (let at = 0; at < bytes.length; at += 1) checksum = (checksum >>> 8) ^ (table[(checksum ^ (bytes[at] ?? 0)) & 0xff] ?? 0);
  return ~checksum >>> 0;
}
