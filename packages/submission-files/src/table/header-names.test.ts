import { tableKeys, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { HeaderNames } from './header-names.ts';

const headers = tableKeys.flatMap((table) =>
  tableOf(table).variables.flatMap((variable) =>
    [variable.key, variable.key.toUpperCase(), variable.key.replaceAll('_', ' ')].map((header) => ({ table, key: variable.key, header })),
  ),
);

describe('HeaderNames', () => {
  it('finds every column of every table by its key, however it is written', () => {
    const names = new Map(tableKeys.map((table) => [table, new HeaderNames(table)]));
    for (const { table, key, header } of headers) {
      const meaning = names.get(table)?.meaning(header);
      expect(meaning?.kind === 'column' && meaning.variable.key, `${table} ${header}`).toBe(key);
    }
  });

  it('finds every column by its name and by each alias that no other column has for a key', () => {
    for (const table of tableKeys) {
      const names = new HeaderNames(table);
      for (const { key, name, aliases = [] } of tableOf(table).variables) {
        for (const header of [name, ...aliases]) {
          const meaning = names.meaning(header);
          expect(meaning.kind === 'column' && meaning.variable.key, `${table} ${header}`).toBe(key);
        }
      }
    }
  });

  it('gives each column its position in the dictionary', () => {
    const names = new HeaderNames('sessions');
    tableOf('sessions').variables.forEach(({ key }, position) => expect(names.meaning(key)).toMatchObject({ position }));
  });

  it('takes a unit at the end of a key for a unit, and a word there for a part of the name', () => {
    const names = new HeaderNames('sessions');
    expect(names.meaning('body mass')).toMatchObject({ kind: 'column', variable: { key: 'body_mass_kg' } });
    expect(names.meaning('HR peak (/min)')).toMatchObject({ kind: 'column', variable: { key: 'hr_peak' } });
    // The lowest pressure is not the minute of it.
    for (const header of ['bp_min', 'BP min']) expect(names.meaning(header)).toEqual({ kind: 'undeclared' });
  });

  it('does not look closer at a header longer than any name', () => {
    expect(new HeaderNames('bouts').meaning(`${' '.repeat(50_000)}(m)`)).toEqual({ kind: 'undeclared' });
  });
});
