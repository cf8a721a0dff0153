/**
 * Finds where bytes stop being UTF-8 (RFC 3629, table of section 4).
 *
 * Returns the index of the first byte of the first ill-formed sequence, or -1. A sequence that is cut off by the end of
 * the bytes counts as ill-formed.
 */
export function invalidUtf8(bytes: Uint8Array): number {
  let at = 0;
  while (at < bytes.length) {
    const length = sequenceLength(bytes, at);
    if (length === 0) return at;
    at += length;
  }
  return -1;
}

/** Bytes of the well-formed UTF-8 sequence that begins at `at` (1 to 4), or 0 when none does. */
export function sequenceLength(bytes: Uint8Array, at: number): number {
  const lead = bytes[at] ?? 0;
  if (lead < 0x80) return 1;
  if (lead < 0xc2 || lead > 0xf4) return 0;
  const length = lead < 0xe0 ? 2 : lead < 0xf0 ? 3 : 4;
  // The second byte has narrower limits after these leads: no overlong forms, no surrogates, nothing above U+10FFFF.
  const lowest = lead === 0xe0 ? 0xa0 : lead === 0xf0 ? 0x90 : 0x80;
  const highest = lead === 0xed ? 0x9f : lead === 0xf4 ? 0x8f : 0xbf;
  const second = bytes[at + 1] ?? 0;
  if (second < lowest || second > highest) return 0;
  for (let offset = 2; offset < length; offset += 1) {
    const byte = bytes[at + offset] ?? 0;
    if (byte < 0x80 || byte > 0xbf) return 0;
  }
  return length;
}

/** How many bytes at the end begin a UTF-8 sequence whose rest is still to come (0 to 3). */
export function unfinishedTail(bytes: Uint8Array): number {
  for (let back = 1; back <= 3 && back <= bytes.length; back += 1) {
    const byte = bytes[bytes.length - back] ?? 0;
    if (byte < 0x80) return 0;
    if (byte < 0xc0) continue;
    const length = byte < 0xe0 ? 2 : byte < 0xf0 ? 3 : 4;
    return back < length ? back : 0;
  }
  return 0;
}
