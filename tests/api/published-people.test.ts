/** Published participants, uploaded as a clinic would, must come out of the grid as their papers print them. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Cell, Grid } from '../../packages/contract/src/index.ts';
import { examCells } from '../support/exams.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { participantCode, rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { submitMonth } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
});
afterAll(() => server.close());

const gridOf = async (query: string): Promise<Grid> =>
  (await coordinator.get(`/api/explore/grid?siteId=${site.id}&${query}`).expect(200)).body as Grid;
const shown = (cell: Cell | undefined) => {
  if (cell?.state !== 'shown') throw new Error(`expected a figure, found ${cell?.state}`);
  return cell;
};
const column = (grid: Grid, grade: string) => grid.columnTotals[grid.grades.findIndex((one) => one === grade)];

/**
 * Edwards DJ et al., Spinal Cord 2022;60:522-32 (PMC9209325), table 3, the fifteen rows in print order: sex, age, years since injury, AIS,
 * and speed of the 10 m walk at baseline in m/s. The single level is the most rostral of the four printed ones.
 */
const trial: readonly (readonly [
  sex: 'female' | 'male',
  age: number,
  years: number | null,
  ais: 'C' | 'D',
  nli: string,
  speed: number | null,
])[] = [
  ['female', 41, 22.3, 'C', 'C8', 0.18],
  ['male', 26, 7.8, 'C', 'T10', 0.34],
  ['female', 38, 2.1, 'C', 'T11', 0.41],
  ['male', 48, 8.0, 'D', 'C3', 0.22],
  ['male', 48, 28.5, 'D', 'C4', 0.43],
  ['male', 37, 2.3, 'D', 'C6', 0.38],
  ['female', 35, 9.3, 'C', 'T1', 0.16],
  ['male', 58, 7.2, 'D', 'C5', 0.34],
  ['female', 48, 1.2, 'D', 'C4', 0.26],
  ['female', 46, 8.1, 'C', 'C7', 0.42],
  ['male', 34, 1.6, 'C', 'T6', 0.09],
  ['male', 41, 2.4, 'D', 'C3', null],
  ['female', 61, null, 'C', 'T10', 0.24],
  ['female', 28, 2.8, 'D', 'T5', 0.3],
  ['female', 34, 10.4, 'C', 'C6', 0.09],
];

describe('fifteen people of a published trial', () => {
  beforeAll(async () => {
    const codes = trial.map((_, index) => participantCode(index + 1));
    await submitMonth(server, coordinator, site, '2026-01', {
      participants: trial.map(([sex, age, years], index) => {
        const days = years === null ? null : Math.round(years * 365.25);
        return rowOf('participants', {
          participant: codes[index] ?? '',
          sex,
          age_at_index: age,
          days_injury_to_index: days,
          injury_year: 2026 - Math.ceil(years ?? 10),
        });
      }),
      consents: codes.map((participant) => rowOf('consents', { participant })),
      exams: trial.map(([, , , ais, nli], index) =>
        rowOf('exams', { participant: codes[index] ?? '', exam_day: -3, ...examCells(nli, ais) }),
      ),
      assessments: trial.flatMap(([, , , , , speed], index) =>
        speed === null
          ? []
          : [
              rowOf('assessments', {
                participant: codes[index] ?? '',
                measure: 'tmwt_ss',
                assessment_day: -1,
                value: speed,
                time_s: Number((10 / speed).toFixed(2)),
              }),
            ],
      ),
    });
  });

  // Expected values computed from the printed rows with the sample SD: AIS C n 8, mean 0.2412 (SD 0.1343); AIS D n 6, 0.3217 (0.0776); all n 14, 0.2757 (0.1172).
  it('has the means and sample SDs of the printed speeds, by grade', async () => {
    const grid = await gridOf('outcome=tmwt_ss&statistic=baseline');
    for (const [cell, n, mean, sd] of [
      [column(grid, 'C'), 8, 0.2412, 0.1343],
      [column(grid, 'D'), 6, 0.3217, 0.0776],
      [grid.total, 14, 0.2757, 0.1172],
    ] as const) {
      expect(shown(cell).n).toBe(n);
      expect(Math.abs(shown(cell).mean - mean)).toBeLessThanOrEqual(0.0001);
      expect(Math.abs((shown(cell).sd ?? NaN) - sd)).toBeLessThanOrEqual(0.0001);
    }
    // The missing speed of row 12 is missing, not zero, and leaves no one uncounted.
    expect(grid.leftOut).toMatchObject({ noBaseline: 1, unable: 0, levelOrGradeNotDeterminable: 0 });
  });

  it('stands in the cells of its levels and grades', async () => {
    const grid = await gridOf('outcome=tmwt_ss&statistic=baseline');
    const n = Object.fromEntries(
      grid.rows.flatMap((row) =>
        row.cells.flatMap((cell, index) => (cell.state === 'shown' ? [[`${row.levelGroup} ${grid.grades[index]}`, cell.n]] : [])),
      ),
    );
    // Counted by hand from the rows above that have a speed.
    expect(n).toEqual({ 'c1_c4 D': 3, 'c5_c8 C': 3, 'c5_c8 D': 2, 't1_t9 C': 2, 't1_t9 D': 1, 't10_t12 C': 3 });
    expect(grid.levels.filter((level) => (level.participants ?? 0) > 0).map((level) => `${level.level} ${level.participants}`)).toEqual([
      'C3 2', 'C4 2', 'C5 1', 'C6 2', 'C7 1', 'C8 1', 'T1 1', 'T5 1', 'T6 1', 'T10 2', 'T11 1',
    ]); // prettier-ignore
  });
});

