import { describe, expect, it } from 'vitest';
import { parseCells } from '../../lib/cohort.ts';
import { exampleGrid, hidden } from '../../testing/example-grid.ts';
import { cohortCount, gridInWords } from './grid-words.ts';

const plain = (text: string) => text.replaceAll('\u00A0', ' ');

describe('the grid in words', () => {
  it('says the figure of everyone, how far group means run, and how many groups are not shown', () => {
    expect(plain(gridInWords(exampleGrid))).toBe(
      'Mean change from baseline to end of course in Walking speed, without the training device: ' +
        '+0.131 m/s (95% CI 0.081 to 0.181; n = 112) for everyone in release 3. ' +
        'Group means run from +0.090 m/s (95% CI 0.040 to 0.140; n = 26) in C5–C8, AIS C, ' +
        'to +0.150 m/s (95% CI 0.100 to 0.200; n = 17) in T1–T9, AIS C. ' +
        'Of 48 groups, 3 can be shown and 3 are not shown.',
    );
  });

  it('says no figure of everyone where that is hidden', () => {
    expect(gridInWords({ ...exampleGrid, total: hidden })).toContain(': not shown for everyone in release 3.');
  });
});

describe('the cohort as "n of N"', () => {
  const count = (cells: string, grid = exampleGrid) => cohortCount(grid, parseCells(cells));

  it('counts shown cells and only says of hidden ones that they are there', () => {
    expect(count('c5_c8.C.D')).toBe('77 of 112 people with both values');
    expect(count('c5_c8.C-t1_t9.C.D')).toBe('43 of 112 people with both values, and those in 1 group that is not shown');
    expect(count('t1_t9.B.D')).toBe('People in 2 groups that are not shown');
  });

  it('is everyone when nothing is chosen', () => {
    expect(count('')).toBe('Everyone: 112 people with both values');
  });

  it('has no N where the total is hidden', () => {
    expect(count('c5_c8.C', { ...exampleGrid, total: hidden })).toBe('26 people with both values');
    expect(count('', { ...exampleGrid, total: hidden })).toBe('Everyone with both values');
  });

  it('rests on people with the one value in a site’s own figures', () => {
    const site = { id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a11', code: 'S01', name: 'North Harbour Clinic' };
    expect(count('c5_c8.C', { ...exampleGrid, site, release: null, statistic: 'baseline' })).toBe('26 of 112 people with the value');
  });
});
