/**
 * Which columns and measures each rule compares, so that a variable's page can name the rules about it. Columns that only
 * bring rows together (participant, day and number of a session) count where the rule judges them.
 */
import { dermatomes, keyMuscles, segmentKey } from './neurological-levels.ts';
import { rules } from './rules.ts';
import type { Rule, TableKey } from './types.ts';
import { tableKeys } from './types.ts';

type ColumnsByTable = Readonly<Partial<Record<TableKey, readonly string[]>>>;

/** What a rule compares. */
export interface RuleSubject {
  readonly columns: ColumnsByTable;
  /** Measures whose results it compares; the results themselves stand in `assessments.value`. */
  readonly measures?: readonly string[];
}

const sides = ['r', 'l'] as const;
const bySide = (column: (side: 'r' | 'l') => readonly string[]): readonly string[] => sides.flatMap(column);

const muscleCells = (segments: readonly string[]) => bySide((side) => segments.map((segment) => `m_${side}_${segmentKey(segment)}`));
const sensoryCells = (segments: readonly string[]) =>
  ['lt', 'pp'].flatMap((modality) => bySide((side) => segments.map((segment) => `${modality}_${side}_${segmentKey(segment)}`)));

const allMuscles = muscleCells(keyMuscles.map(({ segment }) => segment));
const scores = [...sensoryCells(dermatomes), ...allMuscles];
/** All that the computed levels depend on. */
const levelCells = [...scores, 'vac'];
/** All that the computed grade depends on. */
const gradeCells = [...scores, 'vac', 'dap', 'non_key_r', 'non_key_l', 'earlier_deficit'];

const controls = (joints: readonly string[]) => joints.flatMap((joint) => bySide((side) => [`${joint}_${side}_control`]));
const everyJoint = controls(['hip', 'knee', 'ankle']);

const result = ['measure', 'value'];
const timedTests = ['tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug'];
const tenMetres = ['tmwt_ss', 'tmwt_fast'];

