/** Every table. Columns follow the entities; a test compares the two. */
import type { MigrationInterface, QueryRunner } from 'typeorm';

export class FirstTables1796083200000 implements MigrationInterface {
  name = 'FirstTables1796083200000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`create table course_facts (
      site_id uuid not null, participant text not null, course_no integer not null, first_day integer, last_day integer,
      exam_day integer, nli text not null, level_group text not null, ais text not null, age integer, sex text, cause text,
      days_since_injury integer, sessions integer not null, bouts integer not null, walking_min double precision not null,
      distance_m double precision not null, steps bigint not null,
      constraint course_facts_pkey primary key (site_id, participant, course_no)
    )`);
    await runner.query(`create table outcome_facts (
      site_id uuid not null, participant text not null, course_no integer not null, measure text not null,
      in_device text not null, baseline_status text, baseline_value double precision, baseline_day integer, end_status text,
      end_value double precision, end_day integer,
      constraint outcome_facts_pkey primary key (site_id, participant, course_no, measure, in_device)
    )`);
    await runner.query(`create table releases (
      id uuid not null, number integer not null, made_at timestamptz not null default now(), made_by uuid,
      note text not null, totals jsonb not null, digest text not null,
      constraint releases_pkey primary key (id)
    )`);
    await runner.query(`create unique index releases_number_key on releases (number)`);
    await runner.query(`create table release_courses (
      site_id uuid not null, participant text not null, course_no integer not null, first_day integer, last_day integer,
      exam_day integer, nli text not null, level_group text not null, ais text not null, age integer, sex text, cause text,
      days_since_injury integer, sessions integer not null, bouts integer not null, walking_min double precision not null,
      distance_m double precision not null, steps bigint not null, release_number integer not null,
      constraint release_courses_pkey primary key (site_id, participant, course_no, release_number)
    )`);
    await runner.query(`create table release_outcomes (
      site_id uuid not null, participant text not null, course_no integer not null, measure text not null,
      in_device text not null, baseline_status text, baseline_value double precision, baseline_day integer, end_status text,
      end_value double precision, end_day integer, release_number integer not null,
      constraint release_outcomes_pkey primary key (site_id, participant, course_no, measure, in_device, release_number)
    )`);
    await runner.query(`create index release_outcomes_measure_idx on release_outcomes (release_number, measure, in_device)`);
    await runner.query(`create table release_sessions (
      release_number integer not null, site_id uuid not null, participant text not null, course_no integer not null,
      session_ordinal integer not null, four_week_block integer not null, status text, device_class text,
      bouts integer not null, walking_min double precision not null, distance_m double precision not null,
      steps integer not null,
      constraint release_sessions_pkey primary key (release_number, site_id, participant, course_no, session_ordinal)
    )`);
    await runner.query(`create table sites (
      id uuid not null, code text not null, name text not null, first_month text not null,
      revision integer not null default '0',
      constraint sites_pkey primary key (id)
    )`);
    await runner.query(`create unique index sites_code_key on sites (code)`);
    await runner.query(`create table accounts (
      id uuid not null, issuer text not null, subject text not null, name text not null, email text, institution text,
      status text not null default 'active', created_at timestamptz not null default now(),
      last_sign_in_at timestamptz,
      constraint accounts_pkey primary key (id)
    )`);
    await runner.query(`create unique index accounts_identity_key on accounts (issuer, subject)`);
    await runner.query(`create table grants (
      id uuid not null, account_id uuid not null, role text not null, site_id uuid, starts_on date not null, ends_on date,
      given_by uuid,
      constraint grants_pkey primary key (id)
    )`);
    await runner.query(`create index grants_account_idx on grants (account_id)`);
    await runner.query(`create table invitations (
      id uuid not null, email text not null, role text not null, site_id uuid, grant_ends_on date, token_hash text not null,
      invited_by uuid not null, created_at timestamptz not null default now(),
      expires_at timestamptz not null, accepted_at timestamptz, accepted_by uuid,
      revoked_at timestamptz,
      constraint invitations_pkey primary key (id)
    )`);
    await runner.query(`create unique index invitations_token_key on invitations (token_hash)`);
    await runner.query(`create table web_sessions (
      sid text not null, sess json not null, expire timestamp(6) not null,
      constraint web_sessions_pkey primary key (sid)
    )`);
    await runner.query(`create index web_sessions_expire_idx on web_sessions (expire)`);
    await runner.query(`create table audit_entries (
      seq bigint not null, at timestamptz(3) not null, actor text not null, role text not null, act text not null,
      object text, result text not null, event text not null, prev text not null, hash text not null,
      constraint audit_entries_pkey primary key (seq)
    )`);
    await runner.query(`create index audit_entries_actor_idx on audit_entries (actor)`);
    await runner.query(`create unique index audit_entries_prev_key on audit_entries (prev)`);
    await runner.query(`create table mail_messages (
      id uuid not null, event text not null, recipient text not null, subject text not null, body text not null,
      status text not null default 'waiting', created_at timestamptz not null default now(),
      sent_at timestamptz,
      constraint mail_messages_pkey primary key (id)
    )`);
    await runner.query(`create unique index mail_messages_event_key on mail_messages (event)`);
    await runner.query(`create table access_requests (
      id uuid not null, number text not null, status text not null, version integer not null default '1',
      lead_id uuid not null, form jsonb not null, version_hash text not null, votes_needed integer not null default '1',
      votes_needed_because jsonb not null, release_number integer, created_at timestamptz not null default now(),
      updated_at timestamptz not null default now(), submitted_at timestamptz,
      decided_at timestamptz, access_ends_on date,
      constraint access_requests_pkey primary key (id)
    )`);
    await runner.query(`create unique index access_requests_number_key on access_requests (number)`);
    await runner.query(`create table access_request_members (
      request_id uuid not null, account_id uuid not null,
      constraint access_request_members_pkey primary key (request_id, account_id)
    )`);
    await runner.query(`create index access_request_members_account_idx on access_request_members (account_id)`);
    await runner.query(`create table access_request_votes (
      request_id uuid not null, version integer not null, steward_id uuid not null, vote text not null, reason text not null,
      version_hash text not null, voted_at timestamptz not null default now(),
      constraint access_request_votes_pkey primary key (request_id, version, steward_id)
    )`);
    await runner.query(`create table exports (
      id uuid not null, number text not null, request_id uuid not null, requested_by uuid not null, status text not null,
      created_at timestamptz not null default now(), built_at timestamptz, participants integer,
      sha256 text, content bytea,
      constraint exports_pkey primary key (id)
    )`);
    await runner.query(`create index exports_request_idx on exports (request_id)`);
    await runner.query(`create unique index exports_number_key on exports (number)`);
    await runner.query(`create table export_pseudonyms (
      export_id uuid not null, pseudonym text not null, site_id uuid not null, participant text not null,
      constraint export_pseudonyms_pkey primary key (export_id, pseudonym)
    )`);
    await runner.query(`create table submissions (
      id uuid not null, site_id uuid not null, month text not null, status text not null, created_by uuid not null,
      created_at timestamptz not null default now(), settled_by uuid, settled_at timestamptz,
      progress jsonb, findings jsonb not null, preview jsonb, preview_digest text, site_revision integer, receipt jsonb,
      constraint submissions_pkey primary key (id)
    )`);
    await runner.query(`create index submissions_site_month_idx on submissions (site_id, month)`);
    await runner.query(`create table submission_files (
      submission_id uuid not null, table_key text not null, site_id uuid not null, file_name text not null,
      bytes integer not null, sha256 text not null, added_at timestamptz not null default now(), rows integer,
      content bytea,
      constraint submission_files_pkey primary key (submission_id, table_key)
    )`);
    // Kept as sent: compressing a file takes longer than reading it, and a piece of a compressed one cannot be read alone.
    await runner.query(`alter table submission_files alter content set storage external`);
    await runner.query(`create table submission_findings (
      submission_id uuid not null, ordinal integer not null, site_id uuid not null, rule text not null, severity text not null,
      table_key text not null, line integer, column_key text, found text not null, mend text not null,
      constraint submission_findings_pkey primary key (submission_id, ordinal)
    )`);
    await runner.query(`create table row_history (
      id bigint generated by default as identity not null, site_id uuid not null, table_key text not null,
      row_key jsonb not null, change text not null, before jsonb not null, submission_id uuid not null,
      changed_at timestamptz not null default now(),
      constraint row_history_pkey primary key (id)
    )`);
    await runner.query(`create index row_history_row_idx on row_history (site_id, table_key, row_key)`);
    await runner.query(`create table participants (
      site_id uuid not null, participant text not null, age_at_index integer not null, sex text not null,
      injury_year integer not null, days_injury_to_index integer, cause text not null, ventilator text not null,
      planned_sessions integer, planned_sessions_per_week integer, month text not null, submission_id uuid not null,
      constraint participants_values_e325631b check (
        age_at_index between 0 and 90 and sex in ('female', 'male', 'other', 'unknown') and injury_year between 1930 and 2100
        and days_injury_to_index between 0 and 32850
        and cause in ('sports_leisure', 'assault', 'transport', 'fall', 'other_traumatic', 'non_traumatic', 'unknown')
        and ventilator in ('yes', 'no') and planned_sessions between 1 and 500 and planned_sessions_per_week between 1 and 14
      ),
      constraint participants_pkey primary key (site_id, participant)
    )`);
    await runner.query(`create index participants_month_idx on participants (site_id, month)`);
    await runner.query(`create table consents (
      site_id uuid not null, participant text not null, consent_no integer not null, status text not null,
      signed_day integer not null, valid_until_day integer, form_version integer not null, permission text not null,
      condition text, duo_rs text not null, duo_rs_kind text, duo_nmds text not null, duo_gso text not null,
      duo_npuncu text not null, duo_pub text not null, duo_col text not null, duo_irb text not null, duo_gs text not null,
      duo_gs_area text, duo_mor text not null, duo_mor_months integer, duo_ts text not null, duo_ts_months integer,
      duo_us text not null, duo_ps text not null, duo_is text not null, duo_rtn text not null, duo_cc text not null,
      duo_npoa text not null, duo_npu text not null, duo_ncu text not null, no_controls text not null,
      no_aggregates text not null, withdrawal_scope text, month text not null, submission_id uuid not null,
      constraint consents_values_0bad9c22 check (
        consent_no between 1 and 99 and status in ('active', 'withdrawn', 'superseded', 'expired')
        and signed_day between -3650 and 18250 and valid_until_day between -3650 and 36500 and form_version between 1 and 999
        and permission in ('NRES', 'GRU', 'HMB', 'DS', 'POA')
        and condition in ('nervous_system', 'spinal_cord_disorder', 'spinal_cord_injury', 'traumatic_sci', 'non_traumatic_sci', 'cervical_sci', 'thoracic_sci', 'lumbosacral_sci', 'not_stated')
        and duo_rs in ('yes', 'no')
        and duo_rs_kind in ('walking_recovery', 'rehabilitation', 'training_safety', 'health_services', 'not_stated')
        and duo_nmds in ('yes', 'no') and duo_gso in ('yes', 'no') and duo_npuncu in ('yes', 'no') and duo_pub in ('yes', 'no')
        and duo_col in ('yes', 'no') and duo_irb in ('yes', 'no') and duo_gs in ('yes', 'no')
        and duo_gs_area in ('own_country', 'eea', 'eea_uk_switzerland', 'north_america', 'not_stated') and duo_mor in ('yes', 'no')
        and duo_mor_months between 1 and 600 and duo_ts in ('yes', 'no') and duo_ts_months between 1 and 600
        and duo_us in ('yes', 'no') and duo_ps in ('yes', 'no') and duo_is in ('yes', 'no') and duo_rtn in ('yes', 'no')
        and duo_cc in ('yes', 'no') and duo_npoa in ('yes', 'no') and duo_npu in ('yes', 'no') and duo_ncu in ('yes', 'no')
        and no_controls in ('yes', 'no') and no_aggregates in ('yes', 'no')
        and withdrawal_scope in ('no_new_data', 'no_further_use', 'delete')
      ),
      constraint consents_pkey primary key (site_id, participant, consent_no)
    )`);
    await runner.query(`create index consents_month_idx on consents (site_id, month)`);
    await runner.query(`create table exams (
      site_id uuid not null, participant text not null, exam_day integer not null, lt_r_c2 text not null,
      lt_r_c3 text not null, lt_r_c4 text not null, lt_r_c5 text not null, lt_r_c6 text not null, lt_r_c7 text not null,
      lt_r_c8 text not null, lt_r_t1 text not null, lt_r_t2 text not null, lt_r_t3 text not null, lt_r_t4 text not null,
      lt_r_t5 text not null, lt_r_t6 text not null, lt_r_t7 text not null, lt_r_t8 text not null, lt_r_t9 text not null,
      lt_r_t10 text not null, lt_r_t11 text not null, lt_r_t12 text not null, lt_r_l1 text not null, lt_r_l2 text not null,
      lt_r_l3 text not null, lt_r_l4 text not null, lt_r_l5 text not null, lt_r_s1 text not null, lt_r_s2 text not null,
      lt_r_s3 text not null, lt_r_s4_5 text not null, lt_l_c2 text not null, lt_l_c3 text not null, lt_l_c4 text not null,
      lt_l_c5 text not null, lt_l_c6 text not null, lt_l_c7 text not null, lt_l_c8 text not null, lt_l_t1 text not null,
      lt_l_t2 text not null, lt_l_t3 text not null, lt_l_t4 text not null, lt_l_t5 text not null, lt_l_t6 text not null,
      lt_l_t7 text not null, lt_l_t8 text not null, lt_l_t9 text not null, lt_l_t10 text not null, lt_l_t11 text not null,
      lt_l_t12 text not null, lt_l_l1 text not null, lt_l_l2 text not null, lt_l_l3 text not null, lt_l_l4 text not null,
      lt_l_l5 text not null, lt_l_s1 text not null, lt_l_s2 text not null, lt_l_s3 text not null, lt_l_s4_5 text not null,
      pp_r_c2 text not null, pp_r_c3 text not null, pp_r_c4 text not null, pp_r_c5 text not null, pp_r_c6 text not null,
      pp_r_c7 text not null, pp_r_c8 text not null, pp_r_t1 text not null, pp_r_t2 text not null, pp_r_t3 text not null,
      pp_r_t4 text not null, pp_r_t5 text not null, pp_r_t6 text not null, pp_r_t7 text not null, pp_r_t8 text not null,
      pp_r_t9 text not null, pp_r_t10 text not null, pp_r_t11 text not null, pp_r_t12 text not null, pp_r_l1 text not null,
      pp_r_l2 text not null, pp_r_l3 text not null, pp_r_l4 text not null, pp_r_l5 text not null, pp_r_s1 text not null,
      pp_r_s2 text not null, pp_r_s3 text not null, pp_r_s4_5 text not null, pp_l_c2 text not null, pp_l_c3 text not null,
      pp_l_c4 text not null, pp_l_c5 text not null, pp_l_c6 text not null, pp_l_c7 text not null, pp_l_c8 text not null,
      pp_l_t1 text not null, pp_l_t2 text not null, pp_l_t3 text not null, pp_l_t4 text not null, pp_l_t5 text not null,
      pp_l_t6 text not null, pp_l_t7 text not null, pp_l_t8 text not null, pp_l_t9 text not null, pp_l_t10 text not null,
      pp_l_t11 text not null, pp_l_t12 text not null, pp_l_l1 text not null, pp_l_l2 text not null, pp_l_l3 text not null,
      pp_l_l4 text not null, pp_l_l5 text not null, pp_l_s1 text not null, pp_l_s2 text not null, pp_l_s3 text not null,
      pp_l_s4_5 text not null, m_r_c5 text not null, m_r_c6 text not null, m_r_c7 text not null, m_r_c8 text not null,
      m_r_t1 text not null, m_r_l2 text not null, m_r_l3 text not null, m_r_l4 text not null, m_r_l5 text not null,
      m_r_s1 text not null, m_l_c5 text not null, m_l_c6 text not null, m_l_c7 text not null, m_l_c8 text not null,
      m_l_t1 text not null, m_l_l2 text not null, m_l_l3 text not null, m_l_l4 text not null, m_l_l5 text not null,
      m_l_s1 text not null, vac text not null, dap text not null, non_key_r text, non_key_l text,
      earlier_deficit text not null, nt_reason text, tag_cause text, examiner_role text not null, recorded_ais text,
      recorded_nli text, non_sci_affects text, month text not null, submission_id uuid not null, class_nli text array not null,
      class_ais text array not null, class_level_group text not null, class_uems integer, class_lems integer,
      constraint exams_values_867d5d42 check (
        exam_day between -3650 and 18250 and lt_r_c2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_c8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t9 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t10 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t11 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_t12 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_l1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_l2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_l3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_l4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_l5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_s1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_s2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_s3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_r_s4_5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_c8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t9 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t10 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t11 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_t12 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_l1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_l2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_l3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_l4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_l5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_s1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_s2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_s3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and lt_l_s4_5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_c8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t9 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t10 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t11 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_t12 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_l1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_l2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_l3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_l4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_l5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_s1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_s2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_s3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_r_s4_5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_c8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t6 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t7 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t8 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t9 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t10 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t11 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_t12 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_l1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_l2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_l3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_l4 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_l5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_s1 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_s2 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_s3 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and pp_l_s4_5 in ('0', '1', '2', '0*', '1*', '0**', '1**', 'NT', 'NT*', 'NT**')
        and m_r_c5 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_c6 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_c7 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_c8 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_t1 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_l2 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_l3 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_l4 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_l5 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_r_s1 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_c5 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_c6 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_c7 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_c8 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_t1 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_l2 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_l3 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_l4 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_l5 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and m_l_s1 in ('0', '1', '2', '3', '4', '5', '0*', '1*', '2*', '3*', '4*', '0**', '1**', '2**', '3**', '4**', 'NT', 'NT*', 'NT**')
        and vac in ('yes', 'no', 'NT') and dap in ('yes', 'no', 'NT')
        and non_key_r in ('C5', 'C6', 'C7', 'C8', 'T1', 'L2', 'L3', 'L4', 'L5', 'S1')
        and non_key_l in ('C5', 'C6', 'C7', 'C8', 'T1', 'L2', 'L3', 'L4', 'L5', 'S1') and earlier_deficit in ('yes', 'no')
        and nt_reason in ('sacral_sparing_felt', 'cast_or_dressing', 'pain', 'amputation', 'contracture', 'cooperation', 'declined', 'medical', 'other')
        and tag_cause in ('peripheral_nerve', 'brachial_plexus', 'fracture_or_cast', 'burn_or_scar', 'pain', 'amputation', 'contracture', 'brain_injury', 'other_neurological', 'other')
        and examiner_role in ('physician', 'physiotherapist', 'occupational_therapist', 'nurse', 'other', 'unknown')
        and recorded_ais in ('A', 'B', 'C', 'D', 'E', 'ND')
        and recorded_nli in ('C1', 'C2', 'C3', 'C4', 'C5', 'C6', 'C7', 'C8', 'T1', 'T2', 'T3', 'T4', 'T5', 'T6', 'T7', 'T8', 'T9', 'T10', 'T11', 'T12', 'L1', 'L2', 'L3', 'L4', 'L5', 'S1', 'S2', 'S3', 'INT', 'ND')
        and non_sci_affects in ('none', 'nli', 'ais', 'both')
      ),
      constraint exams_pkey primary key (site_id, participant, exam_day)
    )`);
    await runner.query(`create index exams_month_idx on exams (site_id, month)`);
    await runner.query(`create table assessments (
      site_id uuid not null, participant text not null, assessment_day integer not null, measure text not null,
      in_device text not null, trial_no integer not null, course_no integer not null, timepoint text not null,
      attempt_status text not null, value double precision, aid text, brace text, assist_persons integer,
      timed_distance_m double precision, time_s double precision, start_type text, seconds_walked integer, rests integer,
      rpe_end double precision, rpe_scale text, chair_arms text, level_basis text, muscle_group text, side text,
      pain_window text, pain_type text, locomotion_mode text, posture text, posture_min double precision, month text not null,
      submission_id uuid not null,
      constraint assessments_values_2654750c check (
        assessment_day between -3650 and 18250
        and measure in ('tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug', 'wisci2', 'scim3_total', 'scim3_self_care', 'scim3_resp_sphincter', 'scim3_mobility_room', 'scim3_mobility_in_out', 'scim3_mobility', 'bbs', 'lems', 'uems', 'mas', 'psfs_freq', 'psfs_severity', 'pain_nrs', 'speed_derived', 'fim_locomotion', 'sci_fai_gait', 'sci_fai_aid', 'sci_fai_mobility', 'qol_life', 'qol_physical', 'qol_psychological', 'qol_social', 'rpe_cr10', 'rpe_6_20', 'hr_rest', 'hr_exercise', 'sbp', 'dbp')
        and in_device in ('yes', 'no') and trial_no between 1 and 40 and course_no between 1 and 50
        and timepoint in ('baseline', 'interim', 'end_of_course', 'follow_up_3m', 'follow_up_6m', 'follow_up_12m', 'yearly')
        and attempt_status in ('done', 'unable_physical', 'unable_other', 'not_attempted', 'stopped_early')
        and value between 0 and 1000 and aid in ('none', 'bars', 'walker', 'two_crutches', 'one_crutch', 'stick')
        and brace in ('yes', 'no') and assist_persons between 0 and 4 and timed_distance_m between 6 and 10
        and time_s between 1.5 and 1000 and start_type in ('static', 'flying') and seconds_walked between 1 and 360
        and rests between 0 and 30 and rpe_end between 0 and 20 and rpe_scale in ('cr10', '6_20') and chair_arms in ('yes', 'no')
        and level_basis in ('self_selected', 'maximum')
        and muscle_group in ('hip_add', 'hip_flex', 'knee_flex', 'knee_ext', 'plantar_flex') and side in ('right', 'left')
        and pain_window in ('now', 'average_7d') and pain_type in ('neuropathic', 'nociceptive', 'unknown')
        and locomotion_mode in ('walk', 'wheelchair', 'both') and posture in ('supine', 'sitting', 'standing', 'in_device')
        and posture_min between 0 and 180
      ),
      constraint assessments_pkey primary key (site_id, participant, assessment_day, measure, in_device, trial_no)
    )`);
    await runner.query(`create index assessments_month_idx on assessments (site_id, month)`);
    await runner.query(`create table sessions (
      site_id uuid not null, participant text not null, session_day integer not null, session_no integer not null,
      course_no integer not null, start_hour integer, status text not null, not_trained_reason text, device_class text,
      planned_min double precision, don_min double precision, doff_min double precision, upright_min double precision,
      rest_min double precision, steps_total integer, distance_total_m double precision, body_mass_kg double precision,
      staff_count integer, assist_level integer, hr_rest integer, hr_peak integer, sbp_pre integer, dbp_pre integer,
      sbp_min integer, dbp_min integer, sbp_max integer, dbp_max integer, sbp_post integer, dbp_post integer,
      bp_pre_posture text, bp_min_posture text, bp_min_minute double precision, rpe double precision, rpe_scale text,
      pain_pre integer, pain_post integer, spasticity_change text, skin_check_pre text, skin_check_post text,
      dysreflexia_decision text, hypotension_decision text, month text not null, submission_id uuid not null,
      constraint sessions_values_ff7ce02e check (
        session_day between -3650 and 18250 and session_no between 1 and 500 and course_no between 1 and 50
        and start_hour between 0 and 23 and status in ('completed', 'shortened', 'cancelled_before', 'attended_not_trained')
        and not_trained_reason in ('medical', 'fatigue', 'skin', 'equipment', 'staff', 'transport', 'other')
        and device_class in ('treadmill_driven_orthosis', 'overground_powered_exoskeleton', 'signal_driven_exoskeleton', 'end_effector_trainer', 'manual_bwstt', 'overground_bws', 'fes_walking', 'passive_orthosis', 'conventional_overground')
        and planned_min between 5 and 180 and don_min between 0 and 90 and doff_min between 0 and 90
        and upright_min between 0 and 180 and rest_min between 0 and 180 and steps_total between 0 and 20000
        and distance_total_m between 0 and 10000 and body_mass_kg between 25 and 200 and staff_count between 0 and 6
        and assist_level between 1 and 7 and hr_rest between 25 and 220 and hr_peak between 30 and 230 and sbp_pre between 40 and 320
        and dbp_pre between 20 and 220 and sbp_min between 40 and 320 and dbp_min between 20 and 220 and sbp_max between 40 and 320
        and dbp_max between 20 and 220 and sbp_post between 40 and 320 and dbp_post between 20 and 220
        and bp_pre_posture in ('supine', 'sitting', 'standing', 'in_device')
        and bp_min_posture in ('supine', 'sitting', 'standing', 'in_device') and bp_min_minute between 0 and 180
        and rpe between 0 and 20 and rpe_scale in ('cr10', '6_20') and pain_pre between 0 and 10 and pain_post between 0 and 10
        and spasticity_change in ('less', 'same', 'more')
        and skin_check_pre in ('intact', 'redness_fades', 'redness_stays', 'broken')
        and skin_check_post in ('intact', 'redness_fades', 'redness_stays', 'broken')
        and dysreflexia_decision in ('present', 'absent', 'not_assessed')
        and hypotension_decision in ('present', 'absent', 'not_assessed')
      ),
      constraint sessions_pkey primary key (site_id, participant, session_day, session_no)
    )`);
    await runner.query(`create index sessions_month_idx on sessions (site_id, month)`);
    await runner.query(`create table bouts (
      site_id uuid not null, participant text not null, session_day integer not null, session_no integer not null,
      bout_no integer not null, activity text not null, device_class text not null, surface text,
      duration_s double precision not null, distance_m double precision, steps integer, treadmill_speed_mps double precision,
      bws_kg double precision, bws_pct double precision, guidance_pct double precision, hip_r_control text not null,
      hip_l_control text not null, knee_r_control text not null, knee_l_control text not null, ankle_r_control text,
      ankle_l_control text, hip_r_gain_pct double precision, hip_l_gain_pct double precision, knee_r_gain_pct double precision,
      knee_l_gain_pct double precision, stim_on text, stim_channels integer, aid text, assist_persons integer, hr_end integer,
      rpe_end double precision, rpe_scale text, stop_reason text not null, rest_after_s double precision, month text not null,
      submission_id uuid not null,
      constraint bouts_values_47ea4c70 check (
        session_day between -3650 and 18250 and session_no between 1 and 500 and bout_no between 1 and 60
        and activity in ('walking', 'isolated_movement')
        and device_class in ('treadmill_driven_orthosis', 'overground_powered_exoskeleton', 'signal_driven_exoskeleton', 'end_effector_trainer', 'manual_bwstt', 'overground_bws', 'fes_walking', 'passive_orthosis', 'conventional_overground')
        and surface in ('treadmill', 'overground_level', 'ramp', 'stairs', 'outdoor') and duration_s between 1 and 7200
        and distance_m between 0 and 5000 and steps between 0 and 12000 and treadmill_speed_mps between 0.05 and 2.5
        and bws_kg between 0 and 200 and bws_pct between 0 and 100 and guidance_pct between 0 and 100
        and hip_r_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and hip_l_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and knee_r_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and knee_l_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and ankle_r_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and ankle_l_control in ('volitional', 'volitional_threshold', 'programmed', 'assist_as_needed', 'passive', 'locked', 'stimulated', 'absent')
        and hip_r_gain_pct between 0 and 100 and hip_l_gain_pct between 0 and 100 and knee_r_gain_pct between 0 and 100
        and knee_l_gain_pct between 0 and 100 and stim_on in ('yes', 'no') and stim_channels between 0 and 16
        and aid in ('none', 'bars', 'walker', 'two_crutches', 'one_crutch', 'stick') and assist_persons between 0 and 4
        and hr_end between 30 and 230 and rpe_end between 0 and 20 and rpe_scale in ('cr10', '6_20')
        and stop_reason in ('planned', 'signal_fading', 'fatigue', 'symptoms', 'pain', 'spasm', 'equipment', 'fit', 'skin', 'participant_choice', 'other')
        and rest_after_s between 0 and 3600
      ),
      constraint bouts_pkey primary key (site_id, participant, session_day, session_no, bout_no)
    )`);
    await runner.query(`create index bouts_month_idx on bouts (site_id, month)`);
    await runner.query(`create table adverse_events (
      site_id uuid not null, participant text not null, event_no integer not null, event_day integer not null,
      session_day integer, session_no integer, onset text not null, onset_min double precision, kind text not null,
      severity text not null, serious text not null, attribution text not null, attributed_to text, expected text not null,
      action text not null, outcome text not null, resolved_day integer, narrative_held text, sbp_rise integer,
      sbp_peak integer, bradycardia text, dysreflexia_trigger text, sbp_drop integer, dbp_drop integer, start_posture text,
      symptomatic text, skin_stage text, body_site text, device_contact text, fall_injured text, fall_tethered text,
      fall_device_worn text, fracture_imaged text, bone_density_before text, pain_rise integer, pain_over_24h text,
      month text not null, submission_id uuid not null,
      constraint adverse_events_values_4dfbc452 check (
        event_no between 1 and 999 and event_day between -3650 and 18250 and session_day between -3650 and 18250
        and session_no between 1 and 500 and onset in ('before', 'during', 'after', 'outside') and onset_min between 0 and 2880
        and kind in ('autonomic_dysreflexia', 'orthostatic_hypotension', 'skin_breakdown', 'fall', 'fracture', 'pain_increase', 'spasticity_increase', 'musculoskeletal', 'syncope', 'chest_symptom', 'dvt', 'infection', 'equipment_fault', 'other')
        and severity in ('1', '2', '3', '4', '5') and serious in ('yes', 'no')
        and attribution in ('unrelated', 'unlikely', 'possible', 'probable', 'definite')
        and attributed_to in ('device', 'training_load', 'condition', 'staff_handling', 'other') and expected in ('yes', 'no')
        and action in ('none', 'paused', 'stopped', 'course_ended')
        and outcome in ('resolved', 'resolved_lasting_effect', 'ongoing', 'fatal', 'unknown')
        and resolved_day between -3650 and 18250 and narrative_held in ('yes', 'no') and sbp_rise between 1 and 250
        and sbp_peak between 40 and 320 and bradycardia in ('yes', 'no')
        and dysreflexia_trigger in ('bladder', 'bowel', 'skin', 'harness_or_strap', 'pain', 'spasm', 'other', 'unknown')
        and sbp_drop between 0 and 200 and dbp_drop between 0 and 150 and start_posture in ('supine', 'sitting')
        and symptomatic in ('yes', 'no') and skin_stage in ('1', '2', '3', '4', 'unstageable')
        and body_site in ('shoulder', 'upper_arm', 'elbow', 'forearm_wrist', 'hand_thumb', 'neck', 'trunk', 'spine', 'sacrum', 'ischium', 'trochanter', 'pelvis_hip', 'thigh', 'knee', 'lower_leg', 'ankle', 'heel', 'foot_toes', 'other')
        and device_contact in ('yes', 'no') and fall_injured in ('yes', 'no') and fall_tethered in ('yes', 'no')
        and fall_device_worn in ('yes', 'no') and fracture_imaged in ('yes', 'no')
        and bone_density_before in ('normal', 'low', 'osteoporosis', 'not_measured') and pain_rise between 1 and 10
        and pain_over_24h in ('yes', 'no')
      ),
      constraint adverse_events_pkey primary key (site_id, participant, event_no)
    )`);
    await runner.query(`create index adverse_events_month_idx on adverse_events (site_id, month)`);
    await runner.query(`create table staged_participants (
      submission_id uuid not null, site_id uuid not null, participant text not null, age_at_index integer, sex text,
      injury_year integer, days_injury_to_index integer, cause text, ventilator text, planned_sessions integer,
      planned_sessions_per_week integer, line integer not null,
      constraint staged_participants_pkey primary key (submission_id, participant)
    )`);
    await runner.query(`create table staged_consents (
      submission_id uuid not null, site_id uuid not null, participant text not null, consent_no integer not null, status text,
      signed_day integer, valid_until_day integer, form_version integer, permission text, condition text, duo_rs text,
      duo_rs_kind text, duo_nmds text, duo_gso text, duo_npuncu text, duo_pub text, duo_col text, duo_irb text, duo_gs text,
      duo_gs_area text, duo_mor text, duo_mor_months integer, duo_ts text, duo_ts_months integer, duo_us text, duo_ps text,
      duo_is text, duo_rtn text, duo_cc text, duo_npoa text, duo_npu text, duo_ncu text, no_controls text, no_aggregates text,
      withdrawal_scope text, line integer not null,
      constraint staged_consents_pkey primary key (submission_id, participant, consent_no)
    )`);
    await runner.query(`create table staged_exams (
      submission_id uuid not null, site_id uuid not null, participant text not null, exam_day integer not null, lt_r_c2 text,
      lt_r_c3 text, lt_r_c4 text, lt_r_c5 text, lt_r_c6 text, lt_r_c7 text, lt_r_c8 text, lt_r_t1 text, lt_r_t2 text,
      lt_r_t3 text, lt_r_t4 text, lt_r_t5 text, lt_r_t6 text, lt_r_t7 text, lt_r_t8 text, lt_r_t9 text, lt_r_t10 text,
      lt_r_t11 text, lt_r_t12 text, lt_r_l1 text, lt_r_l2 text, lt_r_l3 text, lt_r_l4 text, lt_r_l5 text, lt_r_s1 text,
      lt_r_s2 text, lt_r_s3 text, lt_r_s4_5 text, lt_l_c2 text, lt_l_c3 text, lt_l_c4 text, lt_l_c5 text, lt_l_c6 text,
      lt_l_c7 text, lt_l_c8 text, lt_l_t1 text, lt_l_t2 text, lt_l_t3 text, lt_l_t4 text, lt_l_t5 text, lt_l_t6 text,
      lt_l_t7 text, lt_l_t8 text, lt_l_t9 text, lt_l_t10 text, lt_l_t11 text, lt_l_t12 text, lt_l_l1 text, lt_l_l2 text,
      lt_l_l3 text, lt_l_l4 text, lt_l_l5 text, lt_l_s1 text, lt_l_s2 text, lt_l_s3 text, lt_l_s4_5 text, pp_r_c2 text,
      pp_r_c3 text, pp_r_c4 text, pp_r_c5 text, pp_r_c6 text, pp_r_c7 text, pp_r_c8 text, pp_r_t1 text, pp_r_t2 text,
      pp_r_t3 text, pp_r_t4 text, pp_r_t5 text, pp_r_t6 text, pp_r_t7 text, pp_r_t8 text, pp_r_t9 text, pp_r_t10 text,
      pp_r_t11 text, pp_r_t12 text, pp_r_l1 text, pp_r_l2 text, pp_r_l3 text, pp_r_l4 text, pp_r_l5 text, pp_r_s1 text,
      pp_r_s2 text, pp_r_s3 text, pp_r_s4_5 text, pp_l_c2 text, pp_l_c3 text, pp_l_c4 text, pp_l_c5 text, pp_l_c6 text,
      pp_l_c7 text, pp_l_c8 text, pp_l_t1 text, pp_l_t2 text, pp_l_t3 text, pp_l_t4 text, pp_l_t5 text, pp_l_t6 text,
      pp_l_t7 text, pp_l_t8 text, pp_l_t9 text, pp_l_t10 text, pp_l_t11 text, pp_l_t12 text, pp_l_l1 text, pp_l_l2 text,
      pp_l_l3 text, pp_l_l4 text, pp_l_l5 text, pp_l_s1 text, pp_l_s2 text, pp_l_s3 text, pp_l_s4_5 text, m_r_c5 text,
      m_r_c6 text, m_r_c7 text, m_r_c8 text, m_r_t1 text, m_r_l2 text, m_r_l3 text, m_r_l4 text, m_r_l5 text, m_r_s1 text,
      m_l_c5 text, m_l_c6 text, m_l_c7 text, m_l_c8 text, m_l_t1 text, m_l_l2 text, m_l_l3 text, m_l_l4 text, m_l_l5 text,
      m_l_s1 text, vac text, dap text, non_key_r text, non_key_l text, earlier_deficit text, nt_reason text, tag_cause text,
      examiner_role text, recorded_ais text, recorded_nli text, non_sci_affects text, line integer not null,
      class_nli text array not null, class_ais text array not null, class_level_group text not null, class_uems integer,
      class_lems integer,
      constraint staged_exams_pkey primary key (submission_id, participant, exam_day)
    )`);
    await runner.query(`create table staged_assessments (
      submission_id uuid not null, site_id uuid not null, participant text not null, assessment_day integer not null,
      measure text not null, in_device text not null, trial_no integer not null, course_no integer, timepoint text,
      attempt_status text, value double precision, aid text, brace text, assist_persons integer,
      timed_distance_m double precision, time_s double precision, start_type text, seconds_walked integer, rests integer,
      rpe_end double precision, rpe_scale text, chair_arms text, level_basis text, muscle_group text, side text,
      pain_window text, pain_type text, locomotion_mode text, posture text, posture_min double precision,
      line integer not null,
      constraint staged_assessments_pkey primary key (submission_id, participant, assessment_day, measure, in_device, trial_no)
    )`);
    await runner.query(`create table staged_sessions (
      submission_id uuid not null, site_id uuid not null, participant text not null, session_day integer not null,
      session_no integer not null, course_no integer, start_hour integer, status text, not_trained_reason text,
      device_class text, planned_min double precision, don_min double precision, doff_min double precision,
      upright_min double precision, rest_min double precision, steps_total integer, distance_total_m double precision,
      body_mass_kg double precision, staff_count integer, assist_level integer, hr_rest integer, hr_peak integer,
      sbp_pre integer, dbp_pre integer, sbp_min integer, dbp_min integer, sbp_max integer, dbp_max integer, sbp_post integer,
      dbp_post integer, bp_pre_posture text, bp_min_posture text, bp_min_minute double precision, rpe double precision,
      rpe_scale text, pain_pre integer, pain_post integer, spasticity_change text, skin_check_pre text, skin_check_post text,
      dysreflexia_decision text, hypotension_decision text, line integer not null,
      constraint staged_sessions_pkey primary key (submission_id, participant, session_day, session_no)
    )`);
    await runner.query(`create table staged_bouts (
      submission_id uuid not null, site_id uuid not null, participant text not null, session_day integer not null,
      session_no integer not null, bout_no integer not null, activity text, device_class text, surface text,
      duration_s double precision, distance_m double precision, steps integer, treadmill_speed_mps double precision,
      bws_kg double precision, bws_pct double precision, guidance_pct double precision, hip_r_control text, hip_l_control text,
      knee_r_control text, knee_l_control text, ankle_r_control text, ankle_l_control text, hip_r_gain_pct double precision,
      hip_l_gain_pct double precision, knee_r_gain_pct double precision, knee_l_gain_pct double precision, stim_on text,
      stim_channels integer, aid text, assist_persons integer, hr_end integer, rpe_end double precision, rpe_scale text,
      stop_reason text, rest_after_s double precision, line integer not null,
      constraint staged_bouts_pkey primary key (submission_id, participant, session_day, session_no, bout_no)
    )`);
    await runner.query(`create table staged_adverse_events (
      submission_id uuid not null, site_id uuid not null, participant text not null, event_no integer not null,
      event_day integer, session_day integer, session_no integer, onset text, onset_min double precision, kind text,
      severity text, serious text, attribution text, attributed_to text, expected text, action text, outcome text,
      resolved_day integer, narrative_held text, sbp_rise integer, sbp_peak integer, bradycardia text,
      dysreflexia_trigger text, sbp_drop integer, dbp_drop integer, start_posture text, symptomatic text, skin_stage text,
      body_site text, device_contact text, fall_injured text, fall_tethered text, fall_device_worn text, fracture_imaged text,
      bone_density_before text, pain_rise integer, pain_over_24h text, line integer not null,
      constraint staged_adverse_events_pkey primary key (submission_id, participant, event_no)
    )`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`drop table course_facts,
      outcome_facts,
      releases,
      release_courses,
      release_outcomes,
      release_sessions,
      sites,
      accounts,
      grants,
      invitations,
      web_sessions,
      audit_entries,
      mail_messages,
      access_requests,
      access_request_members,
      access_request_votes,
      exports,
      export_pseudonyms,
      submissions,
      submission_files,
      submission_findings,
      row_history,
      participants,
      consents,
      exams,
      assessments,
      sessions,
      bouts,
      adverse_events,
      staged_participants,
      staged_consents,
      staged_exams,
      staged_assessments,
      staged_sessions,
      staged_bouts,
      staged_adverse_events`);
  }
}
