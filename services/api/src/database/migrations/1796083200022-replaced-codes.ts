/**
 * Participant codes that were replaced. Releases and exports keep the codes they were made with; this table says who that is today. The
 * history of rows stays closed to changes but for the code in its keys, which a function of the owner replaces.
 */
import type { MigrationInterface, QueryRunner } from 'typeorm';

const writesSite = `(site_id = any ((select actor_sites('cairnstep.writes'))::uuid[]))`;

export class ReplacedCodes1796083200022 implements MigrationInterface {
  name = 'ReplacedCodes1796083200022';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`create table replaced_codes (
      site_id uuid not null, from_code text not null, to_code text not null, replaced_by uuid not null, replaced_at timestamptz not null,
      constraint replaced_codes_pkey primary key (site_id, from_code)
    )`);
    await runner.query('create index replaced_codes_to_idx on replaced_codes (site_id, to_code)');
    await runner.query('alter table replaced_codes enable row level security');
    await runner.query('alter table replaced_codes force row level security');
    await runner.query('grant select, insert, update, delete on replaced_codes to cairnstep_app');
    await runner.query(`create policy app_select on replaced_codes for select to cairnstep_app
      using ((site_id = any ((select actor_sites('cairnstep.reads'))::uuid[])) or (select actor_has('steward', 'registry')))`);
    const writes = `(${writesSite} or (select actor_has('registry')))`;
    await runner.query(`create policy app_insert on replaced_codes for insert to cairnstep_app with check (${writes})`);
    await runner.query(`create policy app_update on replaced_codes for update to cairnstep_app using (${writes}) with check (${writes})`);
    await runner.query(`create policy app_delete on replaced_codes for delete to cairnstep_app using (${writes})`);

    await runner.query('create policy owner_all on row_history to cairnstep_owner using (true) with check (true)');
    await runner.query(`create function replace_codes_in_history(site uuid, from_codes text[], to_codes text[]) returns bigint
      language plpgsql security definer set search_path = public as $$
      declare changed bigint;
      begin
        if not (site = any (actor_sites('cairnstep.writes')) or actor_has('registry')) then
          raise exception 'not a site of the actor' using errcode = '42501';
        end if;
        update row_history h
           set row_key = jsonb_set(h.row_key, '{participant}', to_jsonb(c.to_code)), before = jsonb_set(h.before, '{participant}', to_jsonb(c.to_code))
          from unnest(from_codes, to_codes) as c(from_code, to_code)
         where h.site_id = site and h.row_key->>'participant' = c.from_code;
        get diagnostics changed = row_count;
        return changed;
      end $$`);
    await runner.query('revoke all on function replace_codes_in_history(uuid, text[], text[]) from public');
    await runner.query('grant execute on function replace_codes_in_history(uuid, text[], text[]) to cairnstep_app');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop function replace_codes_in_history(uuid, text[], text[])');
    await runner.query('drop policy owner_all on row_history');
    await runner.query('drop table replaced_codes');
  }
}
