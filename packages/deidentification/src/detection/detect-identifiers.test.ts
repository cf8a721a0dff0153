import { dictionary, exampleRow, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { columnCases } from '../../reference/identifier-cases.ts';
import { detectIdentifiers, screenCsvText } from './detect-identifiers.ts';
import type { IdentifierFinding } from './identifier-finding.ts';

const written = (findings: readonly IdentifierFinding[]) => findings.map((each) => `${each.class}:${each.strength}`).sort();
const column = (header: string, cells: readonly string[]) => ({ headers: [header], rows: cells.map((cell) => [cell]) });

describe('columns', () => {
  it.each(columnCases)('finds in the column "$header" ($role): $expect', ({ header, role, cells, expect: expected }) => {
    const findings = detectIdentifiers(column(header, cells), { roles: new Map([[header, role]]) });
    expect(written(findings)).toEqual([...expected].sort());
  });

  it('says where and how often, and never what', () => {
    const table = {
      headers: ['id', 'notes'],
      rows: [
        ['1', 'ok'],
        ['2', 'mail jane.doe@example.org'],
        ['3', 'jane.doe@example.org'],
      ],
      lines: [4, 7, 9],
    };
    const findings = detectIdentifiers(table, { table: 'sessions.csv' });
    expect(findings).toContainEqual({
      class: 'email',
      strength: 'block',
      table: 'sessions.csv',
      columnNumber: 2,
      column: 'notes',
      line: 7,
      count: 2,
    });
    expect(JSON.stringify(findings)).not.toContain('jane');
  });

  it('warns of chance hits in a column of numbers, and blocks when half of them pass the check', () => {
    // Ten-digit counters: 4010232137 has a right check digit (NHS Data Dictionary), its neighbours have not.
    const counters = Array.from({ length: 30 }, (_, row) => String(4_010_232_137 + row * 2));
    expect(written(detectIdentifiers(column('samples', counters), { roles: new Map([['samples', 'number']]) }))).toEqual([
      'national_id:warn',
    ]);
    expect(written(detectIdentifiers(column('samples', counters.slice(0, 2)), { roles: new Map([['samples', 'number']]) }))).toEqual([
      'national_id:block',
    ]);
    expect(written(detectIdentifiers(column('ref', counters)))).toContain('national_id:warn');
  });

  it('screens a header that is a person, and does not repeat it', () => {
    const findings = detectIdentifiers({ headers: ['SMITH, John', '2024-03-05'], rows: [] });
    expect(written(findings)).toEqual(['full_date:block', 'person_name:block']);
    expect(findings.map((finding) => finding.column)).toEqual([null, null]);
  });

  it('screens cells that stand beyond the header', () => {
    expect(written(detectIdentifiers({ headers: ['steps'], rows: [['12', 'jane.doe@example.org']] }))).toEqual(['email:block']);
  });

  it('does not judge a header that a steward has marked as safe, but its cells', () => {
    const table = column('mobile', ['yes', '0161 496 0123']);
    expect(detectIdentifiers(table)[0]).toMatchObject({ class: 'phone', count: 1, line: 3 });
    expect(detectIdentifiers(column('mobile', ['yes']))[0]).toMatchObject({ class: 'phone', count: 0, line: null });
    expect(detectIdentifiers(column('mobile', ['yes']), { safeHeaders: new Set(['mobile']) })).toEqual([]);
    expect(written(detectIdentifiers(table, { safeHeaders: new Set(['mobile']) }))).toEqual(['phone:block']);
  });

  it('is not led astray by columns with names of object properties', () => {
    const headers = ['__proto__', 'constructor', 'toString'];
    expect(detectIdentifiers({ headers, rows: [headers, headers] })).toEqual([]);
  });

  it('answers the same for rows that arrive one by one', async () => {
    const table = {
      headers: ['a', 'notes'],
      rows: [
        ['1', 'Pt John Smith'],
        ['2', '05/03/2024'],
      ],
    };
    async function* rows() {
      yield* table.rows;
    }
    const context = { roles: new Map([['notes', 'text' as const]]) };
    expect(await screenCsvText(table.headers, rows(), context)).toEqual(detectIdentifiers(table, context));
    expect(await screenCsvText(table.headers, table.rows, context)).toEqual(detectIdentifiers(table, context));
  });
});

describe('tables of the dictionary', () => {
  it('are clean when every cell is one the dictionary allows', () => {
    for (const { key, variables } of dictionary.tables) {
      const example = exampleRow(key);
      const row = variables.map((variable) => String(example[variable.key] ?? ''));
      const findings = detectIdentifiers({ headers: variables.map((variable) => variable.key), rows: [row] }, { dictionaryTable: key });
      expect(findings, key).toEqual([]);
    }
  });

  it('allow every code and both ends of every range', () => {
    for (const { key, variables } of dictionary.tables) {
      for (const { key: header, codes = [], missingCodes = [], hard } of variables) {
        const cells = [...codes, ...missingCodes].map(({ code }) => code).concat(hard ? [String(hard.min), String(hard.max)] : []);
        expect(detectIdentifiers(column(header, cells), { dictionaryTable: key }), `${key} ${header}`).toEqual([]);
      }
    }
  });

  it.each([
    ['participants', 'participant', '943 476 5919', 'national_id:block'],
    ['participants', 'participant', 'Mrs Jones', 'person_name:block'],
    ['participants', 'age_at_index', '94', 'age_over_89:block'],
    ['participants', 'cause', 'fell on 5 March 2024', 'full_date:block'],
    ['sessions', 'session_day', '2024-03-05', 'full_date:block'],
    ['assessments', 'value', 'jane.doe@example.org', 'email:block'],
    ['adverse_events', 'body_site', 'seen by Dr Patel', 'staff_name:warn'],
  ] as const)('find in %s, %s what does not belong there', (table, header, cell, expected) => {
    expect(tableOf(table).variables.map(({ key }) => key)).toContain(header);
    expect(written(detectIdentifiers(column(header, [cell]), { dictionaryTable: table }))).toContain(expected);
  });
});
