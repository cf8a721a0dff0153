/** A submitted table as a sheet: its cells as they were sent, in the rows they stood in; those with findings coloured and with a note. */
import { tableOf } from '@cairnstep/dictionary';
import type { Finding, Severity } from '../../finding.ts';
import { columnName, readHeaderRow } from '../../table/header-row.ts';
import type { HeaderColumn } from '../../table/header-row.ts';
import type { CellStyle } from './cell-styles.ts';
import { isTextColumn } from './is-text-column.ts';
import type { PlannedNote, PlannedRow, PlannedSheet, PlannedValue } from './sheet-plan.ts';
import type { SubmittedRow, SubmittedTable } from './submitted-tables.ts';

/** Programs become slow with more notes on a sheet. Cells keep their colour, and every finding stays on the list. */
export const mostNotes = 2_000;
const longestNote = 2_000;
const lastRow = 1_048_576;

/** A number that a spreadsheet keeps as it is written, but for zeros at its end. */
const isPlainNumber = (text: string): boolean => /^-?(?:0|[1-9]\d*)(?:\.\d+)?$/.test(text) && text.replace(/\D/g, '').length <= 15;

export interface CellPlace {
  readonly line: number;
  readonly column: number;
}

/** What was found in one cell. */
interface Mark {
  severity: Severity;
  readonly texts: string[];
}

export class MarkedTable {
  /** Where each finding stands; known when the rows have been written. */
  readonly places = new Map<Finding, CellPlace>();
  private readonly findings = new Map<number, Finding[]>();
  private readonly notes: PlannedNote[] = [];
  private columns: readonly HeaderColumn[] = [];
  private readonly positions = new Map<string, number>();

  /** @param findings Those of this table. */
  constructor(
    private readonly submitted: SubmittedTable,
    findings: readonly Finding[],
  ) {
    for (const finding of findings) {
      if (finding.line === null) continue;
      const ofLine = this.findings.get(finding.line);
      if (ofLine) ofLine.push(finding);
      else this.findings.set(finding.line, [finding]);
    }
  }

  /** The sheet, whose first row has been read already. */
  async plan(): Promise<PlannedSheet> {
    const rows = this.submitted.rows[Symbol.asyncIterator]();
    const first = await rows.next();
    if (!first.done) this.takeHeader(first.value.cells);
    return {
      name: tableOf(this.submitted.table).name,
      columns: this.columns.map((_, position) => ({ width: 16, ...(this.holdsText(position) ? { style: 'text' as const } : {}) })),
      rows: first.done ? [] : this.plannedRows(first.value, { [Symbol.asyncIterator]: () => rows }),
      frozen: { rows: first.done ? 1 : first.value.line, columns: 1 },
      ...(this.findings.size > 0 ? { notes: () => this.notes } : {}),
    };
  }

  private takeHeader(cells: readonly string[]): void {
    this.columns = readHeaderRow(this.submitted.table, cells, cells.length);
    this.columns.forEach((column, position) => {
      const name = columnName(column, position);
      if (!this.positions.has(name)) this.positions.set(name, position);
    });
  }

  /** Whether a column holds codes or words, or nobody knows what. */
  private holdsText(position: number): boolean {
    const meaning = this.columns[position]?.meaning;
    return !meaning || meaning.kind === 'undeclared' || isTextColumn(meaning.variable);
  }

  private async *plannedRows(header: SubmittedRow, rest: AsyncIterable<SubmittedRow>): AsyncGenerator<PlannedRow> {
    const { cells, line } = header;
    yield { line, cells, style: 'header', styles: this.stylesOf(this.mark(line)), height: 60 };
    for await (const row of rest) {
      if (row.line > lastRow) return;
      const marks = this.mark(row.line);
      const width = Math.max(row.cells.length, ...[...marks.keys()].map((column) => column + 1));
      yield {
        line: row.line,
        cells: Array.from({ length: width }, (_, position) => this.valueOf(row, position)),
        styles: this.stylesOf(marks),
      };
    }
  }

  private valueOf({ cells, kinds }: SubmittedRow, position: number): PlannedValue {
    const text = cells[position] ?? '';
    if (text === '' || kinds?.[position] === 'uncalculated') return null;
    const isNumber = kinds ? kinds[position] === 'number' : isPlainNumber(text);
    return isNumber && !this.holdsText(position) ? Number(text) : text;
  }

  /** What was found in a row, by column; what is about the whole row, or about a column that is not there, in its first cell. */
  private mark(line: number): ReadonlyMap<number, Mark> {
    const marks = new Map<number, Mark>();
    for (const finding of this.findings.get(line) ?? []) {
      const { column: name, severity, rule, found, mend } = finding;
      const position = name === null ? undefined : this.positions.get(name);
      const column = position ?? 0;
      const about = position === undefined && name !== null ? `${name}: ` : '';
      const mark = marks.get(column) ?? { severity, texts: [] };
      mark.texts.push(`${rule}: ${about}${found} ${mend}`);
      if (severity === 'error') mark.severity = 'error';
      marks.set(column, mark);
      this.places.set(finding, { line, column });
    }
    for (const [column, { texts }] of [...marks].sort(([a], [b]) => a - b))
      if (this.notes.length < mostNotes) this.notes.push({ line, column, text: texts.join('\n').slice(0, longestNote) });
    return marks;
  }

  private stylesOf(marks: ReadonlyMap<number, Mark>): ReadonlyMap<number, CellStyle> {
    return new Map([...marks].map(([column, { severity }]) => [column, this.holdsText(column) ? `${severity}Text` : severity] as const));
  }
}
