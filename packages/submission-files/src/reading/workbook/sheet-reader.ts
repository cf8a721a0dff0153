/**
 * The elements of a sheet's part to rows of text cells (ECMA-376-1, 18.3.1). One row is held at a time; what stands around
 * the rows (hidden columns, merged cells) is told as it comes.
 */
import type { WorkbookLimits } from '../../limits.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import { formatNumber } from '../../writing/format-number.ts';
import type { TagAttributes } from '../../xml/tag-attributes.ts';
import { damaged } from '../../zip/damaged.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { columnOf, rangeOf } from './cell-reference.ts';
import type { SheetRange } from './cell-reference.ts';
import { isTrue } from './is-true.ts';
import type { PartHandler } from './scan-part.ts';
import { serialDate } from './serial-date.ts';
import { TextOfRuns } from './shared-texts.ts';

/** What cells refer to outside of their sheet. */
export interface SheetSurroundings {
  readonly sharedTexts: readonly string[];
  readonly dateStyles: readonly boolean[];
  readonly countsFrom1904: boolean;
}

/** Receives what a sheet holds. */
export interface SheetEvents {
  /**
   * A row with at least one cell that is not empty. Only the first `count` entries are of this row; both arrays are used
   * again for the next one, and the receiver may write behind `count`.
   */
  row(cells: string[], kinds: CellKind[], count: number, line: number, isHidden: boolean): void;
  hiddenColumns(first: number, last: number): void;
  merged(range: SheetRange): void;
  image(): void;
}

const lastRow = 1_048_576;
/** Programs show and take 15 digits and store what binary arithmetic makes of them, such as 1.1000000000000001 for 1.1. */
const shownDigits = 15;
const numberPattern = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;

export class SheetReader implements PartHandler {
  /** The row being read, null before the first. */
  line: number | null = null;
  private readonly cells: string[] = [];
  private readonly kinds: CellKind[] = [];
  private count = 0;
  private rowIsHidden = false;
  private inRows = false;
  /** Last column whose width and visibility have been given. */
  private lastColumns = -1;

  private column = -1;
  private type = 'n';
  private style = 0;
  private isFormula = false;
  private hasValue = false;
  private inValue = false;
  private inInline = false;
  private value = '';
  private readonly inline: TextOfRuns;

  constructor(
    private readonly surroundings: SheetSurroundings,
    private readonly limits: WorkbookLimits,
    private readonly events: SheetEvents,
  ) {
    this.inline = new TextOfRuns(limits.cellLength);
  }

  open(name: string, attributes: TagAttributes, depth: number): void {
    if (this.inRows) this.openInRows(name, attributes, depth);
    else if (depth === 2) {
      this.inRows = name === 'sheetData';
      if (name === 'drawing' || name === 'picture') this.events.image();
    } else if (depth === 3) this.openAroundRows(name, attributes);
  }

  private openAroundRows(name: string, attributes: TagAttributes): void {
    if (name === 'col') this.openColumns(attributes);
    else if (name === 'mergeCell') {
      const range = rangeOf(attributes.get('ref') ?? '');
      if (!range) throw damaged('Merged cells are given without a place.');
      this.events.merged(range);
    }
  }

  private openColumns(attributes: TagAttributes): void {
    const first = Number(attributes.get('min')) - 1;
    const last = Number(attributes.get('max')) - 1;
    if (!(first > this.lastColumns && last >= first)) throw damaged('Its columns are out of order.');
    this.lastColumns = last;
    if (isTrue(attributes.get('hidden'))) this.events.hiddenColumns(first, Math.min(last, this.limits.columns - 1));
  }

  private openInRows(name: string, attributes: TagAttributes, depth: number): void {
    if (depth === 3) {
      if (name === 'row') this.openRow(attributes);
    } else if (depth === 4) {
      if (name === 'c') this.openCell(attributes);
    } else if (this.inInline) this.inline.open(name);
    else if (depth === 5) {
      if (name === 'v') {
        this.inValue = true;
        this.hasValue = true;
      } else if (name === 'f') this.isFormula = true;
      else if (name === 'is') {
        this.inInline = true;
        this.inline.clear();
      }
    }
  }

