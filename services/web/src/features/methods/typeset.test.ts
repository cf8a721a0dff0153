import { methodPages } from '@cairnstep/statistics';
import { describe, expect, it } from 'vitest';
import { symbolMeanings, typeset } from './typeset.ts';

const written = (line: string) =>
  typeset(line)
    .map(({ text, place }) => (place === 'line' ? text : place === 'below' ? `[${text}]` : `<${text}>`))
    .join('');

describe('a formula', () => {
  it('lowers and raises letters, numbers, and what braces hold', () => {
    expect(written('s_1^2 / n_1')).toBe('s[1]<2> / n[1]');
    expect(written('g_1 = m_3 / m_2^1.5, m_k')).toBe('g[1] = m[3] / m[2]<1.5>, m[k]');
    expect(written('(x_{i+1} − x_i)')).toBe('(x[i+1] − x[i])');
    expect(written('√((X′X)^{−1}_jj); e^{b ± z SE}')).toBe('√((X′X)<−1>[jj]); e<b ± z SE>');
  });

  it('leaves plain lines whole', () => {
    expect(typeset('median and quartiles of type 7')).toEqual([{ text: 'median and quartiles of type 7', place: 'line' }]);
    expect(typeset('')).toEqual([]);
  });

  it('is read to its end on every page', () => {
    for (const line of methodPages.flatMap(({ formula }) => formula)) {
      for (const { text, place } of typeset(line)) {
        expect(text).not.toBe('');
        if (place === 'line') expect(text).not.toMatch(/[_^{}]/);
      }
    }
  });

  it('explains the signs it uses, and no others', () => {
    expect(symbolMeanings(['mean x̄ = Σx / n'])).toEqual(['A bar: the mean.', 'Σ: the sum, over people, groups or cells.']);
    expect(symbolMeanings(['x̄ ± t(0.975, n − 1) s / √n']).join(' ')).toMatch(/^A bar: the mean\. t\(p, v\): quantile/);
    expect(symbolMeanings(['median and quartiles of type 7'])).toEqual([]);
  });
});
