import { readdirSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { actingAs } from '../../services/api/src/database/migrate.ts';
import { migrations } from '../../services/api/src/database/migrations/index.ts';
import { cloneDatabase, type TestDatabase } from '../support/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await cloneDatabase();
});
afterAll(() => database.close());

/** Everything of the schema that a query can tell: columns, constraints, indexes, policies, rights, functions, triggers. */
const schemaQueries = [
  `select table_name, column_name, data_type, is_nullable, column_default from information_schema.columns where table_schema = 'public' order by 1, 2`,
  `select conrelid::regclass::text, conname, pg_get_constraintdef(oid) from pg_constraint where connamespace = 'public'::regnamespace order by 1, 2`,
  `select indexname, indexdef from pg_indexes where schemaname = 'public' order by 1`,
  `select tablename, policyname, cmd, roles::text, qual, with_check from pg_policies where schemaname = 'public' order by 1, 2`,
  `select table_name, grantee, privilege_type from information_schema.role_table_grants where table_schema = 'public' and grantee like 'cairnstep%' order by 1, 2, 3`,
  `select proname, pg_get_functiondef(oid), proacl::text from pg_proc where pronamespace = 'public'::regnamespace order by 1`,
  `select tgrelid::regclass::text, tgname from pg_trigger where not tgisinternal order by 1, 2`,
  `select relname, relrowsecurity, relforcerowsecurity from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by 1`,
];
const schema = async (): Promise<unknown[]> => Promise.all(schemaQueries.map(async (query) => (await database.owner.query(query)).rows));

describe('the migrations', () => {
  it('list every file of their folder, in its order', () => {
    const files = readdirSync(new URL('../../services/api/src/database/migrations/', import.meta.url)).filter((file) => /^\d+-/.test(file));
    const stamp = (name: string): string => /\d{13}/.exec(name)?.[0] ?? '';
    expect(migrations.map((migration) => stamp(migration.name))).toEqual(files.sort().map(stamp));
  });

  it('make just what the entities describe', async () => {
    const source = await makeDataSource({ url: actingAs(database.ownerUrl, 'cairnstep_owner'), poolSize: 1 }).initialize();
    const difference = await source.driver.createSchemaBuilder().log();
    await source.destroy();
    expect(difference.upQueries.map((query) => query.query)).toEqual([]);
  });

  it('go down to nothing and up again to the same schema', async () => {
    const before = await schema();
    const source = await makeDataSource({ url: actingAs(database.ownerUrl, 'cairnstep_owner'), poolSize: 1 }).initialize();
    for (const _ of migrations) await source.undoLastMigration({ transaction: 'all' });
    const { rows } = await database.owner.query(`select table_name from information_schema.tables where table_schema = 'public'`);
    expect(rows).toEqual([{ table_name: 'schema_migrations' }]);
    await source.runMigrations({ transaction: 'all' });
    await source.destroy();
    expect(await schema()).toEqual(before);
  });
});
