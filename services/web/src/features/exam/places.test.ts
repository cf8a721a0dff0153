import { describe, expect, it } from 'vitest';
import { allCells, columnOf, entryOrders, neighbour, rowOf } from './places.ts';

describe('the places of the sheet', () => {
  it('hold 132 scores and two answers, each once in either order', () => {
    for (const cells of Object.values(entryOrders)) {
      expect(cells).toHaveLength(134);
      expect(new Set(cells)).toEqual(new Set(allCells));
      expect(cells.slice(-2)).toEqual(['vac', 'dap']);
    }
  });

  it('are gone through down a column, right before left, or across a row', () => {
    expect(entryOrders.down.slice(26, 30)).toEqual(['lt_r_s3', 'lt_r_s4_5', 'lt_l_c2', 'lt_l_c3']);
    expect(entryOrders.down.slice(112, 118)).toEqual(['m_r_c5', 'm_r_c6', 'm_r_c7', 'm_r_c8', 'm_r_t1', 'm_r_l2']);
    expect(entryOrders.across.slice(10, 20)).toEqual([
      'pp_r_c4',
      'pp_l_c4',
      'lt_r_c5',
      'lt_l_c5',
      'pp_r_c5',
      'pp_l_c5',
      'm_r_c5',
      'm_l_c5',
      'lt_r_c6',
      'lt_l_c6',
    ]);
  });

  it('lead up and down a column over segments without a key muscle, and to the answers below', () => {
    expect(neighbour('m_r_t1', 'down')).toBe('m_r_l2');
    expect(neighbour('m_r_l2', 'up')).toBe('m_r_t1');
    expect(neighbour('m_r_c5', 'up')).toBe('m_r_c5');
    expect(neighbour('pp_l_s4_5', 'down')).toBe('vac');
    expect(neighbour('m_l_s1', 'down')).toBe('vac');
    expect(neighbour('vac', 'down')).toBe('dap');
    expect(neighbour('dap', 'down')).toBe('dap');
    expect(neighbour('dap', 'up')).toBe('vac');
    expect(neighbour('vac', 'up')).toBe('lt_r_s4_5');
  });

  it('lead along a row, to its ends, to the ends of the sheet, and from region to region', () => {
    expect(rowOf('pp_l_t4')).toEqual(['lt_r_t4', 'lt_l_t4', 'pp_r_t4', 'pp_l_t4']);
    expect(neighbour('pp_l_t4', 'right')).toBe('pp_l_t4');
    expect(neighbour('pp_l_c5', 'right')).toBe('m_r_c5');
    expect(neighbour('lt_l_c5', 'left')).toBe('lt_r_c5');
    expect(neighbour('pp_r_c5', 'rowEnd')).toBe('m_l_c5');
    expect(neighbour('m_l_c5', 'rowStart')).toBe('lt_r_c5');
    expect(neighbour('m_l_c5', 'sheetEnd')).toBe('dap');
    expect(neighbour('dap', 'sheetStart')).toBe('lt_r_c2');
    expect(neighbour('lt_r_c4', 'regionDown')).toBe('lt_r_t1');
    expect(neighbour('lt_r_s2', 'regionDown')).toBe('vac');
    expect(neighbour('lt_r_t5', 'regionUp')).toBe('lt_r_t1');
    expect(neighbour('m_l_l4', 'regionUp')).toBe('m_l_l2');
    expect(neighbour('vac', 'regionUp')).toBe('lt_r_s4_5');
    expect(neighbour('lt_r_c2', 'regionUp')).toBe('lt_r_c2');
  });

  it('stand in columns of 28 scores, or 10 for strength', () => {
    expect(columnOf('lt_l_t5')).toHaveLength(28);
    expect(columnOf('m_l_l5')).toHaveLength(10);
    expect(columnOf('dap')).toEqual(['dap']);
  });
});
