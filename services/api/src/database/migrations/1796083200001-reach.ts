/**
 * Who reaches which row. The application's role owns nothing; `asActor()` tells these policies whom it serves:
 * cairnstep.account (id), cairnstep.roles, cairnstep.reads and cairnstep.writes (site ids), each a comma-separated list.
 * The roles `registry` and `statistics` are the registry's own processes.
 */
import type { MigrationInterface, QueryRunner } from 'typeorm';

const registryTables = ['participants', 'consents', 'exams', 'assessments', 'sessions', 'bouts', 'adverse_events'];
const stagedTables = registryTables.map((table) => `staged_${table}`);
const workTables = ['submissions', 'submission_files', 'submission_findings'];
const factTables = ['course_facts', 'outcome_facts'];
const releaseTables = ['release_courses', 'release_outcomes', 'release_sessions'];
const allTables = [
  'sites', 'accounts', 'grants', 'invitations', 'web_sessions', ...workTables, 'row_history', ...registryTables, ...stagedTables, ...factTables,
  'releases', ...releaseTables, 'access_requests', 'access_request_members', 'access_request_votes', 'exports', 'export_pseudonyms',
  'audit_entries', 'mail_messages',
]; // prettier-ignore

/** Subqueries are evaluated once per statement, not once per row. */
const has = (...roles: readonly string[]) => `(select actor_has(${roles.map((role) => `'${role}'`).join(', ')}))`;
const readsSite = '(site_id = any ((select actor_sites(\'cairnstep.reads\'))::uuid[]))';
const writesSite = '(site_id = any ((select actor_sites(\'cairnstep.writes\'))::uuid[]))';
const self = '(select actor_account())';

type Command = 'select' | 'insert' | 'update' | 'delete';

