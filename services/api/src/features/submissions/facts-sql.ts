/**
 * One row per participant and course, and per outcome of it, worked out again for the people a submission touched.
 * Everyone has a first course, begun or not: a person without results is counted as missing, not overlooked.
 * Baseline exam: the last on or before the first attended session of the course, at most `examWindowDays` earlier.
 * Baseline and end of course: the latest assessment of that timepoint; of several trials on that day the first.
 */

/** Days before the first session within which an exam counts as the baseline exam. Stated on the Methods page. */
export const examWindowDays = 90;

export const clearFacts = [
  'delete from course_facts where site_id = :site and participant = any(:people::text[])',
  'delete from outcome_facts where site_id = :site and participant = any(:people::text[])',
];

const attended = `('completed', 'shortened')`;

export const courseFacts = `
insert into course_facts (site_id, participant, course_no, first_day, last_day, exam_day, nli, level_group, ais, age, sex, cause, days_since_injury,
  sessions, bouts, walking_min, distance_m, steps)
with trained as (
  select participant, course_no, min(session_day) filter (where status in ${attended}) as first_day,
         max(session_day) filter (where status in ${attended}) as last_day, count(*) filter (where status in ${attended})::int as sessions
    from sessions where site_id = :site and participant = any(:people::text[]) group by participant, course_no),
walked as (
  select s.participant, s.course_no, count(*)::int as bouts, coalesce(sum(b.duration_s), 0) / 60.0 as walking_min,
         coalesce(sum(b.distance_m), 0) as distance_m, coalesce(sum(b.steps), 0)::bigint as steps
    from sessions s join bouts b on b.site_id = s.site_id and b.participant = s.participant and b.session_day = s.session_day and b.session_no = s.session_no
   where s.site_id = :site and s.participant = any(:people::text[]) and b.participant = any(:people::text[]) and b.activity = 'walking'
   group by s.participant, s.course_no),
courses as (
  select participant, 1 as course_no from participants where site_id = :site and participant = any(:people::text[])
  union select participant, course_no from trained
  union select participant, course_no from assessments where site_id = :site and participant = any(:people::text[]))
select :site::uuid, c.participant, c.course_no, t.first_day, t.last_day, e.exam_day,
       case when cardinality(e.class_nli) = 1 then e.class_nli[1] else 'ND' end, coalesce(e.class_level_group, 'ND'),
       case when cardinality(e.class_ais) = 1 and e.class_ais[1] in ('A', 'B', 'C', 'D', 'E') then e.class_ais[1] else 'ND' end,
       p.age_at_index, p.sex, p.cause, p.days_injury_to_index + coalesce(t.first_day, 0),
       coalesce(t.sessions, 0), coalesce(w.bouts, 0), coalesce(w.walking_min, 0), coalesce(w.distance_m, 0), coalesce(w.steps, 0)
  from courses c
  join participants p on p.site_id = :site and p.participant = c.participant
  left join trained t on t.participant = c.participant and t.course_no = c.course_no
  left join walked w on w.participant = c.participant and w.course_no = c.course_no
  left join lateral (
    select x.exam_day, x.class_nli, x.class_ais, x.class_level_group from exams x
     where x.site_id = :site and x.participant = c.participant
       and x.exam_day between coalesce(t.first_day, 0) - ${examWindowDays} and coalesce(t.first_day, 0)
     order by x.exam_day desc limit 1) e on true`;

const atTimepoint = (timepoint: string) => `
  select distinct on (participant, course_no, measure, in_device) participant, course_no, measure, in_device, attempt_status, value, assessment_day
    from assessments where site_id = :site and participant = any(:people::text[]) and timepoint = '${timepoint}'
   order by participant, course_no, measure, in_device, assessment_day desc, trial_no`;

export const outcomeFacts = `
insert into outcome_facts (site_id, participant, course_no, measure, in_device, baseline_status, baseline_value, baseline_day, end_status, end_value, end_day)
with b as (${atTimepoint('baseline')}), e as (${atTimepoint('end_of_course')})
select :site::uuid, participant, course_no, measure, in_device, b.attempt_status, b.value, b.assessment_day, e.attempt_status, e.value, e.assessment_day
  from b full join e using (participant, course_no, measure, in_device)`;
