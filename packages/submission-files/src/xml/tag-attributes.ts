import { decodeEntities } from './decode-entities.ts';
import { MalformedXml } from './malformed-xml.ts';

const SPACE = 32;
const EQUALS = 61;
const APOSTROPHE = 39;
const QUOTE = 34;

/** Tags of a workbook have a dozen at most; those behind are still checked, but cannot be asked for. */
const mostAttributes = 64;
/** Per attribute: where its name begins and ends, and where its value does. */
const fields = 4;

/** The attributes of one tag, kept as places in the text: most tags of a sheet are asked for one or two of many. */
export class TagAttributes {
  private source = '';
  private count = 0;
  private readonly places = new Int32Array(mostAttributes * fields);

  /**
   * @param start Behind the tag's name. @param end Before the mark that ends the tag.
   * @throws MalformedXml
   */
  read(source: string, start: number, end: number): void {
    this.source = source;
    this.count = 0;
    let at = start;
    for (;;) {
      while (at < end && source.charCodeAt(at) <= SPACE) at += 1;
      if (at >= end) return;
      const nameStart = at;
      let character = source.charCodeAt(at);
      while (character > SPACE && character !== EQUALS) {
        at += 1;
        character = source.charCodeAt(at);
      }
      const nameEnd = at;
      while (source.charCodeAt(at) <= SPACE) at += 1;
      if (at >= end || source.charCodeAt(at) !== EQUALS || nameEnd === nameStart) throw new MalformedXml('an attribute without a value');
      at += 1;
      while (source.charCodeAt(at) <= SPACE) at += 1;
      const quote = source.charCodeAt(at);
      if (at >= end || (quote !== QUOTE && quote !== APOSTROPHE)) throw new MalformedXml('an attribute without quotation marks');
      const valueStart = at + 1;
      at = valueStart;
      while (at < end && source.charCodeAt(at) !== quote) at += 1;
      if (at >= end) throw new MalformedXml('an attribute that does not end');
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
