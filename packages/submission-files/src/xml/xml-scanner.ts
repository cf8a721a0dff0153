/**
 * Text to the elements of an XML document, piece by piece, as far as workbooks need it (XML 1.0, without DTD).
 *
 * Own scanner instead of saxes 6.0.0: that took 1.7 times as long for the sheet of 50,000 rows (1.1 and 0.65 s), and gathers
 * a text or a tag whole, however long, before it tells of it. This one hands text over as it comes and refuses long tags,
 * deep nesting and every document type, so that entities cannot grow and memory stays flat. It demands what workbooks
 * always have: tags that match, one root, and only the five entities of XML.
 */
import { decodeEntities, startOfCutEntity } from './decode-entities.ts';
import { MalformedXml } from './malformed-xml.ts';
import { TagAttributes } from './tag-attributes.ts';

/** No tag, comment or instruction of a workbook comes near it. */
const longestMarkup = 1_000_000;
/** Workbooks nest about ten deep. */
const deepest = 100;

const SPACE = 32;
const SLASH = 47;
const LESS = 60;
const GREATER = 62;
const QUESTION = 63;
const EXCLAMATION = 33;

export interface XmlHandler {
  /**
   * @param name Without its namespace prefix.
   * @param attributes Valid only during the call.
   * @param depth 1 for the root.
   */
  open(name: string, attributes: TagAttributes, depth: number): void;
  /** Text directly inside the element opened last or gone back to; a long one comes in pieces. */
  text(text: string): void;
  close(name: string, depth: number): void;
}

/** The name without its prefix. */
function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon < 0 ? name : name.slice(colon + 1);
}

export class XmlScanner {
  private rest = '';
  /** Open elements. */
  private depth = 0;
  /** By depth the name of the element opened last, with its prefix and without. */
  private readonly names: string[] = [];
  private readonly localNames: string[] = [];
  private hasRoot = false;
  private readonly attributes = new TagAttributes();

  constructor(private readonly handler: XmlHandler) {}

  /**
   * Scans the next piece; markup whose end has not arrived waits for the next one.
   * @throws MalformedXml
   */
  push(text: string, last: boolean): void {
    const source = this.rest === '' ? text : this.rest + text;
    let at = 0;
    while (at < source.length) {
      let end = at;
      while (end < source.length && source.charCodeAt(end) !== LESS) end += 1;
      if (end > at) {
        const safe = end === source.length && !last ? startOfCutEntity(source, at) : end;
        this.takeText(source.slice(at, safe));
        at = safe;
        if (end === source.length) break;
      }
      const next = this.scanMarkup(source, at);
      if (next < 0) break;
      at = next;
    }
    this.rest = source.slice(at);
    if (this.rest.length > longestMarkup) throw new MalformedXml('markup that does not end');
    if (last && (this.rest !== '' || this.depth > 0 || !this.hasRoot)) throw new MalformedXml('an end that comes too early');
  }

  private takeText(text: string): void {
    if (this.depth > 0) this.handler.text(text.includes('&') ? decodeEntities(text) : text);
    else if (/[^\s\ufeff]/.test(text)) throw new MalformedXml('text outside of the root element');
  }

  /** Scans one piece of markup from `start`; returns where it ends, or -1 when its end has not arrived. */
  private scanMarkup(source: string, start: number): number {
    const kind = source.charCodeAt(start + 1);
    if (kind === SLASH) return this.scanEndTag(source, start + 2);
    if (kind === QUESTION) return endOf(source, '?>', start + 2);
    if (kind === EXCLAMATION) return this.scanDeclaration(source, start);
    return this.scanStartTag(source, start + 1);
  }

  private scanDeclaration(source: string, start: number): number {
    if (source.startsWith('<!--', start)) return endOf(source, '-->', start + 4);
    if (source.startsWith('<![CDATA[', start)) {
      const end = endOf(source, ']]>', start + 9);
      if (end > 0 && this.depth > 0) this.handler.text(source.slice(start + 9, end - 3));
      return end;
    }
    if (source.length - start < '<![CDATA['.length && !source.startsWith('<!D', start)) return -1;
    throw new MalformedXml('a document type or another declaration');
  }

  private scanStartTag(source: string, start: number): number {
    let nameEnd = start;
    let character = source.charCodeAt(nameEnd);
    while (character > SPACE && character !== SLASH && character !== GREATER) character = source.charCodeAt((nameEnd += 1));
    if (nameEnd >= source.length) return -1;
    if (nameEnd === start) throw new MalformedXml('a tag without a name');
    const end = this.attributes.read(source, nameEnd);
    if (end < 0) return -1;
    if (this.depth === 0 && this.hasRoot) throw new MalformedXml('a second root element');
    if (this.depth >= deepest) throw new MalformedXml('elements nested too deep');
    this.hasRoot = true;

    // Most elements are called like the one before them at the same depth.
    const known = this.names[this.depth];
    if (known === undefined || known.length !== nameEnd - start || !source.startsWith(known, start)) {
      const name = source.slice(start, nameEnd);
      this.names[this.depth] = name;
      this.localNames[this.depth] = localName(name);
    }
    this.depth += 1;
    const isEmpty = this.attributes.isEmptyTag;
    this.handler.open(this.localNames[this.depth - 1] ?? '', this.attributes, this.depth);
    if (isEmpty) this.closeElement();
    return end + 1;
  }

  private scanEndTag(source: string, start: number): number {
    const name = this.depth > 0 ? this.names[this.depth - 1] : undefined;
    let end = start + (name?.length ?? 0);
    if (source.length <= end) return -1;
    if (name === undefined || !source.startsWith(name, start)) throw new MalformedXml('an end tag that closes nothing');
    while (source.charCodeAt(end) <= SPACE) end += 1;
    if (end >= source.length) return -1;
    if (source.charCodeAt(end) !== GREATER) throw new MalformedXml('an end tag that closes nothing');
    this.closeElement();
    return end + 1;
  }

  private closeElement(): void {
    this.handler.close(this.localNames[this.depth - 1] ?? '', this.depth);
    this.depth -= 1;
  }
}

/** Behind the end mark, or -1. */
function endOf(source: string, mark: string, from: number): number {
  const at = source.indexOf(mark, from);
  return at < 0 ? -1 : at + mark.length;
}
