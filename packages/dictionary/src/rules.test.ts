import { describe, expect, it } from 'vitest';
import { ruleOf, rules } from './rules.ts';
import { tableKeys } from './types.ts';

const idsOf = (letter: string): string[] => rules.filter(({ id }) => id.startsWith(letter)).map(({ id }) => id);
const numbered = (letter: string, count: number): string[] =>
  Array.from({ length: count }, (_, index) => `${letter}${String(index + 1).padStart(2, '0')}`);

describe('rules', () => {
  it('are numbered without gap by what they are about', () => {
    expect(idsOf('C')).toEqual(numbered('C', 18));
    expect(idsOf('E')).toEqual(numbered('E', 9));
    expect(idsOf('T')).toEqual(numbered('T', 18));
    expect(idsOf('A')).toEqual(numbered('A', 8));
    expect(idsOf('R')).toEqual(numbered('R', 5));
    expect(rules).toHaveLength(58);
  });

  it('say in sentences what they demand, why, and what to do', () => {
    for (const { id, statement, why, mend, source, tables } of rules) {
      for (const text of [statement, why, mend]) expect(text, id).toMatch(/^[A-Z].{10,}\.$/s);
      expect(source.length, id).toBeGreaterThan(5);
      expect(tables.length, id).toBeGreaterThan(0);
      expect(
        tables.every((table) => tableKeys.includes(table)),
        id,
      ).toBe(true);
    }
  });

  it('name in the statement each number that the check uses', () => {
    const inWords: Readonly<Record<string, string>> = { 'T18.walkingTimeFactor': 'half' };
    for (const { id, statement, limits = {} } of rules) {
      for (const [name, value] of Object.entries(limits)) {
        expect(statement, `${id} ${name}`).toMatch(new RegExp(`(^|[^\\d.])${inWords[`${id}.${name}`] ?? value}(?!\\d|\\.\\d)`));
      }
    }
  });

  it('refuse an unknown id', () => {
    expect(ruleOf('T13').severity).toBe('warning');
    expect(() => ruleOf('Z99')).toThrow(RangeError);
  });
});
