-- Gives the first administrator of a new registry their grant; every later person is invited on screen.
-- The person signs in once (and is told that they have no grant yet), then:
--
--   psql "$DATABASE_URL" --set=issuer=https://sign-in.example/realm --set=subject=THEIR-SUBJECT --file=first-administrator.sql
--
-- It refuses once the registry has an administrator. The act itself is not in the audit log, whose entries the product
-- alone writes: keep a signed note of who did it for whom, and when.
\set ON_ERROR_STOP on
begin;
set local role cairnstep_owner;
select set_config('first_administrator.issuer', :'issuer', true), set_config('first_administrator.subject', :'subject', true) \g (format=unaligned tuples_only) /dev/null
do $$
declare
  account uuid;
begin
  if exists (select from grants where role = 'administrator') then
    raise exception 'The registry has an administrator already. Let them invite people on screen.';
  end if;
  select id into account from accounts
   where issuer = current_setting('first_administrator.issuer') and subject = current_setting('first_administrator.subject');
  if account is null then
    raise exception 'Nobody with this issuer and subject has signed in yet.';
  end if;
  insert into grants (id, account_id, role, starts_on) values (gen_random_uuid(), account, 'administrator', (now() at time zone 'UTC')::date);
end
$$;
commit;
