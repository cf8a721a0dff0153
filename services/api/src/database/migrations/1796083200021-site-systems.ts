/** Sites' systems: registered by administrators, named in submissions and in the log like people. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

const auditPolicy = (acts: readonly string[]): string => `alter policy app_select on audit_entries using (
  actor = (select actor_account())::text or (select actor_has('steward', 'registry'))
  or ((select actor_has('administrator')) and (${acts.map((act) => `act like '${act}'`).join(' or ')})))`;
const administratorsActs = ['account.%', 'grant.%', 'invitation.%', 'sign-%'];

const accountName = (source: string): string => `create or replace function account_name(account uuid) returns text
  language sql stable security definer set search_path = public as
  $$ ${source} $$`;

export class SiteSystems1796083200021 implements MigrationInterface {
  name = 'SiteSystems1796083200021';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`create table site_systems (
      id uuid not null, site_id uuid not null, issuer text not null, subject text not null, label text not null,
      status text not null default 'active', added_by uuid, added_at timestamptz not null default now(), last_used_at timestamptz,
      constraint site_systems_pkey primary key (id)
    )`);
    await runner.query('create unique index site_systems_identity_key on site_systems (issuer, subject)');
    await runner.query('alter table site_systems enable row level security');
    await runner.query('alter table site_systems force row level security');
    await runner.query('grant select, insert, update on site_systems to cairnstep_app');
    await runner.query(`create policy app_select on site_systems for select to cairnstep_app
      using ((select actor_has('steward', 'administrator', 'registry')))`);
    await runner.query(`create policy app_insert on site_systems for insert to cairnstep_app
      with check ((select actor_has('administrator', 'registry')))`);
    await runner.query(`create policy app_update on site_systems for update to cairnstep_app
      using ((select actor_has('administrator', 'registry'))) with check ((select actor_has('administrator', 'registry')))`);
    await runner.query('create policy owner_all on site_systems to cairnstep_owner using (true) with check (true)');
    await runner.query(
      accountName('select coalesce((select name from accounts where id = account), (select label from site_systems where id = account))'),
    );
    await runner.query(auditPolicy([...administratorsActs, 'site-system.%']));
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(auditPolicy(administratorsActs));
    await runner.query(accountName('select name from accounts where id = account'));
    await runner.query('drop table site_systems');
  }
}
