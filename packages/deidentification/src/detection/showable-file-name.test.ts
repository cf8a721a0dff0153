import { describe, expect, it } from 'vitest';
import { showableFileName } from './showable-file-name.ts';

const shown = (name: string) => showableFileName(name, { table: 'bouts', siteCode: 'S02', month: '2026-11' });

describe('the name of a file', () => {
  it.each([
    'bouts.csv',
    'S02_2026-11_Bouts_v2.csv',
    'S02-2026-11-findings.xlsx',
    'training data final (1).csv',
    'Adverse-Events.csv',
    'sessions 202611.csv',
  ])('stays when it is made of words of the registry: %s', (name) => {
    expect(shown(name)).toBe(name);
  });

  it.each([
    'SMITH John.csv',
    'smith_j_bouts.csv',
    'bouts 12-05-61.csv',
    'bouts-19610512.csv',
    'bouts 2025.csv',
    '../../etc/bouts.csv',
    '=bouts.csv',
    'bouts\u202ecsv.csv',
  ])('is put by that of its table otherwise: %s', (name) => {
    expect(shown(name)).toBe('bouts.csv');
  });

  it('of a workbook is put by a plain one', () => {
    expect(showableFileName('Jane Roe.xlsx', { table: 'workbook', siteCode: 'S02', month: '2026-11' })).toBe('workbook.xlsx');
  });
});
