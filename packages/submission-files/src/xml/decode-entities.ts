import { MalformedXml } from './malformed-xml.ts';

const named: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };
const reference = /&(?:#x([0-9a-f]{1,6})|#([0-9]{1,7})|([a-z]{2,4}));|&/gi;
/** `&#x10FFFF;` is the longest reference. */
const longestReference = 10;
const lastCharacter = 0x10ffff;

/**
 * Text with its references resolved: the five that XML itself has, and characters by number.
 * @throws MalformedXml for any other, since only a document type could declare it.
 */
export function decodeEntities(text: string): string {
  return text.replace(reference, (whole, hex?: string, decimal?: string, name?: string) => {
    if (name !== undefined) {
      const character = Object.hasOwn(named, name) ? named[name] : undefined;
      if (character !== undefined) return character;
    }
    const code = hex !== undefined ? Number.parseInt(hex, 16) : decimal !== undefined ? Number(decimal) : 0;
    if (code === 0 || code > lastCharacter) throw new MalformedXml(whole === '&' ? 'a bare ampersand' : 'an entity that XML does not have');
    return String.fromCodePoint(code);
  });
}

/** Where a reference begins that the end of the text may have cut off; the end when there is none. */
export function startOfCutEntity(text: string, from: number): number {
  const start = text.lastIndexOf('&');
  const isCut = start >= from && text.length - start < longestReference && !text.includes(';', start);
  return isCut ? start : text.length;
}
