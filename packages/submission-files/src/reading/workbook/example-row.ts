import type { TableKey } from '@cairnstep/dictionary';
import { exampleCells, exampleMark } from '../../table/example-cells.ts';
import type { HeaderColumn } from '../../table/header-row.ts';

interface ExpectedCell {
  readonly position: number;
  readonly column: string;
  readonly text: string;
}

/** Recognises the example row of the template by its mark in the participant column, and whether its other cells are as they were. */
export class ExampleRow {
  private readonly cells: readonly ExpectedCell[];
  private readonly mark: ExpectedCell | undefined;

  constructor(table: TableKey, columns: readonly HeaderColumn[]) {
    const example = exampleCells(table);
    this.cells = columns.flatMap(({ meaning }, position) => {
      const column = meaning.kind === 'column' ? meaning.variable.key : '';
      const text = example.get(column);
      return text === undefined ? [] : [{ position, column, text }];
    });
    this.mark = this.cells.find(({ text }) => text === exampleMark);
  }

  get markColumn(): string | null {
    return this.mark?.column ?? null;
  }

  compare(cells: readonly string[]): 'not-marked' | 'unchanged' | 'changed' {
    const { mark } = this;
    if (!mark || cells[mark.position]?.trim().toUpperCase() !== mark.text) return 'not-marked';
    return this.cells.every(({ position, text }) => position === mark.position || cells[position]?.trim() === text)
      ? 'unchanged'
      : 'changed';
  }
}