export class Reach1796083200001 implements MigrationInterface {
  name = 'Reach1796083200001';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`create function actor_list(setting text) returns text[] language sql stable as
      $$ select coalesce(string_to_array(nullif(current_setting(setting, true), ''), ','), '{}') $$`);
    await runner.query(`create function actor_has(variadic roles text[]) returns boolean language sql stable as
      $$ select actor_list('cairnstep.roles') && roles $$`);
    await runner.query(`create function actor_sites(setting text) returns uuid[] language sql stable as
      $$ select actor_list(setting)::uuid[] $$`);
    await runner.query(`create function actor_account() returns uuid language sql stable as
      $$ select nullif(current_setting('cairnstep.account', true), '')::uuid $$`);

    for (const table of allTables) {
      await runner.query(`alter table ${table} enable row level security`);
      await runner.query(`alter table ${table} force row level security`);
    }
    const allow = async (table: string, rules: Partial<Record<Command, string>>, role = 'cairnstep_app'): Promise<void> => {
      for (const [command, rule] of Object.entries(rules)) {
        await runner.query(`grant ${command} on ${table} to ${role}`);
        const clause = command === 'insert' ? `with check (${rule})` : command === 'update' ? `using (${rule}) with check (${rule})` : `using (${rule})`;
        await runner.query(`create policy ${role.replace('cairnstep_', '')}_${command} on ${table} for ${command} to ${role} ${clause}`);
      }
    };
    /** Functions of the owner work on these tables for everyone, within what each function does. */
    const ownerMay = (table: string): Promise<unknown> => runner.query(`create policy owner_all on ${table} to cairnstep_owner using (true) with check (true)`);

    const ownSite = (site: string) => site.replaceAll('site_id', 'id');
    await allow('sites', {
      select: `${ownSite(readsSite)} or ${has('steward', 'administrator', 'registry')}`,
      insert: has('registry'),
      update: `${ownSite(writesSite)} or ${has('registry')}`,
    });
    await allow('accounts', {
      select: `id = ${self} or ${has('steward', 'administrator', 'registry')}`,
      insert: has('registry'),
      update: `(${has('administrator')} and id is distinct from ${self}) or ${has('registry')}`,
    });
    await allow('grants', {
      select: `account_id = ${self} or ${has('steward', 'administrator', 'registry')}`,
      insert: `(${has('administrator')} and account_id is distinct from ${self}) or ${has('registry')}`,
      update: `(${has('administrator')} and account_id is distinct from ${self}) or ${has('registry')}`,
    });
    await allow('invitations', {
      select: has('steward', 'administrator', 'registry'),
      insert: has('administrator', 'registry'),
      update: has('administrator', 'registry'),
    });
    await allow('web_sessions', { select: 'true', insert: 'true', update: 'true', delete: 'true' }, 'cairnstep_session');
    await ownerMay('web_sessions');

    for (const table of workTables) {
      await allow(table, {
        select: `${readsSite} or ${has('steward', 'registry')}`,
        insert: `${writesSite} or ${has('registry')}`,
        update: `${writesSite} or ${has('registry')}`,
        delete: `${writesSite} or ${has('registry')}`,
      });
    }
    for (const table of [...registryTables, ...factTables]) {
      await allow(table, {
        select: `${readsSite} or ${has('steward', 'registry')}`,
        insert: `${writesSite} or ${has('registry')}`,
        update: `${writesSite} or ${has('registry')}`,
        delete: `${writesSite} or ${has('registry')}`,
      });
    }
    for (const table of stagedTables) {
      await allow(table, {
        select: `${readsSite} or ${has('registry')}`,
        insert: `${writesSite} or ${has('registry')}`,
        delete: `${writesSite} or ${has('registry')}`,
      });
    }
    await allow('row_history', { select: `${readsSite} or ${has('steward', 'registry')}`, insert: `${writesSite} or ${has('registry')}` });

    await allow('releases', { select: 'true', insert: has('steward', 'registry') });
    for (const table of releaseTables) await allow(table, { select: has('statistics', 'registry'), insert: has('steward', 'registry') });

    await runner.query(`create function actor_leads(request uuid) returns boolean language sql stable security definer set search_path = public as
      $$ select exists (select from access_requests where id = request and lead_id = actor_account()) $$`);
    await runner.query(`create function actor_is_member(request uuid) returns boolean language sql stable security definer set search_path = public as
      $$ select actor_leads(request) or exists (select from access_request_members where request_id = request and account_id = actor_account()) $$`);
    for (const table of ['access_requests', 'access_request_members', 'exports', 'accounts', 'mail_messages', 'audit_entries']) await ownerMay(table);
    await allow('access_requests', {
      select: `lead_id = ${self} or actor_is_member(id) or (${has('steward')} and status <> 'draft') or ${has('registry')}`,
      insert: `(${has('researcher')} and lead_id = ${self}) or ${has('registry')}`,
      update: `lead_id = ${self} or (${has('steward')} and status <> 'draft') or ${has('registry')}`,
    });
    await allow('access_request_members', {
      select: `account_id = ${self} or actor_leads(request_id) or ${has('steward', 'registry')}`,
      insert: `actor_leads(request_id) or ${has('registry')}`,
      delete: `actor_leads(request_id) or ${has('registry')}`,
    });
    await allow('access_request_votes', {
      select: `actor_is_member(request_id) or ${has('steward', 'registry')}`,
      insert: `${has('steward')} and steward_id = ${self} and not actor_is_member(request_id)`,
    });
    await allow('exports', {
      select: `actor_is_member(request_id) or ${has('steward', 'registry')}`,
      insert: `(actor_is_member(request_id) and requested_by = ${self}) or ${has('registry')}`,
      update: has('registry'),
    });
    await allow('export_pseudonyms', { select: has('registry'), insert: has('registry'), delete: has('registry') });

    await allow('audit_entries', {
      select: `actor = ${self}::text or ${has('steward', 'registry')}
        or (${has('administrator')} and (act like 'account.%' or act like 'grant.%' or act like 'invitation.%' or act like 'sign-%'))`,
      insert: 'true',
    });
    await allow('mail_messages', { select: has('registry'), update: has('registry') });

    // The chain has one writer at a time: the lock is held until the transaction ends.
    await runner.query(`create function audit_head() returns table (seq bigint, hash text, at timestamptz)
      language plpgsql security definer set search_path = public as $$
      begin
        perform pg_advisory_xact_lock(7306115);
        return query select coalesce(max(e.seq), 0), coalesce((select l.hash from audit_entries l order by l.seq desc limit 1), repeat('0', 64)),
          date_trunc('milliseconds', clock_timestamp()) from audit_entries e;
      end $$`);
    await runner.query(`create function refuse_change() returns trigger language plpgsql as
      $$ begin raise exception 'audit entries are never changed or removed' using errcode = '42501'; end $$`);
    await runner.query(`create trigger audit_entries_stay before update or delete or truncate on audit_entries for each statement execute function refuse_change()`);

    await runner.query(`create function queue_mail(mail_id uuid, mail_event text, mail_recipient text, mail_subject text, mail_body text) returns boolean
      language plpgsql security definer set search_path = public as $$
      begin
        insert into mail_messages (id, event, recipient, subject, body) values (mail_id, mail_event, mail_recipient, mail_subject, mail_body)
          on conflict (event) do nothing;
        return found;
      end $$`);
    await runner.query(`create function account_name(account uuid) returns text language sql stable security definer set search_path = public as
      $$ select name from accounts where id = account $$`);
    await runner.query(`create function account_institution(account uuid) returns text language sql stable security definer set search_path = public as
      $$ select institution from accounts where id = account $$`);
    await runner.query(`create function next_request_number(prefix text) returns text language sql stable security definer set search_path = public as
      $$ select prefix || lpad((coalesce(max(substr(number, length(prefix) + 1)::int), 0) + 1)::text, 4, '0') from access_requests where number like prefix || '%' $$`);
    await runner.query(`create function next_export_number(prefix text) returns text language sql stable security definer set search_path = public as
      $$ select prefix || lpad((coalesce(max(substr(number, length(prefix) + 1)::int), 0) + 1)::text, 4, '0') from exports where number like prefix || '%' $$`);
    await runner.query(`create function prune_web_sessions() returns void language sql security definer set search_path = public as
      $$ delete from web_sessions where expire < (now() at time zone current_setting('TimeZone')) $$`);
    for (const signature of [
      'actor_list(text)', 'actor_has(text[])', 'actor_sites(text)', 'actor_account()', 'actor_leads(uuid)', 'actor_is_member(uuid)', 'audit_head()',
      'queue_mail(uuid, text, text, text, text)', 'account_name(uuid)', 'account_institution(uuid)', 'next_request_number(text)', 'next_export_number(text)', 'prune_web_sessions()',
    ]) { // prettier-ignore
      await runner.query(`revoke all on function ${signature} from public`);
      await runner.query(`grant execute on function ${signature} to cairnstep_app`);
    }
    await runner.query('grant usage on schema public to cairnstep_app, cairnstep_session');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('revoke usage on schema public from cairnstep_app, cairnstep_session');
    await runner.query('drop trigger audit_entries_stay on audit_entries');
    const policies = (await runner.query(`select policyname, tablename from pg_policies where schemaname = 'public'`)) as { policyname: string; tablename: string }[];
    for (const { policyname, tablename } of policies) await runner.query(`drop policy ${policyname} on ${tablename}`);
    for (const table of allTables) {
      await runner.query(`revoke all on ${table} from cairnstep_app, cairnstep_session`);
      await runner.query(`alter table ${table} no force row level security`);
      await runner.query(`alter table ${table} disable row level security`);
    }
    for (const name of ['prune_web_sessions', 'next_export_number', 'next_request_number', 'account_institution', 'account_name', 'queue_mail', 'refuse_change', 'audit_head', 'actor_is_member', 'actor_leads', 'actor_account', 'actor_sites', 'actor_has', 'actor_list']) {
      await runner.query(`drop function ${name}`);
    }
  }
}
