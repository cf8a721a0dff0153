import { tableOf } from '@cairnstep/dictionary';
import { ColumnScreen } from './column-screen.ts';
import type { DetectionContext } from './detection-context.ts';
import type { IdentifierFinding } from './identifier-finding.ts';

/** Screens a table row by row, in memory that does not grow with the rows. */
export class IdentifierScreen {
  private readonly columns: ColumnScreen[] = [];

  constructor(
    private readonly headers: readonly string[],
    private readonly context: DetectionContext = {},
  ) {
    headers.forEach(() => this.columnAt(this.columns.length));
  }

  /** @param line the row's line in its file, repeated in the findings */
  row(cells: readonly string[], line: number): void {
    cells.forEach((cell, position) => this.columnAt(position).add(cell, line));
  }

  findings(): IdentifierFinding[] {
    return this.columns.flatMap((column) => column.findings());
  }

  /** Rows may be longer than the header; what stands beyond it is screened like any other cell. */
  private columnAt(position: number): ColumnScreen {
    while (this.columns.length <= position) {
      const header = this.headers[this.columns.length] ?? '';
      const { table, dictionaryTable, roles, safeHeaders } = this.context;
      this.columns.push(
        new ColumnScreen({
          header,
          number: this.columns.length + 1,
          table: table ?? dictionaryTable ?? null,
          role: roles?.get(header) ?? 'unknown',
          variable: dictionaryTable && tableOf(dictionaryTable).variables.find(({ key }) => key === header),
          isSafeHeader: safeHeaders?.has(header) ?? false,
        }),
      );
    }
    return this.columns[position] as ColumnScreen;
  }
}
