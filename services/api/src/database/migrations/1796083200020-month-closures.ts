/** Months in which a site had nothing to report. Said once, never taken back: a submission of the month takes its place. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

export class MonthClosures1796083200020 implements MigrationInterface {
  name = 'MonthClosures1796083200020';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`create table month_closures (
      site_id uuid not null, month text not null, closed_by uuid not null, closed_at timestamptz not null,
      constraint month_closures_pkey primary key (site_id, month)
    )`);
    await runner.query('alter table month_closures enable row level security');
    await runner.query('alter table month_closures force row level security');
    await runner.query('grant select, insert on month_closures to cairnstep_app');
    await runner.query(`create policy app_select on month_closures for select to cairnstep_app
      using ((site_id = any ((select actor_sites('cairnstep.reads'))::uuid[])) or (select actor_has('steward', 'registry')))`);
    await runner.query(`create policy app_insert on month_closures for insert to cairnstep_app
      with check ((site_id = any ((select actor_sites('cairnstep.writes'))::uuid[])) or (select actor_has('registry')))`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table month_closures');
  }
}
