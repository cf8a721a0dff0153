import type { Variable } from '@cairnstep/dictionary';
import { TypedColumn } from './typed-table.ts';

/** Words of a column by number; number 0 is "no word". */
class Vocabulary {
  readonly words: string[] = [''];
  private readonly numbers = new Map<string, number>();

  /** The number of a word met before. */
  known(word: string): number | undefined {
    return this.numbers.get(word);
  }

  /** The number of a word, given one if it is new. */
  number(word: string): number {
    const known = this.numbers.get(word);
    if (known !== undefined) return known;
    // A piece of a larger text would keep the whole text alive; joining its characters makes a text of its own.
    const own = Array.from(word).join('');
    const fresh = this.words.length;
    this.words.push(own);
    this.numbers.set(own, fresh);
    return fresh;
  }
}

/** The last row in which a cell is not just what the dictionary allows in its column; -1 when there was none. */
export interface DoubtfulRow {
  row: number;
}

/** A column being filled. Arrays exist only once the column needs them. */
export class ColumnStore {
  readonly vocabulary = new Vocabulary();
  private numbers: Float64Array | null = null;
  private words: Uint32Array | null = null;
  private unreadable: Uint8Array | null = null;
  /** The hard limits; a column without them allows no number by itself. */
  private readonly least: number;
  private readonly most: number;

  constructor(
    readonly variable: Variable,
    private capacity: number,
    private readonly doubtful: DoubtfulRow = { row: -1 },
  ) {
    this.least = variable.hard?.min ?? Infinity;
    this.most = variable.hard?.max ?? -Infinity;
  }

  grow(capacity: number): void {
    this.capacity = capacity;
    if (this.numbers) {
      const numbers = new Float64Array(capacity).fill(Number.NaN, this.numbers.length);
      numbers.set(this.numbers);
      this.numbers = numbers;
    }
    this.words = this.words && enlarged(this.words, new Uint32Array(capacity));
    this.unreadable = this.unreadable && enlarged(this.unreadable, new Uint8Array(capacity));
  }

  setNumber(row: number, value: number): void {
    this.numbers ??= new Float64Array(this.capacity).fill(Number.NaN);
    this.numbers[row] = value;
    if (value < this.least || value > this.most) this.doubtful.row = row;
  }

  setWord(row: number, number: number): void {
    this.words ??= new Uint32Array(this.capacity);
    this.words[row] = number;
  }

  setUnreadable(row: number): void {
    this.unreadable ??= new Uint8Array(this.capacity);
    this.unreadable[row] = 1;
    this.doubtful.row = row;
  }

  /** The word already stored in a row, '' when there is none. */
  wordAt(row: number): string {
    return this.vocabulary.words[this.words?.[row] ?? 0] ?? '';
  }

  /** Hands the first rows over as a finished column and begins again without any. */
  take(rows: number): TypedColumn {
    const column = new TypedColumn(
      this.variable,
      this.numbers && this.numbers.subarray(0, rows),
      this.words && this.words.subarray(0, rows),
      this.vocabulary.words,
      this.unreadable && this.unreadable.subarray(0, rows),
    );
    this.numbers = null;
    this.words = null;
    this.unreadable = null;
    return column;
  }
}

function enlarged<T extends Uint8Array | Uint32Array>(from: T, to: T): T {
  to.set(from);
  return to;
}
