import { describe, expect, it } from 'vitest';
import { formatCells, parseCells } from '../../lib/cohort.ts';
import { exampleGrid } from '../../testing/example-grid.ts';
import { chooseLevels, rangeOf, segmentsByGroup, toggle } from './selection.ts';

const after = (cells: Parameters<typeof formatCells>[0]) => formatCells(cells);

describe('choosing cells', () => {
  it('adds what is not chosen, and takes out what all is', () => {
    const some = parseCells('c5_c8.C');
    expect(after(toggle(some, parseCells('c5_c8.C.D')))).toBe('c5_c8.C.D');
    expect(after(toggle(parseCells('c5_c8.C.D-t1_t9.D'), parseCells('c5_c8.C.D')))).toBe('t1_t9.D');
    expect(after(toggle(some, some))).toBeNull();
  });
});

describe('choosing levels', () => {
  it('chooses all of every level group that the range touches', () => {
    expect(after(chooseLevels(exampleGrid, [], { from: 'C8', to: 'T2' }))).toBe('c5_c8.A.B.C.D.E.ND-t1_t9.A.B.C.D.E.ND');
  });

  it('keeps the grades chosen before when they are the same in every row', () => {
    expect(after(chooseLevels(exampleGrid, parseCells('c5_c8.C.D-t1_t9.C.D'), { from: 'L1', to: 'L2' }))).toBe('l1_l5.C.D');
    expect(after(chooseLevels(exampleGrid, parseCells('c5_c8.C-t1_t9.D'), { from: 'L1', to: 'L1' }))).toBe('l1_l5.A.B.C.D.E.ND');
  });

  it('gives up the choice when all levels are wanted', () => {
    expect(chooseLevels(exampleGrid, parseCells('c5_c8.C'), null)).toEqual([]);
  });

  it('counts S4-5, which is never a level, to the group above it', () => {
    expect(segmentsByGroup(exampleGrid.levels).at(-1)).toEqual({ levelGroup: 's1_s3', segments: ['S1', 'S2', 'S3', 'S4-5'] });
  });
});

describe('the range the level column shows', () => {
  it('runs over the chosen rows when they lie together', () => {
    expect(rangeOf(exampleGrid, parseCells('c5_c8.C-t1_t9.D'))).toEqual({ from: 'C5', to: 'T9' });
  });

  it('is none when rows between are left out, or nothing on the spine is chosen', () => {
    expect(rangeOf(exampleGrid, parseCells('c5_c8.C-l1_l5.D'))).toBeNull();
    expect(rangeOf(exampleGrid, parseCells('intact.E-ND.ND'))).toBeNull();
    expect(rangeOf(exampleGrid, [])).toBeNull();
  });
});
