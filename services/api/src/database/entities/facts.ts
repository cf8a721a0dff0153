/** One row per participant and course, and per outcome of it: refreshed by the commit that touches them; copied, never changed, into releases. */
import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

abstract class Course {
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text' }) participant: string;
  @PrimaryColumn({ type: 'integer', name: 'course_no' }) courseNo: number;
  /** Study day of the first attended session of the course. */
  @Column({ type: 'integer', name: 'first_day', nullable: true }) firstDay: number | null;
  @Column({ type: 'integer', name: 'last_day', nullable: true }) lastDay: number | null;
  /** Baseline exam: study day, single level and grade, or ND when more than one is possible or none lies in the window. */
  @Column({ type: 'integer', name: 'exam_day', nullable: true }) examDay: number | null;
  @Column({ type: 'text' }) nli: string;
  @Column({ type: 'text', name: 'level_group' }) levelGroup: string;
  @Column({ type: 'text' }) ais: string;
  @Column({ type: 'integer', nullable: true }) age: number | null;
  @Column({ type: 'text', nullable: true }) sex: string | null;
  @Column({ type: 'text', nullable: true }) cause: string | null;
  @Column({ type: 'integer', name: 'days_since_injury', nullable: true }) daysSinceInjury: number | null;
  @Column({ type: 'integer' }) sessions: number;
  @Column({ type: 'integer' }) bouts: number;
  @Column({ type: 'double precision', name: 'walking_min' }) walkingMin: number;
  @Column({ type: 'double precision', name: 'distance_m' }) distanceM: number;
  @Column({ type: 'bigint' }) steps: string;
}

@Entity('course_facts')
export class CourseFactRow extends Course {}

abstract class OutcomeFact {
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text' }) participant: string;
  @PrimaryColumn({ type: 'integer', name: 'course_no' }) courseNo: number;
  @PrimaryColumn({ type: 'text' }) measure: string;
  @PrimaryColumn({ type: 'text', name: 'in_device' }) inDevice: 'yes' | 'no';
  @Column({ type: 'text', name: 'baseline_status', nullable: true }) baselineStatus: string | null;
  @Column({ type: 'double precision', name: 'baseline_value', nullable: true }) baselineValue: number | null;
  @Column({ type: 'integer', name: 'baseline_day', nullable: true }) baselineDay: number | null;
  @Column({ type: 'text', name: 'end_status', nullable: true }) endStatus: string | null;
  @Column({ type: 'double precision', name: 'end_value', nullable: true }) endValue: number | null;
  @Column({ type: 'integer', name: 'end_day', nullable: true }) endDay: number | null;
}

@Entity('outcome_facts')
export class OutcomeFactRow extends OutcomeFact {}

@Entity('releases')
export class ReleaseRow {
  @PrimaryColumn({ type: 'uuid' }) id: string;
  @Index('releases_number_key', { unique: true }) @Column({ type: 'integer' }) number: number;
  @Column({ type: 'timestamptz', name: 'made_at', default: () => 'now()' }) madeAt: Date;
  @Column({ type: 'uuid', name: 'made_by', nullable: true }) madeBy: string | null;
  @Column({ type: 'text' }) note: string;
  /** Counts of the release as a whole: participants, sites, sessions, bouts. */
  @Column({ type: 'jsonb' }) totals: object;
  /** SHA-256 over all rows of the release in key order. */
  @Column({ type: 'text' }) digest: string;
}

@Entity('release_courses')
export class ReleaseCourseRow extends Course {
  @PrimaryColumn({ type: 'integer', name: 'release_number' }) releaseNumber: number;
}

@Entity('release_outcomes')
@Index('release_outcomes_measure_idx', ['releaseNumber', 'measure', 'inDevice'])
export class ReleaseOutcomeRow extends OutcomeFact {
  @PrimaryColumn({ type: 'integer', name: 'release_number' }) releaseNumber: number;
}

/** Sessions of a release, already coarsened: four-week block and ordinal instead of the study day. */
@Entity('release_sessions')
export class ReleaseSessionRow {
  @PrimaryColumn({ type: 'integer', name: 'release_number' }) releaseNumber: number;
  @PrimaryColumn({ type: 'uuid', name: 'site_id' }) siteId: string;
  @PrimaryColumn({ type: 'text' }) participant: string;
  @PrimaryColumn({ type: 'integer', name: 'course_no' }) courseNo: number;
  @PrimaryColumn({ type: 'integer', name: 'session_ordinal' }) sessionOrdinal: number;
  @Column({ type: 'integer', name: 'four_week_block' }) fourWeekBlock: number;
  @Column({ type: 'text', nullable: true }) status: string | null;
  @Column({ type: 'text', name: 'device_class', nullable: true }) deviceClass: string | null;
  @Column({ type: 'integer' }) bouts: number;
  @Column({ type: 'double precision', name: 'walking_min' }) walkingMin: number;
  @Column({ type: 'double precision', name: 'distance_m' }) distanceM: number;
  @Column({ type: 'integer' }) steps: number;
}
