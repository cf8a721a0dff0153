/** The pages say what the server does: their values are held to the server's own. */
import { regionGroups } from '@cairnstep/scoring';
import { describe, expect, it } from 'vitest';
import { regions, tenYearBands, threeBands } from '../../../../api/src/features/exports/export-tables.ts';
import { generalise, smallestClass } from '../../../../api/src/features/exports/generalise.ts';
import { examWindowDays as serverExamWindowDays } from '../../../../api/src/features/submissions/facts-sql.ts';
import { examWindowDays, largestPercentLeftOut, smallestExportClass, tenYearEdges, threeBandEdges } from './policy.ts';

const person = { levelGroup: 'c5_c8', ais: 'A', age: 35, sex: 'male' };
const times = <T>(count: number, one: T): T[] => Array.from({ length: count }, () => one);

/** Codes of bands as exports write them, from the first years of all but the youngest. */
const bandCodes = (edges: readonly number[]): string[] => [
  `under${edges[0]}`,
  ...edges.slice(0, -1).map((from, at) => `${from}to${(edges[at + 1] ?? 0) - 1}`),
  `${edges.at(-1)}plus`,
];

describe('what the pages state of the server', () => {
  it('is its window for the baseline exam', () => {
    expect(examWindowDays).toBe(serverExamWindowDays);
  });

  it('is its smallest class in an export', () => {
    expect(smallestExportClass).toBe(smallestClass);
    expect(generalise(times(smallestExportClass - 1, person))).toBeNull();
    expect(generalise(times(smallestExportClass, person))).not.toBeNull();
  });

  it('is its bands of age and its regions', () => {
    expect(bandCodes(tenYearEdges)).toEqual(tenYearBands);
    expect(bandCodes(threeBandEdges)).toEqual(threeBands);
    const edges = (id: string) => regionGroups.groups.find((group) => group.id === id);
    expect(regions.map(({ code, label }) => [code, label])).toEqual([
      ['cervical', `${edges('cervical')?.first} to ${edges('cervical')?.last}`],
      ['thoracic', `${edges('thoracic')?.first} to ${edges('thoracic')?.last}`],
      ['lumbosacral', `${edges('lumbar')?.first} to ${edges('sacral')?.last}`],
      ['other', 'intact or not determinable'],
    ]);
  });

  it('is the share of people it leaves out rather than coarsening everyone', () => {
    const others = { ...person, sex: 'female' };
    const atLimit = generalise([...times(100 - largestPercentLeftOut + 1, person), ...times(largestPercentLeftOut - 1, others)]);
    expect(atLimit?.leftOut).toBe(largestPercentLeftOut - 1);
    const people = [...times(40, person), ...times(4, others)];
    expect((4 / people.length) * 100).toBeGreaterThan(largestPercentLeftOut);
    expect(generalise(people)?.leftOut).toBe(0);
  });
});