const subjects: Readonly<Record<string, RuleSubject>> = {
  C01: {
    columns: { assessments: result },
    measures: ['scim3_total', 'scim3_self_care', 'scim3_resp_sphincter', 'scim3_mobility_room', 'scim3_mobility_in_out'],
  },
  C02: {
    columns: { assessments: [...result, 'assessment_day'], exams: ['exam_day', ...allMuscles] },
    measures: ['uems', 'lems'],
  },
  C03: { columns: { assessments: [...result, 'posture'] }, measures: ['sbp', 'dbp'] },
  C04: { columns: { assessments: result }, measures: ['psfs_freq', 'psfs_severity'] },
  C05: { columns: { assessments: [...result, 'in_device', 'attempt_status'] }, measures: ['wisci2', ...timedTests] },
  C06: { columns: { assessments: [...result, 'timed_distance_m', 'time_s'] }, measures: tenMetres },
  C07: { columns: { assessments: [...result, 'aid', 'in_device', 'seconds_walked'] }, measures: ['six_mwt', ...tenMetres] },
  C08: { columns: { assessments: [...result, 'aid', 'in_device'] }, measures: tenMetres },
  C09: { columns: { assessments: [...result, 'aid', 'in_device'] }, measures: ['tug', ...tenMetres] },
  C10: {
    columns: { assessments: [...result, 'attempt_status', 'in_device', 'aid', 'brace', 'assist_persons'] },
    measures: ['wisci2', ...timedTests],
  },
  C11: { columns: { assessments: [...result, 'attempt_status', 'in_device'] }, measures: ['bbs', ...tenMetres] },
  C12: { columns: { assessments: result }, measures: ['scim3_mobility_in_out', 'wisci2'] },
  C13: { columns: { exams: ['recorded_ais', ...scores] } },
  C14: { columns: { exams: ['recorded_ais', ...levelCells] } },
  C15: { columns: { assessments: ['measure', 'attempt_status', 'in_device'], exams: gradeCells }, measures: tenMetres },
  C16: { columns: { assessments: ['value', 'in_device'] } },
  C17: {
    columns: { assessments: [...result, 'assessment_day', 'in_device', 'level_basis'] },
    measures: [...tenMetres, 'six_mwt', 'lems', 'scim3_total', 'wisci2'],
  },
  C18: {
    columns: {
      assessments: ['assessment_day', 'timepoint', 'course_no'],
      participants: ['days_injury_to_index'],
      sessions: ['session_day', 'course_no', 'status'],
    },
  },

  E01: { columns: { exams: ['tag_cause', ...scores] } },
  E02: { columns: { exams: ['nt_reason', ...scores, 'vac', 'dap'] } },
  E03: { columns: { exams: ['non_key_r', 'non_key_l', ...levelCells] } },
  E04: { columns: { exams: ['vac', 'dap', ...scores] } },
  E05: { columns: { exams: sensoryCells(['S3', 'S4-5']) } },
  E06: { columns: { exams: ['exam_day'], participants: ['age_at_index'] } },
  E07: { columns: { exams: ['exam_day'], participants: ['days_injury_to_index'] } },
  E08: { columns: { exams: ['exam_day'], participants: ['days_injury_to_index'] } },
  E09: { columns: { exams: ['recorded_ais', 'recorded_nli', ...gradeCells] } },

  T01: { columns: { bouts: ['distance_m', 'duration_s'] } },
  T02: { columns: { bouts: ['treadmill_speed_mps', 'distance_m', 'duration_s'] } },
  T03: { columns: { bouts: ['distance_m', 'duration_s', 'steps', 'surface'] } },
  T04: { columns: { bouts: ['distance_m', 'steps'] } },
  T05: { columns: { bouts: ['steps', 'duration_s'] } },
  T06: { columns: { bouts: ['bws_kg', 'bws_pct'], sessions: ['body_mass_kg'] } },
  T07: { columns: { bouts: ['device_class', 'surface'] } },
  T08: { columns: { bouts: ['device_class', 'stim_on', ...everyJoint] } },
  T09: { columns: { bouts: ['stop_reason', ...everyJoint] } },
  T10: {
    columns: {
      sessions: ['upright_min', 'rest_min', 'planned_min', 'status'],
      bouts: ['activity', 'duration_s', 'rest_after_s', 'bout_no'],
    },
  },
  T11: { columns: { sessions: ['upright_min'], bouts: ['activity', 'duration_s'] } },
  T12: { columns: { sessions: ['sbp', 'dbp'].flatMap((kind) => ['pre', 'min', 'max', 'post'].map((moment) => `${kind}_${moment}`)) } },
  T13: { columns: { sessions: ['sbp_pre', 'sbp_max', 'sbp_post', 'dysreflexia_decision'], exams: levelCells } },
  T14: {
    columns: {
      sessions: ['sbp_pre', 'sbp_min', 'dbp_pre', 'dbp_min', 'bp_min_posture', 'bp_min_minute', 'hypotension_decision'],
    },
  },
  T15: { columns: { sessions: ['skin_check_pre', 'skin_check_post'], adverse_events: ['kind', 'event_day', 'session_day', 'session_no'] } },
  T16: { columns: { sessions: ['session_day', 'start_hour', 'course_no', 'status'] } },
  T17: {
    columns: {
      bouts: ['session_day', ...controls(['hip', 'knee'])],
      exams: ['exam_day', ...muscleCells(['L2', 'L3', 'L4'])],
    },
  },
  T18: {
    columns: {
      sessions: ['hr_rest', 'hr_peak', 'rpe', 'rpe_scale', 'course_no', 'status'],
      bouts: ['activity', 'duration_s'],
    },
  },

  A01: { columns: { adverse_events: ['serious', 'severity', 'kind'] } },
  A02: { columns: { adverse_events: ['severity', 'outcome'] } },
  A03: { columns: { adverse_events: ['kind', 'sbp_rise'] } },
  A04: { columns: { adverse_events: ['kind', 'sbp_drop', 'dbp_drop', 'start_posture'] } },
  A05: { columns: { sessions: ['skin_check_post'], adverse_events: ['kind', 'event_day', 'session_day', 'session_no'] } },
  A06: { columns: { adverse_events: ['kind', 'pain_rise', 'pain_over_24h'] } },
  A07: { columns: { adverse_events: ['event_day', 'resolved_day'] } },
  A08: {
    columns: {
      sessions: ['dysreflexia_decision', 'hypotension_decision'],
      adverse_events: ['kind', 'event_day', 'session_day', 'session_no'],
    },
  },

  R01: { columns: Object.fromEntries(tableKeys.map((table) => [table, ['participant']])) },
  R02: { columns: { bouts: ['session_day', 'session_no'], sessions: ['session_day', 'session_no', 'status'] } },
  R03: { columns: { adverse_events: ['session_day', 'session_no'], sessions: ['session_day', 'session_no'] } },
  R04: { columns: { sessions: ['session_no', 'course_no', 'session_day'] } },
  R05: { columns: { participants: ['age_at_index', 'days_injury_to_index'] } },
};

/** What a rule compares. Throws a RangeError when no rule has this id. */
export function subjectOf(id: string): RuleSubject {
  const found = subjects[id];
  if (!found) throw new RangeError('no rule has this id');
  return found;
}

/** The rules that compare a column, in the order of the rules. */
export function rulesAbout(table: TableKey, column: string): readonly Rule[] {
  return rules.filter(({ id }) => subjectOf(id).columns[table]?.includes(column));
}

/** The rules that compare results of a measure, in the order of the rules. */
export function rulesAboutMeasure(measure: string): readonly Rule[] {
  return rules.filter(({ id }) => subjectOf(id).measures?.includes(measure));
}
