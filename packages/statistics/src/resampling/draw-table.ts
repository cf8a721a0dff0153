/**
 * Draws a table of counts with given margins as if rows and columns had nothing to do with each other.
 * Source: Patefield (1981) Appl Stat 30:91-97, algorithm AS 159: cell by cell from the conditional hypergeometric distribution.
 */

import type { Margins } from '../tables/contingency-table.ts';
import { drawHypergeometric } from './draw-hypergeometric.ts';
import type { SeededGenerator } from './seeded-generator.ts';

export function drawTable(generator: SeededGenerator, { rows, columns }: Pick<Margins, 'rows' | 'columns'>): number[][] {
  const left = [...columns];
  return rows.map((row, i) => {
    if (i === rows.length - 1) return left;
    let openInRow = row;
    let openInColumns = left.reduce((sum, count) => sum + count, 0);
    return left.map((column, j) => {
      openInColumns -= column;
      const cell = drawHypergeometric(generator, column, openInColumns, openInRow);
      openInRow -= cell;
      left[j] = column - cell;
      return cell;
    });
  });
}
