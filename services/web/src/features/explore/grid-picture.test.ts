import { describe, expect, it } from 'vitest';
import { exampleGrid, hidden, shown } from '../../testing/example-grid.ts';
import { gridPicture } from './grid-picture.ts';

const parsed = (svg: string) => new DOMParser().parseFromString(svg, 'image/svg+xml').documentElement;

describe('the grid as a picture', () => {
  it('names what it shows and its source, and draws one point for each group shown', () => {
    const picture = parsed(gridPicture(exampleGrid));
    expect(picture.querySelector('title')?.textContent).toBe('Mean change from baseline to end of course: Walking speed, m/s');
    expect(picture.textContent).toContain('Release 3, 2 November 2026');
    // Three groups, two row totals, one column total, everyone.
    expect(picture.querySelectorAll('circle')).toHaveLength(7);
  });

  it('has nothing of a hidden group but the mark', () => {
    const [first, ...others] = exampleGrid.rows;
    if (first === undefined) throw new Error('The grid has rows.');
    const all = { ...first, cells: first.cells.map(() => hidden), total: hidden };
    const before = gridPicture({ ...exampleGrid, rows: [{ ...all, cells: first.cells.map(() => shown(987, 6.54)) }, ...others] });
    expect(before).toContain('987');
    const after = gridPicture({ ...exampleGrid, rows: [all, ...others] });
    expect(after).not.toMatch(/987|6\.54/);
  });

  it('takes words as words', () => {
    const svg = gridPicture({ ...exampleGrid, notes: ['<script>alert("1")</script> & more'] });
    expect(svg).not.toContain('<script>');
    expect(parsed(svg).textContent).toContain('<script>alert("1")</script> & more');
  });
});
