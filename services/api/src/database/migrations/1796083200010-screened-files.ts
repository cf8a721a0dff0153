/** Files that identified somebody are marked and not kept; workbooks of several tables; cells mended on screen; headers marked as safe for a site. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

const readsSite = "(site_id = any ((select actor_sites('cairnstep.reads'))::uuid[]))";
const writesSite = "(site_id = any ((select actor_sites('cairnstep.writes'))::uuid[]))";
const has = (...roles: readonly string[]) => `(select actor_has(${roles.map((role) => `'${role}'`).join(', ')}))`;

const sweepings = ['', 'toast.'].flatMap((part) => [
  [`${part}autovacuum_vacuum_scale_factor`, 0] as const,
  [`${part}autovacuum_vacuum_threshold`, 20] as const,
]);

export class ScreenedFiles1796083200010 implements MigrationInterface {
  name = 'ScreenedFiles1796083200010';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('alter table submissions add column reasons jsonb');
    await runner.query('alter table submission_findings alter column table_key drop not null');
    await runner.query(`alter table submission_files add column tables text[], add column refused boolean not null default false,
      add column mended integer not null default 0, add column mends_digest text`);
    await runner.query('update submission_files set tables = array[table_key]');
    // Bytes that were deleted stay in the database's own files until they are swept up: here after a few files, not after a fifth of the table.
    await runner.query(`alter table submission_files set (${sweepings.map(([name, value]) => `${name} = ${value}`).join(', ')})`);

    await runner.query(`create table submission_mends (
      submission_id uuid not null, table_key text not null, line integer not null, column_key text not null, site_id uuid not null, value text not null,
      constraint submission_mends_pkey primary key (submission_id, table_key, line, column_key)
    )`);
    await runner.query(`create table safe_headers (
      site_id uuid not null, header text not null, marked_by uuid not null, marked_at timestamptz not null default now(),
      constraint safe_headers_pkey primary key (site_id, header)
    )`);
    for (const table of ['submission_mends', 'safe_headers']) {
      await runner.query(`alter table ${table} enable row level security`);
      await runner.query(`alter table ${table} force row level security`);
    }
    await runner.query('grant select, insert, update, delete on submission_mends to cairnstep_app');
    await runner.query(
      `create policy app_select on submission_mends for select to cairnstep_app using (${readsSite} or ${has('registry')})`,
    );
    await runner.query(
      `create policy app_insert on submission_mends for insert to cairnstep_app with check (${writesSite} or ${has('registry')})`,
    );
    await runner.query(`create policy app_update on submission_mends for update to cairnstep_app
      using (${writesSite} or ${has('registry')}) with check (${writesSite} or ${has('registry')})`);
    await runner.query(
      `create policy app_delete on submission_mends for delete to cairnstep_app using (${writesSite} or ${has('registry')})`,
    );
    await runner.query('grant select, insert, delete on safe_headers to cairnstep_app');
    await runner.query(
      `create policy app_select on safe_headers for select to cairnstep_app using (${readsSite} or ${has('steward', 'registry')})`,
    );
    await runner.query(`create policy app_insert on safe_headers for insert to cairnstep_app with check (${has('steward')})`);
    await runner.query(`create policy app_delete on safe_headers for delete to cairnstep_app using (${has('steward')})`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`alter table submission_files reset (${sweepings.map(([name]) => name).join(', ')})`);
    await runner.query('drop table safe_headers');
    await runner.query('drop table submission_mends');
    await runner.query(
      'alter table submission_files drop column mends_digest, drop column mended, drop column refused, drop column tables',
    );
    // What is about a whole workbook has no place in the earlier form; the next check makes all findings anew.
    await runner.query('delete from submission_findings where table_key is null');
    await runner.query('alter table submission_findings alter column table_key set not null');
    await runner.query('alter table submissions drop column reasons');
  }
}
