import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constructedCases } from '../reference/constructed-cases.ts';
import { flatResults, resultNames } from '../reference/flat-results.ts';
import { classifyNaively } from '../reference/naive-classifier.ts';
import { eachPossibleExam, motorTags, sensoryTags, withCell, withoutTags } from '../reference/open-cells.ts';
import { randomExam, seededRandom } from '../reference/random-exams.ts';
import { cellPlaces } from './cell-key.ts';
import { classify } from './classify.ts';
import type { Determined } from './classification.ts';
import type { Exam } from './exam.ts';
import { UnreadableCellError } from './read-side.ts';

/** A result as the constructed cases print it. */
function printed(result: Determined<string>): string {
  return result.values.join(',') + (result.tagged ? '*' : '');
}

function printedSides(results: Readonly<Record<'right' | 'left', Determined<string>>>) {
  return { right: printed(results.right), left: printed(results.left) };
}

const anyExam = fc
  .record({ seed: fc.nat(), kind: fc.constantFrom('noise' as const, 'levelled' as const) })
  .map(({ seed, kind }) => randomExam(seededRandom(seed), kind));

const motorPlaces = cellPlaces.filter((place) => place.modality === 'motor');
const perianalPlaces = cellPlaces.filter((place) => place.segment === 'S4_5');

type Edit = (exam: Exam) => Exam;
type Marks = 'NT' | 'tags' | 'both';

/** An edit that makes one cell NT or tagged, often where it matters: a key muscle or S4-5. */
function openCell(marks: Marks): fc.Arbitrary<Edit> {
  const anyPlace = fc.oneof(fc.constantFrom(...cellPlaces), fc.constantFrom(...motorPlaces), fc.constantFrom(...perianalPlaces));
  return anyPlace.chain((place) => {
    const tags = place.modality === 'motor' ? motorTags : sensoryTags;
    const written = marks === 'NT' ? ['NT'] : marks === 'tags' ? tags : ['NT', 'NT', 'NT', ...tags];
    return fc.constantFrom(...written).map(
      (cell): Edit =>
        (exam) =>
          withCell(exam, place, cell),
    );
  });
}

const openObservation = fc.constantFrom<Edit[]>(
  (exam) => ({ ...exam, vac: 'NT' }),
  (exam) => ({ ...exam, dap: 'NT' }),
);

/** An exam with up to four open cells, so that at most 1,296 determinate exams stand behind it. */
function openExam(marks: Marks): fc.Arbitrary<Exam> {
  const cell = openCell(marks);
  const edit = marks === 'tags' ? cell : fc.oneof({ weight: 6, arbitrary: cell }, { weight: 1, arbitrary: openObservation });
  return fc
    .record({ exam: anyExam, edits: fc.array(edit, { minLength: 1, maxLength: 4 }), earlierDeficit: fc.boolean() })
    .map(({ exam, edits, earlierDeficit }) => edits.reduce<Exam>((edited, apply) => apply(edited), { ...exam, earlierDeficit }));
}

/** The set of each result over every determinate exam that an exam can stand for, trying them all. */
function enumerated(exam: Exam): Record<string, string[]> {
  const sets = new Map<string, Set<string>>(resultNames.map((name) => [name, new Set()]));
  eachPossibleExam(exam, (determinate) => {
    const results = flatResults(classify(determinate));
    for (const name of resultNames) sets.get(name)?.add(results[name].values[0] as string);
  });
  return Object.fromEntries([...sets].map(([name, values]) => [name, [...values].sort()]));
}

function sortedSets(exam: Exam): Record<string, string[]> {
  const results = flatResults(classify(exam));
  return Object.fromEntries(resultNames.map((name) => [name, [...results[name].values].sort()]));
}

describe('constructed examinations', () => {
  for (const { id, about, exam, expected } of constructedCases) {
    it(`classifies ${id}: ${about}`, () => {
      const found = classify(exam);
      expect({
        sensoryLevel: printedSides(found.sensoryLevel),
        motorLevel: printedSides(found.motorLevel),
        nli: printed(found.nli),
        completeness: printed(found.completeness),
        ais: printed(found.ais),
        zppSensory: printedSides(found.zppSensory),
        zppMotor: printedSides(found.zppMotor),
        totals: found.totals,
      }).toEqual(expected);
    });
  }
});

describe('determinate exams', () => {
  it('come out as by a second classifier that follows the standard step by step', () => {
    for (const kind of ['noise', 'levelled'] as const) {
      const random = seededRandom(20191);
      for (let count = 0; count < 10_000; count++) {
        const exam = randomExam(random, kind);
        const results = flatResults(classify(exam));
        const expected = classifyNaively(exam);
        for (const name of resultNames) {
          if (results[name].values.length !== 1 || results[name].values[0] !== expected[name]) {
            expect({ kind, count, name, values: results[name].values }).toEqual({ kind, count, name, values: [expected[name]] });
          }
        }
      }
    }
  });

  it('give no grade to a normal exam without an earlier deficit, and E with one', () => {
    const normal = constructedCases.find(({ id }) => id === 'case-14')?.exam as Exam;
    const contracting: Exam = { ...normal, vac: 'Yes', dap: 'Yes' };
    expect(classify({ ...contracting, earlierDeficit: true }).ais.values).toEqual(['E']);
    expect(classify({ ...contracting, earlierDeficit: false }).ais.values).toEqual(['none']);
    const { earlierDeficit: _unknown, ...notOnRecord } = contracting;
    expect(classify(notOnRecord).ais.values).toEqual(['none']);
  });

  it('keep E when deep anal pressure is not felt but S4-5 is normal', () => {
    const normal = constructedCases.find(({ id }) => id === 'case-14')?.exam as Exam;
    expect(classify({ ...normal, vac: 'Yes', dap: 'No', earlierDeficit: true }).ais.values).toEqual(['E']);
  });
});

