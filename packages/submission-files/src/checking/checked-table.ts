import type { TableKey } from '@cairnstep/dictionary';
import type { TypedColumn, TypedTable } from '../table/typed-table.ts';

/** A table as the rules see it: the rows of the file, then the rows the registry holds that the file does not override. */
export class CheckedTable {
  constructor(
    private readonly table: TypedTable,
    /** Rows below this number come from the file; only they can have findings. */
    readonly fileRows: number,
    /** Per row the number of its participant, -1 where the code is missing. */
    readonly persons: Int32Array,
  ) {}

  get key(): TableKey {
    return this.table.key;
  }

  /** Rows of the file and of the registry. */
  get length(): number {
    return this.table.length;
  }

  get present(): ReadonlySet<string> {
    return this.table.present;
  }

  get columns(): readonly TypedColumn[] {
    return this.table.columns;
  }

  column(key: string): TypedColumn {
    return this.table.column(key);
  }

  lineOf(row: number): number {
    return this.table.lines[row] ?? 0;
  }

  personOf(row: number): number {
    return this.persons[row] ?? -1;
  }

  isInFile(row: number): boolean {
    return row < this.fileRows;
  }
}
