/** Whom to write to about a site: for its own coordinators' and systems' acts, which may not read other people's accounts, and for reminders. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CoordinatorAddresses1796083200023 implements MigrationInterface {
  name = 'CoordinatorAddresses1796083200023';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('create policy owner_all on grants to cairnstep_owner using (true) with check (true)');
    await runner.query(`create function coordinator_addresses(site uuid, today date) returns setof text
      language plpgsql stable security definer set search_path = public as $$
      begin
        if not (site = any (actor_sites('cairnstep.writes')) or actor_has('registry')) then
          raise exception 'not a site of the actor' using errcode = '42501';
        end if;
        return query select distinct a.email from accounts a join grants g on g.account_id = a.id
          where g.site_id = site and g.role = 'coordinator' and g.starts_on <= today and (g.ends_on is null or g.ends_on >= today)
            and a.status = 'active' and a.email is not null order by 1;
      end $$`);
    await runner.query('revoke all on function coordinator_addresses(uuid, date) from public');
    await runner.query('grant execute on function coordinator_addresses(uuid, date) to cairnstep_app');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop function coordinator_addresses(uuid, date)');
    await runner.query('drop policy owner_all on grants');
  }
}
