import { dictionary, exampleRow, rowProblems, rules, tableKeys, tableOf } from '@cairnstep/dictionary';
import type { Row, RowProblem, TableKey, Variable } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkSubmission } from './check-submission.ts';
import { FindingLog } from './finding-log.ts';
import { fileRules } from './file-rules.ts';
import { readTable } from './reading/read-csv.ts';
import { submissionRules } from './rules/index.ts';
import { tableFromRows } from './table/table-from-rows.ts';
import { writeCsv } from './writing/write-csv.ts';
import { bout, completeExam, exam, examCells, month, participant, result, session, someone } from './test-support/a-month.ts';
import { checkMonth, encode, placesOf, registry } from './test-support/findings-of.ts';

/** Rules that are kept elsewhere: C16 is about statistics over many rows, and F01 to F15 and F40 on are found while a file is read. */
const keptElsewhere = new Set(['C16', ...fileRules.map(({ id }) => id).filter((id) => id < 'F20' || id >= 'F40')]);

describe('the rules', () => {
  it('have one module for each rule that is stated, and state each one that has a module', () => {
    const stated = [...rules, ...fileRules].map(({ id }) => id).filter((id) => !keptElsewhere.has(id));
    expect(submissionRules.map(({ id }) => id).sort()).toEqual(stated.sort());
  });

  it('have ids of their own', () => {
    const ids = [...rules, ...fileRules].map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });
});

describe('checkSubmission', () => {
  it('finds nothing in the example month', async () => {
    const rows = Object.fromEntries(dictionary.tables.map(({ key }) => [key, [exampleRow(key)]]));
    expect((await checkMonth(rows)).byRule()).toEqual([]);
  });

  it('finds nothing in no files at all', async () => {
    expect((await checkMonth({})).byRule()).toEqual([]);
  });

  it('tells nothing about rows that only the registry holds', async () => {
    const broken = registry({
      participants: [participant({ age_at_index: 4, days_injury_to_index: 9_000 })],
      exams: [exam({ recorded_ais: 'A' })],
      sessions: [session({ hr_peak: 50 })],
      bouts: [bout({ steps: 1 })],
    });
    expect((await checkMonth({}, broken)).byRule()).toEqual([]);
  });

  it('lets a row of a file override the one the registry holds', async () => {
    const held = registry({ sessions: [session({ body_mass_kg: 35 })] });
    expect(placesOf(await checkMonth(month({ bouts: [bout()] }), held), 'T06')).toEqual(['bouts 2 bws_pct']);
    expect(placesOf(await checkMonth(month({ sessions: [session()], bouts: [bout()] }), held), 'T06')).toEqual([]);
  });

  it('checks only single cells when a file could not be read to its end', async () => {
    const findings = new FindingLog();
    const bouts = await readTable('bouts', encode(writeCsv(tableFromRows('bouts', [bout({ hr_end: 231 })]))), findings);
    const sessions = await readTable('sessions', encode('<html>'), findings);
    expect([...findings.incomplete]).toEqual(['sessions']);
    expect(
      checkSubmission({ bouts, sessions }, registry(), findings)
        .byRule()
        .map(({ id }) => id),
    ).toEqual(['F01', 'F21']);
  });

  it('says that dysreflexia is to be expected when the level is T6 or above', async () => {
    const rose = { sessions: [session({ sbp_max: 140 })], bouts: [bout()] };
    const told = async (level: string) => {
      const high = completeExam({ ...examCells({ below: '0', legs: '0', normalTo: level }), recorded_nli: level });
      return (await checkMonth(month({ ...rose, exams: [high] }))).byRule().find(({ id }) => id === 'T13')?.kept[0]?.found;
    };
    expect(await told('T6')).toMatch(/T6 or above/);
    expect(await told('T7')).not.toMatch(/T6/);
  });

  it('repeats no value of the files in its findings', async () => {
    const rows = month({
      participants: [participant({ age_at_index: 91, injury_year: 1987 })],
      exams: [exam({ recorded_ais: 'A', recorded_nli: 'C4' })],
      sessions: [session({ body_mass_kg: 23.75, hr_peak: 61 })],
      bouts: [bout({ steps: 11_999, session_day: 77 })],
      assessments: [result('tmwt_ss', 3.77)],
    });
    const told = JSON.stringify((await checkMonth(rows)).byRule().flatMap(({ kept }) => kept.map(({ found }) => found)));
    expect(told).not.toMatch(new RegExp([someone, '91', '1987', 'C4', '23.75', '61', '11999', '77', '3.77'].join('|')));
  });

  it('judges each row as the dictionary does', () => {
    const cellOf = ({ codes = [], missingCodes = [], hard, type }: Variable): fc.Arbitrary<string | number | undefined> => {
      const words = [...codes, ...missingCodes].map(({ code }) => code);
      if (words.length > 0) return fc.option(fc.constantFrom(...words), { nil: undefined });
      if (type === 'pseudonym' || !hard) return fc.constant(someone);
      return fc.option(fc.integer({ min: Math.ceil(hard.min), max: Math.floor(hard.max) }), { nil: undefined });
    };
    const rowOf = (key: TableKey): fc.Arbitrary<Row> =>
      fc.record(Object.fromEntries(tableOf(key).variables.map((variable) => [variable.key, cellOf(variable)]))) as fc.Arbitrary<Row>;

    for (const key of tableKeys) {
      fc.assert(
        fc.property(rowOf(key), (row) => {
          const given = Object.fromEntries(Object.entries(row).filter(([, cell]) => cell !== undefined));
          const findings = checkSubmission({ [key]: tableFromRows(key, [given]) }, registry({}, { year: 2100 })).byRule();
          const columns = (...ids: string[]) =>
            [
              ...new Set(findings.filter(({ id }) => ids.includes(id)).flatMap(({ kept }) => kept.map(({ column }) => column ?? ''))),
            ].sort();
          const problems = rowProblems(tableOf(key), given);
          const expected = (isMeant: (problem: RowProblem) => boolean) =>
            [...new Set(problems.filter(isMeant).map(({ column }) => column))].sort();
          expect(columns('F20')).toEqual(expected(({ kind }) => kind === 'missing'));
          // An attempt that ended early has no result; the exertion felt at its end is another matter.
          expect(columns('F24')).toEqual(
            expected(({ kind, column }) => kind === 'must-be-empty' || (kind === 'stopped-early' && column === 'value')),
          );
        }),
        { seed: 20260808, numRuns: 40 },
      );
    }
  });
});
