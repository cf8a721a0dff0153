import { decodeEntities } from './decode-entities.ts';
import { MalformedXml } from './malformed-xml.ts';

const SPACE = 32;
const SLASH = 47;
const GREATER = 62;
const EQUALS = 61;
const APOSTROPHE = 39;
const QUOTE = 34;

/** Tags of a workbook have a dozen at most; those behind are still checked, but cannot be asked for. */
const mostAttributes = 64;
/** Per attribute: where its name begins and ends, and where its value does. */
const fields = 4;

/** The attributes of one tag, kept as places in the text: most tags of a sheet are asked for one or two of many. */
export class TagAttributes {
  /** Whether the tag closes itself: `<a/>`. */
  isEmptyTag = false;
  private source = '';
  private count = 0;
  private readonly places = new Int32Array(mostAttributes * fields);

  /**
   * Reads on from behind a tag's name to its end.
   * @returns where the `>` stands, or -1 when it has not arrived.
   * @throws MalformedXml
   */
  read(source: string, start: number): number {
    this.source = source;
    this.count = 0;
    this.isEmptyTag = false;
    let at = start;
    for (;;) {
      let character = source.charCodeAt(at);
      while (character <= SPACE) character = source.charCodeAt((at += 1));
      if (character === SLASH) {
        this.isEmptyTag = true;
        character = source.charCodeAt((at += 1));
        if (at < source.length && character !== GREATER) throw new MalformedXml('a tag that does not end');
      }
      if (character === GREATER) return at;

      const nameStart = at;
      while (character > SPACE && character !== EQUALS && character !== GREATER) character = source.charCodeAt((at += 1));
      const nameEnd = at;
      while (character <= SPACE) character = source.charCodeAt((at += 1));
      if (at >= source.length) return -1;
      if (character !== EQUALS || nameEnd === nameStart) throw new MalformedXml('an attribute without a value');
      do character = source.charCodeAt((at += 1));
      while (character <= SPACE);
      if (at >= source.length) return -1;
      if (character !== QUOTE && character !== APOSTROPHE) throw new MalformedXml('an attribute without quotation marks');
      const quote = character;
      const valueStart = at + 1;
      do character = source.charCodeAt((at += 1));
      while (character !== quote && at < source.length);
      if (at >= source.length) return -1;
      this.keep(nameStart, nameEnd, valueStart, at);
      at += 1;
    }
  }

  private keep(nameStart: number, nameEnd: number, valueStart: number, valueEnd: number): void {
    if (this.count === mostAttributes) return;
    const { places } = this;
    const first = this.count * fields;
    places[first] = nameStart;
    places[first + 1] = nameEnd;
    places[first + 2] = valueStart;
    places[first + 3] = valueEnd;
    this.count += 1;
  }

  /** The value of an attribute by its name, null when the tag does not have it. */
  get(name: string): string | null {
    const { source, places } = this;
    for (let first = 0; first < this.count * fields; first += fields) {
      const from = places[first] ?? 0;
      if ((places[first + 1] ?? 0) - from === name.length && source.startsWith(name, from)) return this.valueAt(first);
    }
    return null;
  }

  /** The value of an attribute whose name has a prefix, whatever that is: `r:id` by `id`. */
  getPrefixed(name: string): string | null {
    const { source, places } = this;
    const ending = `:${name}`;
    for (let first = 0; first < this.count * fields; first += fields)
      if (source.slice(places[first], places[first + 1]).endsWith(ending)) return this.valueAt(first);
    return null;
  }

  private valueAt(first: number): string {
    const value = this.source.slice(this.places[first + 2], this.places[first + 3]);
    return value.includes('&') ? decodeEntities(value) : value;
  }
}
