import { describe, expect, it } from 'vitest';
import { HIDDEN, protectTable } from './index.ts';

describe('protectTable', () => {
  it('hides a second cell in the row and in the column of a small one', () => {
    const { published } = protectTable({
      counts: [
        [7, 20, 31],
        [25, 18, 40],
      ],
    });
    expect(published.cells).toEqual([
      [HIDDEN, HIDDEN, 31],
      [HIDDEN, HIDDEN, 40],
    ]);
    expect(published.rowTotals).toEqual([58, 83]);
    expect(published.columnTotals).toEqual([32, 38, 71]);
  });

  it('shows a table without small counts as it is', () => {
    const { published } = protectTable({
      counts: [
        [12, 0],
        [0, 18],
      ],
    });
    expect(published.cells).toEqual([
      [12, 0],
      [0, 18],
    ]);
  });
});
