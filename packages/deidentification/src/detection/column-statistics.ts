import { isNationalNumber } from './cells/numbers-of-people.ts';
import type { ColumnTraits } from './column-traits.ts';
import type { Hit } from './hit.ts';
import { isBareNumber } from './is-bare-number.ts';
import { normaliseText } from './normalise-text.ts';

/** A hit in a column as a whole, with the cells that led to it and the line of the first. */
export interface ColumnHit extends Hit {
  readonly count: number;
  readonly line: number | null;
}

/** From so many rows on, a column of values that never repeat names its rows. */
const uniqueRows = 20;
/** Beyond so many different values without one repeat, a column is taken to have none. */
const mostRemembered = 20_000;
/** From so many cells on, a column that nobody declared is taken for numbers when most of its cells are. */
const numericRows = 20;

const codeLike = /^(?=[^\d]{0,38}\d)(?=[^\p{L}]{0,38}\p{L})[\p{L}\d_./-]{4,40}$|^\d{6,40}$/u;
/** Spreadsheet day numbers of 1954 to 2064. */
const isDaySerial = (cell: string): boolean => /^\d{5}(?:\.\d{1,15})?$/.test(cell) && Number(cell) >= 20_000 && Number(cell) <= 60_000;
const hasSentence = (cell: string): boolean => /(?:^| )\p{L}[^ ]{0,40} \p{L}[^ ]{0,40} \p{L}/u.test(cell);

class Tally {
  count = 0;
  line: number | null = null;
  add(line: number): void {
    this.count += 1;
    this.line ??= line;
  }
}

/** What only a column as a whole can tell. Memory does not grow with the column. */
export class ColumnStatistics {
  private readonly filled = new Tally();
  private readonly numbers = new Tally();
  private readonly nationalNumbers = new Tally();
  private readonly daySerials = new Tally();
  private readonly sentences = new Tally();
  /** The values so far; null once one repeats or is no code. */
  private values: Set<string> | null = new Set();

  constructor(private readonly traits: ColumnTraits) {}

  /** @returns whether the cell is left to the judgement over the whole column */
  add(cell: string, line: number): boolean {
    const text = cell.length > 200 ? cell : normaliseText(cell);
    if (text === '') return false;
    this.filled.add(line);
    this.remember(text);
    if (hasSentence(text.slice(0, 2_000))) this.sentences.add(line);
    if (!isBareNumber(text)) return false;
    this.numbers.add(line);
    if (this.traits.isDate && isDaySerial(text)) this.daySerials.add(line);
    if (!isNationalNumber(text)) return false;
    this.nationalNumbers.add(line);
    return true;
  }

  private remember(text: string): void {
    if (this.values === null || this.values.size >= mostRemembered) return;
    if (this.values.has(text) || !codeLike.test(text)) this.values = null;
    else this.values.add(text);
  }

  hits(): ColumnHit[] {
    const { role, isDate } = this.traits;
    const hits: ColumnHit[] = [];
    const report = (hit: Hit, { count, line }: Tally) => hits.push({ ...hit, count, line });

    const isNumeric = role === 'number' || (this.filled.count >= numericRows && this.numbers.count >= 0.8 * this.filled.count);
    if (this.nationalNumbers.count > 0) {
      const isChance = isNumeric && this.nationalNumbers.count < this.filled.count / 2;
      report({ class: 'national_id', strength: isChance ? 'warn' : 'block' }, this.nationalNumbers);
    }
    if (isDate && this.daySerials.count > 0 && this.daySerials.count >= 0.8 * this.filled.count) {
      report({ class: 'date_serial', strength: 'block' }, this.daySerials);
    }
    const isText = role === 'text' || (role === 'unknown' && this.sentences.count >= Math.max(1, 0.2 * this.filled.count));
    if (isText) report({ class: 'free_text', strength: 'warn' }, this.filled);
    if (role === 'unknown' && this.values !== null && this.filled.count >= uniqueRows) {
      report({ class: 'unique_code', strength: 'warn' }, this.filled);
    }
    return hits;
  }
}