/**
 * Gagnon DH et al., J Neuroeng Rehabil 2018 (doi 10.1186/s12984-018-0354-2), table 2: speed in the device at the first and last session, m/s,
 * of the nine people with both. No level is printed, so none is uploaded.
 */
const feasibility: readonly (readonly [first: number, last: number])[] = [
  [0.16, 0.29], [0.19, 0.3], [0.12, 0.24], [0.16, 0.23], [0.16, 0.27], [0.13, 0.3], [0.13, 0.24], [0.17, 0.17], [0.16, 0.29],
]; // prettier-ignore

describe('nine people of a published feasibility study', () => {
  beforeAll(async () => {
    const codes = feasibility.map((_, index) => participantCode(101 + index));
    const speed = (participant: string, value: number, day: number, timepoint: string) =>
      rowOf('assessments', {
        participant,
        in_device: 'yes',
        value,
        assessment_day: day,
        timepoint,
        time_s: Number((10 / value).toFixed(2)),
      });
    await submitMonth(server, coordinator, site, '2026-02', {
      participants: codes.map((participant) => rowOf('participants', { participant })),
      consents: codes.map((participant) => rowOf('consents', { participant })),
      assessments: feasibility.flatMap(([first, last], index) => [
        speed(codes[index] ?? '', first, 0, 'baseline'),
        speed(codes[index] ?? '', last, 50, 'end_of_course'),
      ]),
    });
  });

  // Computed from the printed speeds with the sample SD: first 0.1533 (0.0224), last 0.2589 (0.0431), change 0.1056 (0.0475).
  it.each([
    ['baseline', 0.1533, 0.0224],
    ['end', 0.2589, 0.0431],
    ['change', 0.1056, 0.0475],
  ])('has the %s of the printed speeds', async (statistic, mean, sd) => {
    const grid = await gridOf(`outcome=tmwt_ss&inDevice=yes&statistic=${statistic}`);
    expect(shown(grid.total).n).toBe(9);
    expect(Math.abs(shown(grid.total).mean - mean)).toBeLessThanOrEqual(0.00005);
    expect(Math.abs((shown(grid.total).sd ?? NaN) - sd)).toBeLessThanOrEqual(0.00005);
    expect(grid.leftOut.levelOrGradeNotDeterminable).toBe(9);
  });

  it('never mixes results in the device with results without it', async () => {
    const free = await gridOf('outcome=tmwt_ss&statistic=baseline');
    expect(shown(free.total).n).toBe(14);
  });
});
