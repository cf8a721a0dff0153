/** Codes and hard limits of the dictionary hold in the database too, whoever writes. */
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { dictionary, exampleRow } from '../../packages/dictionary/src/index.ts';
import { cloneDatabase, type TestDatabase } from '../support/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await cloneDatabase();
});
afterAll(() => database.close());

const derived = { class_nli: ['T4'], class_ais: ['A'], class_level_group: 't1_t9' };

async function insert(table: string, row: Readonly<Record<string, unknown>>): Promise<string> {
  const full = { ...row, ...(table === 'exams' ? derived : {}), site_id: randomUUID(), submission_id: randomUUID(), month: '2026-01' };
  const keys = Object.keys(full);
  const text = `insert into ${table} (${keys.join(', ')}) values (${keys.map((_, index) => `$${index + 1}`).join(', ')})`;
  return database.owner.query(text, Object.values(full)).then(
    () => 'taken',
    (error: { code?: string }) => error.code ?? 'failed',
  );
}

/** check_violation (PostgreSQL error codes). */
const refused = '23514';

describe.each(dictionary.tables.map((table) => [table.key, table] as const))('the table %s', (key, table) => {
  it('takes the example', async () => {
    expect(await insert(key, exampleRow(key))).toBe('taken');
  });

  it('refuses an unknown code and a number beyond the hard limits in every column that has them', async () => {
    const wrong = table.variables.flatMap(
      ({ key: column, type, hard }): [string, string | number][] =>
      type === 'code' || type === 'flag' ? [[column, 'no such code']] : hard ? [[column, hard.max + 1], [column, hard.min - 1]] : [], // prettier-ignore
    );
    expect(wrong.length).toBeGreaterThan(0);
    for (const [column, value] of wrong)
      expect(await insert(key, { ...exampleRow(key), [column]: value }), `${column} ${value}`).toBe(refused);
  });
});
