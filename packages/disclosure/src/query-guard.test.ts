import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { guardVectors } from '../reference/guard-vectors.ts';
import type { AnsweredSet, PeopleSet } from './index.ts';
import { HIDDEN, judgeQuestion, peopleSet, protectTable, sitesHoldingTheCut } from './index.ts';

const people = (from: number, to: number) => peopleSet(Array.from({ length: to - from }, (_, at) => from + at));
const everyone = people(0, 600);
const answered = (...sets: PeopleSet[]): AnsweredSet[] => sets.map((set) => ({ project: 'p', cut: '2026-01', people: set }));
const verdict = (set: PeopleSet, earlier: readonly AnsweredSet[], cut = '2026-01') =>
  judgeQuestion({ project: 'p', cut, people: set, everyone }, earlier).verdict;

describe('judgeQuestion', () => {
  it.each(guardVectors)('$number: $says', ({ earlier, asked, expected }) => {
    const sets = earlier.map(({ project, cut, members }) => ({ project, cut, people: peopleSet(members) }));
    const judgement = judgeQuestion({ project: asked.project, cut: asked.cut, people: peopleSet(asked.members), everyone }, sets);
    expect(judgement.verdict).toBe(expected);
  });

  it('names the stored answer that is given again', () => {
    const [earlier] = answered(people(0, 24));
    expect(judgeQuestion({ project: 'p', cut: '2026-01', people: people(0, 24), everyone }, earlier ? [earlier] : [])).toEqual({
      verdict: 'answer-as-before',
      answered: earlier,
    });
  });

  it('refuses a set that with an answered one makes up another answered one, but for a person', () => {
    const earlier = answered(people(0, 100), people(0, 60));
    expect(verdict(people(60, 100), earlier)).toBe('answer');
    expect(verdict(people(61, 100), earlier)).toBe('refuse');
  });

  it('refuses a set that is nearly the rest of everyone after two answered ones', () => {
    const earlier = answered(people(0, 200), people(200, 400));
    expect(verdict(people(400, 600), earlier)).toBe('answer');
    expect(verdict(people(400, 595), earlier)).toBe('refuse');
  });

  it('refuses an overlap that three answers give but for a few', () => {
    const union = people(0, 90);
    const earlier = answered(people(0, 50), people(30, 90), union);
    expect(verdict(people(30, 50), earlier)).toBe('answer');
    expect(verdict(people(32, 50), earlier)).toBe('refuse');
  });

  it('passes over what other projects were told', () => {
    const other = answered(people(0, 30)).map((set) => ({ ...set, project: 'another' }));
    expect(verdict(people(0, 29), answered(people(0, 30)))).toBe('refuse');
    expect(verdict(people(0, 29), other)).toBe('answer');
  });

  it('takes a stricter size from policy and no looser one', () => {
    const question = { project: 'p', cut: '2026-01', people: people(0, 15), everyone };
    expect(judgeQuestion(question, []).verdict).toBe('answer');
    expect(judgeQuestion(question, [], 20)).toEqual({ verdict: 'refuse', reason: 'too-few-people' });
    expect(() => judgeQuestion(question, [], 5)).toThrow(RangeError);
  });

  it('never answers a set from which up to three earlier answers single out 1 to 10 people', () => {
    const small = fc.uniqueArray(fc.integer({ min: 0, max: 59 }), { minLength: 11, maxLength: 50 });
    const cohort = people(0, 60);
    const counts = (sets: readonly (readonly number[])[], person: number) => sets.filter((set) => set.includes(person)).length;
    fc.assert(
      fc.property(fc.array(small, { minLength: 1, maxLength: 4 }), small, (earlier, asked) => {
        const sets = earlier.map((members): AnsweredSet => ({ project: 'p', cut: 'c', people: peopleSet(members) }));
        if (judgeQuestion({ project: 'p', cut: 'c', people: peopleSet(asked), everyone: cohort }, sets).verdict !== 'answer') return;
        for (let code = 0; code < 3 ** earlier.length; code++) {
          const signs = earlier.map((_, at) => Math.floor(code / 3 ** at) % 3);
          if (signs.filter((sign) => sign !== 0).length > 3) continue;
          const added = [asked, ...earlier.filter((_, at) => signs[at] === 1)];
          const taken = earlier.filter((_, at) => signs[at] === 2);
          const left = Array.from({ length: 60 }, (_, person) => counts(added, person) - counts(taken, person)).filter(
            (n) => n !== 0,
          ).length;
          expect(left === 0 || left > 10).toBe(true);
        }
      }),
      { seed: 41, numRuns: 200 },
    );
  });
});

describe('sitesHoldingTheCut', () => {
  it('holds a cut in which one site changed by a few people only', () => {
    const before = new Map([
      ['north', people(0, 40)],
      ['south', people(100, 130)],
    ]);
    const grown = new Map([
      ['north', people(0, 51)],
      ['south', people(100, 130)],
    ]);
    expect(sitesHoldingTheCut(before, grown)).toEqual([]);
    expect(sitesHoldingTheCut(before, new Map([...grown, ['south', people(101, 130)]]))).toEqual(['south']);
    expect(sitesHoldingTheCut(before, new Map([...grown, ['east', people(200, 204)]]))).toEqual(['east']);
  });

  it('counts those who joined and those who left together', () => {
    const before = new Map([['north', people(0, 40)]]);
    expect(sitesHoldingTheCut(before, new Map([['north', people(1, 45)]]))).toEqual(['north']);
    expect(sitesHoldingTheCut(before, new Map([['north', people(1, 50)]]))).toEqual([]);
  });
});

describe('a table with one cell of 7', () => {
  it('hides a second cell in that row and that column, row and column totals shown', () => {
    const { published } = protectTable({
      counts: [
        [7, 24, 19],
        [31, 16, 28],
      ],
    });
    const hiddenInRow = published.cells[0]?.filter((count) => count === HIDDEN).length;
    const hiddenInColumn = published.cells.filter((row) => row[0] === HIDDEN).length;
    expect([hiddenInRow, hiddenInColumn]).toEqual([2, 2]);
    expect([...published.rowTotals, ...published.columnTotals]).not.toContain(HIDDEN);
  });
});
