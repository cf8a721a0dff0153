/** Reads frozen facts of releases (as `statistics`) and live facts of one site (as its people). First courses only: a person counts once. */
import type { Tx } from '../../database/as-actor.ts';
import type { CourseFact, OutcomeFact } from './facts.ts';

export interface ReleaseRecord {
  readonly id: string;
  readonly number: number;
  readonly madeAt: Date;
  readonly note: string;
  readonly totals: { readonly participants: number; readonly sites: number; readonly sessions: number; readonly bouts: number };
  readonly digest: string;
}

const releaseColumns = 'id, number, made_at as "madeAt", note, totals, digest';

export const listReleases = async (tx: Tx): Promise<ReleaseRecord[]> =>
  (await tx.query(`select ${releaseColumns} from releases order by number desc`)) as ReleaseRecord[];

/** The release of that number, or the newest. */
export async function readRelease(tx: Tx, number: number | undefined): Promise<ReleaseRecord | null> {
  const [row] = (await tx.query(
    `select ${releaseColumns} from releases where $1::int is null or number = $1 order by number desc limit 1`,
    [number ?? null],
  )) as ReleaseRecord[];
  return row ?? null;
}

const factColumns = `c.site_id as "siteId", c.level_group as "levelGroup", c.ais, o.baseline_status as "baselineStatus", o.baseline_value as baseline,
  o.end_status as "endStatus", o.end_value as "end"`;

export async function readReleaseOutcome(tx: Tx, release: number, measure: string, inDevice: 'yes' | 'no'): Promise<OutcomeFact[]> {
  return (await tx.query(
    `select ${factColumns} from release_courses c
       left join release_outcomes o on o.release_number = c.release_number and o.site_id = c.site_id and o.participant = c.participant
        and o.course_no = c.course_no and o.measure = $2 and o.in_device = $3
      where c.release_number = $1 and c.course_no = 1`,
    [release, measure, inDevice],
  )) as OutcomeFact[];
}

export async function readSiteOutcome(tx: Tx, siteId: string, measure: string, inDevice: 'yes' | 'no'): Promise<OutcomeFact[]> {
  return (await tx.query(
    `select ${factColumns} from course_facts c
       left join outcome_facts o on o.site_id = c.site_id and o.participant = c.participant and o.course_no = c.course_no and o.measure = $2 and o.in_device = $3
      where c.site_id = $1 and c.course_no = 1`,
    [siteId, measure, inDevice],
  )) as OutcomeFact[];
}

export const readReleaseCourses = async (tx: Tx, release: number): Promise<CourseFact[]> =>
  (await tx.query('select nli, level_group as "levelGroup", ais from release_courses where release_number = $1 and course_no = 1', [
    release,
  ])) as CourseFact[];

export const readSiteCourses = async (tx: Tx, siteId: string): Promise<CourseFact[]> =>
  (await tx.query('select nli, level_group as "levelGroup", ais from course_facts where site_id = $1 and course_no = 1', [
    siteId,
  ])) as CourseFact[];

/** Outcomes with enough people in the release for anything to be shown. */
export async function listMeasured(tx: Tx, release: number, least: number): Promise<{ measure: string; inDevice: 'yes' | 'no' }[]> {
  return (await tx.query(
    `select measure, in_device as "inDevice" from release_outcomes where release_number = $1 and course_no = 1 and baseline_value is not null and end_value is not null
      group by measure, in_device having count(*) >= $2 order by measure, in_device`,
    [release, least],
  )) as { measure: string; inDevice: 'yes' | 'no' }[];
}
