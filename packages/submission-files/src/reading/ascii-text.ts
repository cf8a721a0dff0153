/** A text of ASCII characters alone, with its bytes at the same places: those are read ten times as fast as the characters of a text. */
export interface AsciiText {
  readonly source: string;
  readonly bytes: Uint8Array;
}

const encoder = new TextEncoder();

/** Null when a character is beyond ASCII: it takes more bytes than one. */
export function asciiText(source: string): AsciiText | null {
  const bytes = encoder.encode(source);
  return bytes.length === source.length ? { source, bytes } : null;
}
