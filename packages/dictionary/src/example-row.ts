/**
 * One invented row per table, for templates, documentation and tests. The seven belong together: one made-up person, the first training day,
 * its first session and bout. What is not chosen here and must be filled comes from the dictionary.
 */
import { tableOf } from './dictionary.ts';
import { isRequired } from './is-required.ts';
import { dermatomes, keyMuscles, segmentKey } from './neurological-levels.ts';
import type { Row, TableKey, Variable } from './types.ts';

/** Made up: no site's secret leads to this code. Its check character is right. */
export const exampleParticipant = 'S00000000000000000000Z';

const lastNormalDermatome = dermatomes.indexOf('T10');

/** Level T10 on both sides, incomplete, legs moving below grade 3: grade C. */
const exampleCells: Row = Object.fromEntries(
  ['r', 'l'].flatMap((side) => [
    ...['lt', 'pp'].flatMap((modality) =>
      dermatomes.map((dermatome, index) => [`${modality}_${side}_${segmentKey(dermatome)}`, index <= lastNormalDermatome ? '2' : '1']),
    ),
    ...keyMuscles.map(({ segment }) => [`m_${side}_${segmentKey(segment)}`, /^[CT]/.test(segment) ? '5' : '2']),
  ]),
);

const chosen: Readonly<Record<TableKey, Row>> = {
  participants: {
    age_at_index: 46,
    sex: 'female',
    injury_year: 2021,
    days_injury_to_index: 210,
    cause: 'transport',
    planned_sessions: 36,
    planned_sessions_per_week: 3,
  },
  consents: { consent_no: 1, signed_day: -14, form_version: 2, permission: 'HMB', duo_irb: 'yes' },
  exams: {
    exam_day: -7,
    ...exampleCells,
    vac: 'yes',
    dap: 'yes',
    earlier_deficit: 'yes',
    recorded_ais: 'C',
    recorded_nli: 'T10',
    non_sci_affects: 'none',
  },
  assessments: {
    assessment_day: -5,
    measure: 'tmwt_ss',
    trial_no: 1,
    timepoint: 'baseline',
    attempt_status: 'done',
    value: 0.5,
    aid: 'walker',
    timed_distance_m: 10,
    time_s: 20,
    start_type: 'static',
  },
  sessions: {
    session_day: 0,
    session_no: 1,
    start_hour: 9,
    status: 'completed',
    device_class: 'treadmill_driven_orthosis',
    planned_min: 45,
    don_min: 8,
    doff_min: 5,
    upright_min: 20,
    rest_min: 10,
    steps_total: 600,
    distance_total_m: 300,
    body_mass_kg: 70,
    staff_count: 2,
    assist_level: 3,
    hr_rest: 72,
    hr_peak: 112,
    sbp_pre: 112,
    dbp_pre: 70,
    sbp_post: 118,
    dbp_post: 72,
    bp_pre_posture: 'sitting',
    rpe: 4,
    rpe_scale: 'cr10',
    pain_pre: 1,
    pain_post: 1,
    spasticity_change: 'less',
    skin_check_pre: 'intact',
    skin_check_post: 'intact',
  },
  bouts: {
    session_day: 0,
    session_no: 1,
    bout_no: 1,
    activity: 'walking',
    device_class: 'treadmill_driven_orthosis',
    surface: 'treadmill',
    duration_s: 600,
    distance_m: 300,
    steps: 600,
    treadmill_speed_mps: 0.5,
    bws_kg: 28,
    bws_pct: 40,
    guidance_pct: 80,
    hip_r_control: 'programmed',
    hip_l_control: 'programmed',
    knee_r_control: 'programmed',
    knee_l_control: 'programmed',
    hr_end: 110,
    rpe_end: 4,
    rpe_scale: 'cr10',
    stop_reason: 'planned',
    rest_after_s: 120,
  },
  adverse_events: {
    event_no: 1,
    event_day: 0,
    session_day: 0,
    session_no: 1,
    onset: 'after',
    onset_min: 30,
    kind: 'musculoskeletal',
    severity: '1',
    attribution: 'possible',
    attributed_to: 'training_load',
    expected: 'yes',
    outcome: 'resolved',
    resolved_day: 2,
    body_site: 'shoulder',
  },
};

function defaultValue({ type, codes, plausible }: Variable): string | number | undefined {
  switch (type) {
    case 'pseudonym':
      return exampleParticipant;
    case 'flag':
      return 'no';
    case 'code':
      return codes?.[0]?.code;
    case 'integer':
    case 'decimal':
      return plausible?.min;
  }
}

/** An invented, valid row of the table, columns in the dictionary's order. */
export function exampleRow(table: TableKey): Row {
  const values = chosen[table];
  const filled = tableOf(table).variables.flatMap((variable): [string, string | number | undefined][] => {
    if (variable.key in values) return [[variable.key, values[variable.key]]];
    return isRequired(variable, values) ? [[variable.key, defaultValue(variable)]] : [];
  });
  return Object.fromEntries(filled);
}
