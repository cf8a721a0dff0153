/** Recognises content that is no CSV text, whatever the file is called. */

interface Signature {
  readonly bytes: readonly number[];
  readonly kind: string;
}

const ascii = (text: string): number[] => Array.from(text, (character) => character.charCodeAt(0));

/** First bytes of common formats, from their published specifications. */
const signatures: readonly Signature[] = [
  { bytes: [0x50, 0x4b, 0x03, 0x04], kind: 'a workbook or another zip archive' },
  { bytes: [0x50, 0x4b, 0x05, 0x06], kind: 'an empty zip archive' },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0], kind: 'a workbook or document in an old binary format' },
  { bytes: [0x1f, 0x8b], kind: 'a gzip archive' },
  { bytes: ascii('%PDF'), kind: 'a PDF document' },
  { bytes: ascii('{\\rtf'), kind: 'a formatted text document' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], kind: 'an image' },
  { bytes: [0xff, 0xd8, 0xff], kind: 'an image' },
  { bytes: ascii('GIF8'), kind: 'an image' },
  { bytes: ascii('RIFF'), kind: 'an image or a recording' },
  { bytes: [0x49, 0x49, 0x2a, 0x00], kind: 'an image' },
  { bytes: [0x4d, 0x4d, 0x00, 0x2a], kind: 'an image' },
  { bytes: [0xff, 0xfe, 0x00, 0x00], kind: 'text in UTF-32' },
  { bytes: [0x00, 0x00, 0xfe, 0xff], kind: 'text in UTF-32' },
];

const space = new Set([0x20, 0x09, 0x0a, 0x0d]);
const utf8Mark = [0xef, 0xbb, 0xbf];

const startsWith = (bytes: Uint8Array, start: readonly number[]): boolean => start.every((byte, index) => bytes[index] === byte);

/** What the content is instead of CSV text, in words, or null when it may be text. Reads no further than the first visible character. */
export function foreignContent(bytes: Uint8Array): string | null {
  const signature = signatures.find((candidate) => startsWith(bytes, candidate.bytes));
  if (signature) return signature.kind;
  let first = startsWith(bytes, utf8Mark) ? utf8Mark.length : 0;
  while (first < bytes.length && space.has(bytes[first] ?? 0)) first += 1;
  // No header begins with this sign, and web pages and XML always do.
  return bytes[first] === 0x3c ? 'a web page or XML document' : null;
}
