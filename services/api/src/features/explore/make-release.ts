/** Freezes the registry into a numbered release that never changes. People whose consent forbids it are left out from here on. */
import { randomUUID } from 'node:crypto';
import type { InputOf } from '@cairnstep/contract';
import type { makeRelease as MakeRelease } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { joinWholeTables } from '../../database/join-whole-tables.ts';
import { Refusal } from '../../http/refusal.ts';
import { readRelease, type ReleaseRecord } from './explore.repository.ts';

/** Newest consent of each person in force, and aggregates not refused. Whoever has withdrawn, however far, is in no later release. */
const consenting = `with latest as (select distinct on (site_id, participant) site_id, participant, status, no_aggregates
    from consents order by site_id, participant, consent_no desc),
  consenting as (select site_id, participant from latest
    where status = 'active' and no_aggregates is distinct from 'yes')`;

const courseColumns = `site_id, participant, course_no, first_day, last_day, exam_day, nli, level_group, ais, age, sex, cause, days_since_injury,
  sessions, bouts, walking_min, distance_m, steps`;
const outcomeColumns = `site_id, participant, course_no, measure, in_device, baseline_status, baseline_value, baseline_day, end_status, end_value, end_day`;

async function copyFacts(tx: Tx, release: number): Promise<void> {
  await tx.query(
    `${consenting} insert into release_courses (${courseColumns}, release_number)
    select ${courseColumns}, $1 from course_facts join consenting using (site_id, participant)`,
    [release],
  );
  await tx.query(
    `${consenting} insert into release_outcomes (${outcomeColumns}, release_number)
    select ${outcomeColumns}, $1 from outcome_facts join consenting using (site_id, participant)`,
    [release],
  );
  await tx.query(
    `${consenting}, walked as (
       select site_id, participant, session_day, session_no, count(*)::int as bouts, coalesce(sum(duration_s), 0) / 60.0 as walking_min,
              coalesce(sum(distance_m), 0) as distance_m, coalesce(sum(steps), 0)::int as steps
         from bouts where activity = 'walking' group by site_id, participant, session_day, session_no)
     insert into release_sessions (release_number, site_id, participant, course_no, session_ordinal, four_week_block, status, device_class, bouts, walking_min, distance_m, steps)
     select $1, s.site_id, s.participant, s.course_no,
            row_number() over (partition by s.site_id, s.participant, s.course_no order by s.session_day, s.session_no),
            floor((s.session_day - coalesce(c.first_day, s.session_day)) / 28.0)::int + 1, s.status, s.device_class,
            coalesce(w.bouts, 0), coalesce(w.walking_min, 0), coalesce(w.distance_m, 0), coalesce(w.steps, 0)
       from sessions s join consenting using (site_id, participant)
       left join course_facts c on c.site_id = s.site_id and c.participant = s.participant and c.course_no = s.course_no
       left join walked w on w.site_id = s.site_id and w.participant = s.participant and w.session_day = s.session_day and w.session_no = s.session_no`,
    [release],
  );
}

/** Over the registry's live facts of everyone who would be in the release, in key order. */
const digestOfFacts = `${consenting}
  select encode(sha256(convert_to(
    coalesce((select string_agg(md5(c::text), '' order by c.site_id, c.participant, c.course_no) from course_facts c join consenting using (site_id, participant)), '') ||
    coalesce((select string_agg(md5(o::text), '' order by o.site_id, o.participant, o.course_no, o.measure, o.in_device) from outcome_facts o join consenting using (site_id, participant)), ''),
    'UTF8')), 'hex') as digest,
  (select jsonb_build_object('participants', count(distinct (site_id, participant)), 'sites', count(distinct site_id),
     'sessions', coalesce(sum(sessions), 0), 'bouts', coalesce(sum(bouts), 0)) from course_facts join consenting using (site_id, participant)) as totals`;

export async function freeze(tx: Tx, madeBy: string | null, note: string): Promise<ReleaseRecord> {
  await tx.query("select pg_advisory_xact_lock(hashtext('release'))");
  await joinWholeTables(tx);
  const newest = await readRelease(tx, undefined);
  const [facts] = (await tx.query(digestOfFacts)) as [{ digest: string; totals: ReleaseRecord['totals'] }];
  if (newest?.digest === facts.digest)
    throw new Refusal('release-unchanged', `Release ${newest.number} already holds the registry as it is.`);
  const number = (newest?.number ?? 0) + 1;
  await tx.query('insert into releases (id, number, made_by, note, totals, digest) values ($1, $2, $3, $4, $5, $6)', [
    randomUUID(),
    number,
    madeBy,
    note,
    facts.totals,
    facts.digest,
  ]);
  await copyFacts(tx, number);
  const release = await readRelease(tx, number);
  if (!release) throw new Error('A release just made must be readable.');
  return release;
}

export const makeRelease = (
  { database }: Context,
  actor: Actor,
  { note }: InputOf<typeof MakeRelease>,
  requestId: string,
): Promise<ReleaseRecord> =>
  asActor(database, actor, async (tx) => {
    const release = await freeze(tx, actor.kind === 'person' ? actor.accountId : null, note);
    await recordAudit(tx, actor, {
      act: 'release.make',
      object: `release ${release.number}`,
      requestId,
      detail: { digest: release.digest },
    });
    return release;
  });
