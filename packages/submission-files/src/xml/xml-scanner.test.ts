import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MalformedXml } from './malformed-xml.ts';
import { XmlScanner } from './xml-scanner.ts';

type Event = readonly (string | number | null)[];

/** What the scanner tells; pieces of one text put together. */
function scan(text: string, size = text.length): Event[] {
  const events: Event[] = [];
  const scanner = new XmlScanner({
    open: (name, attributes, depth) => events.push(['open', name, depth, attributes.get('a'), attributes.getPrefixed('id')]),
    text(piece) {
      const last = events.at(-1);
      if (last?.[0] === 'text') events[events.length - 1] = ['text', `${last[1]}${piece}`];
      else if (piece !== '') events.push(['text', piece]);
    },
    close: (name, depth) => events.push(['close', name, depth]),
  });
  for (let from = 0; from < text.length; from += size) scanner.push(text.slice(from, from + size), false);
  scanner.push('', true);
  return events;
}

const document = `<?xml version="1.0"?><!-- a <b> -->
<x:root a = 'it&apos;s "1 > 0"' xmlns:x="y"><e r:id="7"/>1 &lt; 2 &amp;&#x20;&#65;<![CDATA[<&amp;>]]><e >\n</e\n></x:root>
`;

const told: Event[] = [
  ['open', 'root', 1, `it's "1 > 0"`, null],
  ['open', 'e', 2, null, '7'],
  ['close', 'e', 2],
  ['text', '1 < 2 & A<&amp;>'],
  ['open', 'e', 2, null, null],
  ['text', '\n'],
  ['close', 'e', 2],
  ['close', 'root', 1],
];

describe('XmlScanner', () => {
  it('tells elements, attributes and text, without prefixes, comments and instructions', () => {
    expect(scan(document)).toEqual(told);
  });

  it('tells the same however the text is cut', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: document.length }), (size) => {
        expect(scan(document, size)).toEqual(told);
      }),
      { seed: 20261101, numRuns: 60 },
    );
  });

  it.each([
    ['a document type', '<!DOCTYPE a><a/>'],
    // W3C XML 1.0, 4.4: entities may hold entities; ten of ten times each other make a gigabyte of a kilobyte.
    ['a document type that declares growing entities', '<!DOCTYPE a [<!ENTITY b "ha"><!ENTITY c "&b;&b;&b;">]><a>&c;</a>'],
    ['an entity nobody declared', '<a>&nbsp;</a>'],
    ['an entity named like a property of every object', '<a>&constructor;</a>'],
    ['a bare ampersand', '<a>a & b</a>'],
    ['a character number that does not exist', '<a>&#x110000;</a>'],
    ['a zero character', '<a>&#0;</a>'],
    ['an end tag of another element', '<a><b></a></b>'],
    ['an end tag whose name only begins alike', '<a></ab>'],
    ['an end tag of nothing', '</a>'],
    ['an end before the last end tag', '<a><b></b>'],
    ['an end inside of a tag', '<a><b c="1'],
    ['an end inside of a comment', '<a/><!-- b'],
    ['nothing at all', ' '],
    ['two roots', '<a/><b/>'],
    ['text outside of the root', '<a/>b'],
    ['an attribute without quotation marks', '<a b=c/>'],
    ['an attribute without a value', '<a b/>'],
    ['a tag without a name', '<a>< b/></a>'],
    ['a conditional section', '<a><![IGNORE[b]]></a>'],
    ['a thousand elements inside each other', `${'<a>'.repeat(1_000)}${'</a>'.repeat(1_000)}`],
  ])('refuses %s, however the text is cut', (_, text) => {
    for (const size of [1, 7, text.length]) expect(() => scan(text, size)).toThrow(MalformedXml);
  });

  it('refuses a tag of two million characters before it has all of it', () => {
    const scanner = new XmlScanner({ open() {}, text() {}, close() {} });
    scanner.push('<a b="', false);
    const pushed = (): number => {
      for (let pieces = 1; pieces <= 40; pieces += 1) scanner.push('c'.repeat(50_000), false);
      return 40;
    };
    expect(pushed).toThrow(MalformedXml);
  });

  it('hands a long text over as it comes', () => {
    const lengths: number[] = [];
    const scanner = new XmlScanner({ open() {}, text: (piece) => lengths.push(piece.length), close() {} });
    scanner.push('<a>', false);
    for (let piece = 0; piece < 5; piece += 1) scanner.push('b'.repeat(50_000), false);
    expect(lengths).toEqual([50_000, 50_000, 50_000, 50_000, 50_000]);
  });

  it('resolves any character by its number, and no more than once', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', minLength: 1 }), (text) => {
        const readable = text.replaceAll('\0', ' ');
        const written = Array.from(readable, (character) => `&#x${character.codePointAt(0)?.toString(16)};`).join('');
        expect(scan(`<a>${written}</a>`, 5)).toEqual([
          ['open', 'a', 1, null, null],
          ['text', readable],
          ['close', 'a', 1],
        ]);
      }),
      { seed: 20261102, numRuns: 200 },
    );
    expect(scan('<a>&amp;lt;</a>')[1]).toEqual(['text', '&lt;']);
  });
});
