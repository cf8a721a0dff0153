import type { WorkbookLimits } from '../../limits.ts';
import type { ZipEntry } from '../../zip/zip-directory.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { decodeCharacters } from './decode-characters.ts';
import { scanPart } from './scan-part.ts';
import type { PartHandler } from './scan-part.ts';

/**
 * Collects the text of one item or inline string: its own or that of its formatted runs, without the reading aid that
 * may stand above it (`rPh`). Depths are those of ECMA-376-1, 18.4: item, then `t`, or `r` and `t`.
 */
export class TextOfRuns {
  private text = '';
  private inText = false;
  private inReadingAid = false;

  /** @param longest Characters to keep; one more is kept of a longer text, so that it can be told. */
  constructor(private readonly longest: number) {}

  open(name: string): void {
    if (name === 'rPh') this.inReadingAid = true;
    else if (name === 't') this.inText = !this.inReadingAid;
  }

  add(text: string): void {
    if (this.inText && this.text.length <= this.longest) this.text = (this.text + text).slice(0, this.longest + 1);
  }

  close(name: string): void {
    if (name === 'rPh') this.inReadingAid = false;
    else if (name === 't') this.inText = false;
  }

  take(): string {
    const taken = decodeCharacters(this.text);
    this.clear();
    return taken;
  }

  clear(): void {
    this.text = '';
    this.inText = false;
    this.inReadingAid = false;
  }
}

class SharedTextsHandler implements PartHandler {
  readonly texts: string[] = [];
  private readonly runs: TextOfRuns;
  private length = 0;

  constructor(private readonly limits: WorkbookLimits) {
    this.runs = new TextOfRuns(limits.cellLength);
  }

  open(name: string): void {
    this.runs.open(name);
  }

  text(text: string): void {
    this.runs.add(text);
  }

  close(name: string, depth: number): void {
    this.runs.close(name);
    if (depth !== 2 || name !== 'si') return;
    const text = this.runs.take();
    this.texts.push(text);
    this.length += text.length;
    const { sharedTexts, sharedTextLength } = this.limits;
    if (this.texts.length <= sharedTexts && this.length <= sharedTextLength) return;
    throw new UnreadableFile(
      'F03',
      'The sheets of the workbook have more different texts than the tables could need.',
      'Send a workbook with nothing in it but the tables, and a large month in parts.',
      null,
    );
  }
}

/** The texts that cells refer to by number. One longer than a cell may be is cut one character behind that. */
export function readSharedTexts(entry: ZipEntry, limits: WorkbookLimits): readonly string[] {
  const handler = new SharedTextsHandler(limits);
  scanPart(entry, handler);
  return handler.texts;
}