describe('exams with open cells', () => {
  for (const [marks, seed] of [
    ['NT', 41],
    ['tags', 42],
    ['both', 43],
  ] as const) {
    it(`have exactly the results of every exam they can stand for (${marks})`, () => {
      fc.assert(
        fc.property(openExam(marks), (exam) => {
          expect(sortedSets(exam)).toEqual(enumerated(exam));
        }),
        { seed, numRuns: 800 },
      );
    });
  }

  it('star a result exactly when the same exam without tags gives another set', () => {
    fc.assert(
      fc.property(openExam('both'), (exam) => {
        const results = flatResults(classify(exam));
        const untagged = sortedSets(withoutTags(exam));
        for (const name of resultNames) {
          expect(results[name].tagged).toBe([...results[name].values].sort().join() !== untagged[name]?.join());
        }
      }),
      { seed: 44, numRuns: 1500 },
    );
  });

  it('reach the exact motor zone where a non-key muscle may make the grade', () => {
    // Sacral sensation without contraction and a non-key entry on each side: the zone depends on the grade of both sides.
    const decisive = fc.record({
      exam: openExam('both'),
      right: fc.constantFrom('L2', 'L4', 'S1'),
      left: fc.constantFrom('T1', 'L3', 'L5'),
    });
    fc.assert(
      fc.property(decisive, ({ exam, right, left }) => {
        const entered = {
          ...exam,
          vac: 'No',
          dap: 'Yes',
          right: { ...exam.right, nonKey: right },
          left: { ...exam.left, nonKey: left },
        } as Exam;
        expect(sortedSets(entered)).toEqual(enumerated(entered));
      }),
      { seed: 45, numRuns: 800 },
    );
  });

  it('widen and never lose a value when one more cell becomes NT', () => {
    fc.assert(
      fc.property(openExam('both'), fc.constantFrom(...cellPlaces), (exam, place) => {
        const before = sortedSets(exam);
        const after = flatResults(classify(withCell(exam, place, 'NT')));
        // A tag may stand for less than its own score (1* counts as altered, 1** as normal): NT always covers both.
        for (const name of resultNames) expect(after[name].values).toEqual(expect.arrayContaining(before[name] as string[]));
      }),
      { seed: 47, numRuns: 1500 },
    );
  });
});

describe('invariants', () => {
  const order = ['A', 'B', 'C', 'D', 'E', 'none'];

  it('mirror the results when the sides change places', () => {
    fc.assert(
      fc.property(openExam('both'), (exam) => {
        const found = classify(exam);
        const mirrored = classify({ ...exam, right: exam.left, left: exam.right });
        expect(mirrored.nli).toEqual(found.nli);
        expect(mirrored.ais).toEqual(found.ais);
        expect(mirrored.completeness).toEqual(found.completeness);
        for (const result of ['sensoryLevel', 'motorLevel', 'zppSensory', 'zppMotor'] as const) {
          expect(mirrored[result].right).toEqual(found[result].left);
          expect(mirrored[result].left).toEqual(found[result].right);
        }
      }),
      { seed: 48, numRuns: 500 },
    );
  });

  it('grade A exactly where the injury is complete, list values in printed order and repeat none', () => {
    fc.assert(
      fc.property(openExam('both'), (exam) => {
        const found = classify(exam);
        expect(found.ais.values.includes('A')).toBe(found.completeness.values.includes('C'));
        expect(found.ais.values.some((grade) => grade !== 'A')).toBe(found.completeness.values.includes('I'));
        expect([...found.ais.values]).toEqual(order.filter((grade) => (found.ais.values as readonly string[]).includes(grade)));
        for (const name of resultNames) {
          const { values } = flatResults(found)[name];
          expect(values.length).toBeGreaterThan(0);
          expect(new Set(values).size).toBe(values.length);
        }
      }),
      { seed: 49, numRuns: 500 },
    );
  });

  it('give a motor zone to every B, and none where contraction is present', () => {
    fc.assert(
      fc.property(anyExam, (exam) => {
        const found = classify(exam);
        if (found.ais.values[0] === 'B') expect(found.zppMotor.right.values).not.toContain('NA');
        expect(found.zppMotor.left.values.includes('NA')).toBe(exam.vac === 'Yes');
      }),
      { seed: 50, numRuns: 1000 },
    );
  });

  it('refuse a cell that the sheet does not allow and say where it stands, not what it holds', () => {
    const exam = constructedCases[0]?.exam as Exam;
    for (const [modality, segment, written] of [
      ['lightTouch', 'T4', '3'],
      ['pinPrick', 'S4_5', '2*'],
      ['motor', 'L2', '5*'],
      ['motor', 'C5', ''],
      ['motor', 'C5', '6'],
    ] as const) {
      const place = cellPlaces.find((cell) => cell.side === 'left' && cell.modality === modality && cell.segment === segment);
      const broken = withCell(exam, place as (typeof cellPlaces)[number], written);
      expect(() => classify(broken)).toThrow(UnreadableCellError);
      expect(() => classify(broken)).toThrow(new RegExp(`left .*${segment} holds no listed value`));
    }
  });
});
