import { describe, expect, it } from 'vitest';
import { tableOf } from './dictionary.ts';
import { exampleRow } from './example-row.ts';
import { rowSchema } from './schema.ts';
import { tableKeys } from './types.ts';
import type { Condition, Row, TableKey, Variable } from './types.ts';

/** Columns that the schema finds fault with. */
function faults(table: TableKey, row: Row): string[] {
  const parsed = rowSchema(table).safeParse(row);
  return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join('.'));
}

const without = (row: Row, column: string): Row => Object.fromEntries(Object.entries(row).filter(([key]) => key !== column));

/** A valid value for the cell as far as the cell alone goes. */
function anyValue({ type, codes, hard }: Variable): string | number | undefined {
  if (type === 'pseudonym') return 'S00000000000000000000Z';
  return codes ? codes[0]?.code : hard?.min;
}

const meeting = (...conditions: readonly (Condition | undefined)[]): Row =>
  Object.fromEntries(conditions.flatMap((condition) => (condition ? [[condition.column, condition.isOneOf[0]]] : [])));

function breaking(table: TableKey, { column, isOneOf }: Condition): Row {
  const other = tableOf(table)
    .variables.find((variable) => variable.key === column)
    ?.codes?.find(({ code }) => !isOneOf.includes(code));
  return { [column]: other?.code };
}

describe.each(tableKeys)('schema of a row of %s', (table) => {
  const example = exampleRow(table);
  const { variables } = tableOf(table);

  it('accepts the example row', () => {
    expect(rowSchema(table).parse(example)).toEqual(example);
  });

  it('refuses a column that the dictionary does not know', () => {
    expect(rowSchema(table).safeParse({ ...example, remark: 'x' }).success).toBe(false);
  });

  it('refuses a missing cell that must always be filled', () => {
    const demanded = variables.filter(({ required }) => required.when === 'always');
    expect(demanded.filter(({ key }) => !faults(table, without(example, key)).includes(key))).toEqual([]);
  });

  it('refuses a missing cell once the rest of the row demands it', () => {
    const demanded = variables.filter(({ required }) => required.when === 'if' || required.when === 'with');
    const passed = demanded.filter(({ key, required }) => {
      const partner = required.when === 'with' ? variables.find((variable) => variable.key === required.column) : undefined;
      const demanding = required.when === 'if' ? meeting(required, required.and) : partner && { [partner.key]: anyValue(partner) };
      return !faults(table, without({ ...example, ...demanding }, key)).includes(key);
    });
    expect(passed).toEqual([]);
  });

  it('refuses a filled cell that the rest of the row forbids, and accepts it when it does not', () => {
    const forbidden = variables.filter(({ emptyUnless }) => emptyUnless !== undefined);
    for (const variable of forbidden) {
      const { key, emptyUnless } = variable;
      if (!emptyUnless) continue;
      const filled = { ...example, [key]: anyValue(variable) };
      expect(faults(table, { ...filled, ...breaking(table, emptyUnless) }), key).toContain(key);
      if (!variable.measuredBy) expect(faults(table, { ...filled, ...meeting(emptyUnless) }), key).not.toContain(key);
    }
  });

  it('accepts every code of a column and refuses any other', () => {
    for (const { key, codes = [], missingCodes = [] } of variables) {
      for (const { code } of [...codes, ...missingCodes]) {
        const messages = rowSchema(table).safeParse({ ...example, [key]: code }).error?.issues ?? [];
        expect(messages.filter((issue) => issue.code === 'invalid_value' && issue.path[0] === key)).toEqual([]);
      }
      if (codes.length > 0) expect(faults(table, { ...example, [key]: 'no_such_code' })).toContain(key);
    }
  });

  it('refuses numbers outside the limits, between the steps, or of the wrong type', () => {
    for (const { key, type, hard } of variables) {
      if (!hard) continue;
      const wrong: unknown[] = [hard.min - 1, hard.max + 1, Number.NaN, Number.POSITIVE_INFINITY, String(hard.min), null];
      if (type === 'integer') wrong.push(hard.min + 0.5);
      else if (hard.step !== undefined) wrong.push(hard.min + hard.step / 2);
      for (const value of wrong) expect(faults(table, { ...example, [key]: value } as Row), `${key} ${String(value)}`).toContain(key);
    }
  });

  it('refuses a participant code of another shape', () => {
    expect(faults(table, { ...example, participant: 'S123' })).toContain('participant');
  });
});

describe('schema of an assessment', () => {
  const example = exampleRow('assessments');
  const spasticity = {
    participant: example['participant'],
    assessment_day: 0,
    measure: 'mas',
    in_device: 'no',
    trial_no: 1,
    course_no: 1,
    timepoint: 'baseline',
    attempt_status: 'done',
    muscle_group: 'knee_ext',
    side: 'left',
  };

  it("keeps to the measure's own limits and grades", () => {
    expect(faults('assessments', { ...example, value: 3.5 })).toEqual(['value']);
    expect(faults('assessments', { ...spasticity, value: 1.5 })).toEqual([]);
    expect(faults('assessments', { ...spasticity, value: 2.5 })).toEqual(['value']);
  });

  it('refuses a result of an attempt that failed, and takes the attempt without one', () => {
    expect(faults('assessments', { ...example, attempt_status: 'unable_physical' })).toEqual(['value']);
    expect(faults('assessments', without({ ...example, attempt_status: 'unable_physical' }, 'value'))).toEqual([]);
  });

  it('takes a result of a test stopped early only where the measure allows it', () => {
    expect(faults('assessments', { ...example, attempt_status: 'stopped_early' })).toEqual(['value']);
    const sixMinutes = {
      ...spasticity,
      measure: 'six_mwt',
      muscle_group: undefined,
      side: undefined,
      attempt_status: 'stopped_early',
      aid: 'walker',
      brace: 'no',
      assist_persons: 1,
      seconds_walked: 140,
    };
    expect(faults('assessments', { ...sixMinutes, value: 41.5 })).toEqual([]);
    // What was felt at the end of it is recorded in any case.
    expect(faults('assessments', { ...sixMinutes, value: 41.5, rpe_end: 7, rpe_scale: 'cr10' })).toEqual([]);
  });

  it('refuses a speed that the registry computes itself', () => {
    expect(
      faults('assessments', { ...spasticity, measure: 'speed_derived', muscle_group: undefined, side: undefined, value: 0.5 }),
    ).toEqual(['value']);
  });
});

describe('schema of a session', () => {
  it('rates exertion within the scale named beside it', () => {
    const example = exampleRow('sessions');
    expect(faults('sessions', { ...example, rpe: 13, rpe_scale: '6_20' })).toEqual([]);
    expect(faults('sessions', { ...example, rpe: 13, rpe_scale: 'cr10' })).toEqual(['rpe']);
    expect(faults('sessions', { ...example, rpe: 6.5, rpe_scale: '6_20' })).toEqual(['rpe']);
  });

  it('tells contradictions together with wrong cells', () => {
    const row = { ...exampleRow('sessions'), start_hour: 24, rpe_scale: undefined };
    expect(faults('sessions', row).toSorted()).toEqual(['rpe_scale', 'start_hour']);
  });
});