  private openRow(attributes: TagAttributes): void {
    const before = this.line ?? 0;
    const given = attributes.get('r');
    const line = given === null ? before + 1 : Number(given);
    if (!Number.isInteger(line) || line <= before || line > lastRow) throw damaged('Its rows are out of order.', this.line);
    this.line = line;
    this.rowIsHidden = isTrue(attributes.get('hidden'));
    this.count = 0;
    this.column = -1;
  }

  private openCell(attributes: TagAttributes): void {
    const reference = attributes.get('r');
    this.column = reference === null ? this.column + 1 : columnOf(reference);
    if (this.column < 0) throw damaged('A cell has no place.', this.line);
    this.type = attributes.get('t') ?? 'n';
    this.style = Number(attributes.get('s') ?? '0');
    this.isFormula = false;
    this.hasValue = false;
    this.value = '';
  }

  text(text: string): void {
    if (this.inValue) {
      if (this.value.length <= this.limits.cellLength) this.value = this.value === '' ? text : this.value + text;
    } else if (this.inInline) this.inline.add(text);
  }

  close(name: string, depth: number): void {
    if (!this.inRows) return;
    if (depth === 5) {
      this.inValue = false;
      this.inInline = false;
    } else if (this.inInline) this.inline.close(name);
    else if (depth === 4) {
      if (name === 'c') this.closeCell();
    } else if (depth === 3) {
      if (this.count > 0) this.events.row(this.cells, this.kinds, this.count, this.line ?? 0, this.rowIsHidden);
    } else if (depth === 2) this.inRows = false;
  }

  private closeCell(): void {
    if (this.value.length > this.limits.cellLength) throw this.longCell();
    switch (this.type) {
      case 'n':
        return this.closeNumber();
      case 's':
        return this.put(this.sharedText(), 'text');
      case 'inlineStr':
        return this.put(this.inline.take(), 'text');
      case 'str':
        if (this.isFormula && !this.hasValue) return this.put('?', 'uncalculated');
        return this.put(this.value, 'text');
      case 'b':
        return this.put(this.value === '' ? '' : isTrue(this.value) ? 'TRUE' : 'FALSE', 'text');
      case 'd':
        return this.put(this.value, 'date');
      case 'e':
        return this.put(this.value || '?', 'error');
      default:
        throw damaged('A cell is of a kind that workbooks do not have.', this.line);
    }
  }

  private closeNumber(): void {
    const written = this.value.trim();
    if (written === '') {
      if (this.isFormula) this.put('?', 'uncalculated');
      return;
    }
    if (!numberPattern.test(written)) throw damaged('A number cannot be read.', this.line);
    if (this.surroundings.dateStyles[this.style]) {
      const date = serialDate(Number(written), this.surroundings.countsFrom1904);
      return this.put(date ?? '?', date === null ? 'error' : 'date');
    }
    this.put(written.length > shownDigits || /e/i.test(written) ? this.shownNumber(written) : written, 'number');
  }

  private shownNumber(written: string): string {
    const shown = Number(Number(written).toPrecision(shownDigits));
    if (!Number.isFinite(shown)) throw damaged('A number cannot be read.', this.line);
    return formatNumber(shown);
  }

  private sharedText(): string {
    if (this.value === '') return '';
    const text = this.surroundings.sharedTexts[Number(this.value)];
    if (text === undefined) throw damaged('A cell refers to a text that is not there.', this.line);
    return text;
  }

  private put(text: string, kind: CellKind): void {
    if (text === '') return;
    const { column, cells, kinds, limits } = this;
    if (column >= limits.columns) throw this.beyond(`A row has a cell behind column ${limits.columns.toLocaleString('en')}.`);
    if (text.length > limits.cellLength) throw this.longCell();
    for (; this.count <= column; this.count += 1) {
      cells[this.count] = '';
      kinds[this.count] = 'text';
    }
    if (cells[column] !== '') throw damaged('A row has two cells in the same place.', this.line);
    cells[column] = text;
    kinds[column] = kind;
  }

  private longCell(): UnreadableFile {
    return this.beyond(`A cell is longer than ${this.limits.cellLength.toLocaleString('en')} characters.`);
  }

  private beyond(found: string): UnreadableFile {
    return new UnreadableFile('F03', found, 'Send only the columns of the template. None of them takes running text.', this.line);
  }
}
