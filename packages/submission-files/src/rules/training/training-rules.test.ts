import type { Row } from '@cairnstep/dictionary';
import { bout, completeExam, event, exam, examCells, month, session } from '../../test-support/a-month.ts';
import { registry } from '../../test-support/findings-of.ts';
import { testRules } from '../../test-support/rule-cases.ts';

const registryRule = 'rule of this registry';
const controlModes = 'definition of the control modes';

/** One session and one bout, changed. The example's bout: 300 m and 600 steps in 600 s on a treadmill at 0.5 m/s. */
const walked = (changes: Row, ofSession: Row = {}) => month({ sessions: [session(ofSession)], bouts: [bout(changes)] });
const trained = (changes: Row) => walked({}, changes);

const overground = { device_class: 'conventional_overground', surface: 'overground_level', treadmill_speed_mps: undefined };
const signalDriven = { device_class: 'signal_driven_exoskeleton', knee_r_control: 'volitional' };

/** Sessions on these days, with what each changes. */
const sessionsOn = (days: readonly number[], changes: (index: number) => Row = () => ({})): Row[] =>
  days.map((session_day, index) => session({ session_day, session_no: index + 1, ...changes(index) }));

/** Three sessions with one bout each, by rating and minutes walked. */
function effort(...each: readonly (readonly [rpe: number, minutes: number])[]) {
  return month({
    sessions: sessionsOn([0, 2, 4].slice(0, each.length), (index) => ({ rpe: each[index]?.[0] })),
    bouts: each.map(([, minutes], index) =>
      bout({ session_day: index * 2, session_no: index + 1, duration_s: minutes * 60, distance_m: minutes * 30, steps: minutes * 60 }),
    ),
  });
}

const highCompleteExam = completeExam({ ...examCells({ below: '0', legs: '0', normalTo: 'T6' }), recorded_nli: 'T6' });

testRules([
  {
    rule: 'T01',
    source: `${registryRule}; mean speed is distance by duration`,
    breaks: [{ when: 'a mean speed of 2.51 m/s', rows: walked({ distance_m: 251, duration_s: 100 }), at: ['bouts 2 distance_m'] }],
    holds: [
      { when: 'a mean speed of 2.5 m/s', rows: walked({ distance_m: 250, duration_s: 100 }) },
      { when: 'no distance', rows: walked({ distance_m: undefined }) },
    ],
  },
  {
    rule: 'T02',
    source: registryRule,
    breaks: [
      {
        when: 'a belt 0.06 faster at a low speed',
        rows: walked({ treadmill_speed_mps: 0.26, distance_m: 120 }),
        at: ['bouts 2 treadmill_speed_mps'],
      },
      {
        when: 'a belt slower by more than 10%',
        rows: walked({ treadmill_speed_mps: 1, distance_m: 661 }),
        at: ['bouts 2 treadmill_speed_mps'],
      },
    ],
    holds: [
      { when: 'a belt 0.05 faster at a low speed', rows: walked({ treadmill_speed_mps: 0.25, distance_m: 120 }) },
      { when: 'a belt slower by 10%', rows: walked({ treadmill_speed_mps: 1, distance_m: 660 }) },
    ],
  },
  {
    rule: 'T03',
    source: registryRule,
    breaks: [
      { when: 'a distance without a duration', rows: walked({ duration_s: undefined }), at: ['bouts 2 duration_s'] },
      { when: 'steps overground without distance', rows: walked({ ...overground, distance_m: 0 }), at: ['bouts 2 distance_m'] },
    ],
    holds: [
      { when: 'distance, steps and duration', rows: walked(overground) },
      { when: 'steps in place on a treadmill', rows: walked({ distance_m: 0 }) },
      { when: 'steps overground whose distance was not measured', rows: walked({ ...overground, distance_m: undefined }) },
    ],
  },
  {
    rule: 'T04',
    source: registryRule,
    breaks: [
      { when: 'steps of 0.14 m', rows: walked({ distance_m: 84, steps: 600 }), at: ['bouts 2 steps'] },
      { when: 'steps of 0.91 m', rows: walked({ distance_m: 546, steps: 600 }), at: ['bouts 2 steps'] },
    ],
    holds: [
      { when: 'steps of 0.15 m', rows: walked({ distance_m: 90, steps: 600 }) },
      { when: 'steps of 0.9 m', rows: walked({ distance_m: 540, steps: 600 }) },
      { when: 'no steps', rows: walked({ steps: 0 }) },
    ],
  },
  {
    rule: 'T05',
    source: registryRule,
    breaks: [
      { when: '7.9 steps in a minute', rows: walked({ steps: 79 }), at: ['bouts 2 steps'] },
      { when: '140.1 steps in a minute', rows: walked({ steps: 1_401 }), at: ['bouts 2 steps'] },
    ],
    holds: [
      { when: '8 steps in a minute', rows: walked({ steps: 80 }) },
      { when: '140 steps in a minute', rows: walked({ steps: 1_400 }) },
    ],
  },
  {
    rule: 'T06',
    source: registryRule,
    breaks: [
      { when: '28 kg of 70 as 41.1%', rows: walked({ bws_pct: 41.1 }), at: ['bouts 2 bws_pct'] },
      { when: '71 kg of 70', rows: walked({ bws_kg: 71, bws_pct: undefined }), at: ['bouts 2 bws_kg'] },
      {
        when: 'a percentage that does not fit the mass the registry holds',
        rows: month({ bouts: [bout({ bws_pct: 30 })] }),
        registry: registry({ sessions: [session()] }),
        at: ['bouts 2 bws_pct'],
      },
    ],
    holds: [
      { when: '28 kg of 70 as 41%', rows: walked({ bws_pct: 41 }) },
      { when: '70 kg of 70', rows: walked({ bws_kg: 70, bws_pct: 100 }) },
      { when: 'an unknown mass', rows: walked({ bws_pct: 60 }, { body_mass_kg: undefined }) },
    ],
  },
  {
    rule: 'T07',
    source: 'definition of the device classes',
    breaks: [
      {
        when: 'a treadmill orthosis on level ground',
        rows: walked({ surface: 'overground_level', treadmill_speed_mps: undefined }),
        at: ['bouts 2 surface'],
      },
      {
        when: 'an overground exoskeleton on a treadmill',
        rows: walked({ device_class: 'overground_powered_exoskeleton' }),
        at: ['bouts 2 surface'],
      },
    ],
    holds: [
      { when: 'a treadmill orthosis on a treadmill', rows: walked({}) },
      { when: 'a signal-driven exoskeleton on a treadmill', rows: walked(signalDriven) },
      { when: 'therapist-moved walking on level ground', rows: walked({ ...overground, device_class: 'manual_bwstt' }) },
      {
        when: 'isolated movement without a surface',
        rows: walked({
          activity: 'isolated_movement',
          surface: undefined,
          distance_m: undefined,
          steps: undefined,
          treadmill_speed_mps: undefined,
        }),
      },
    ],
  },
  {
    rule: 'T08',
    source: controlModes,
    breaks: [
      { when: 'volitional control in a driven orthosis', rows: walked({ knee_r_control: 'volitional' }), at: ['bouts 2 knee_r_control'] },
      {
        when: 'a stimulated ankle without stimulation',
        rows: walked({ ankle_l_control: 'stimulated', stim_on: 'no' }),
        at: ['bouts 2 ankle_l_control'],
      },
    ],
    holds: [
      { when: 'volitional control in a signal-driven exoskeleton', rows: walked(signalDriven) },
      { when: 'a stimulated ankle with stimulation on', rows: walked({ ankle_l_control: 'stimulated', stim_on: 'yes', stim_channels: 2 }) },
      { when: 'stimulated walking', rows: walked({ device_class: 'fes_walking', hip_l_control: 'stimulated' }) },
    ],
  },
  {
    rule: 'T09',
    source: controlModes,
    breaks: [
      { when: 'a fading signal with programmed joints', rows: walked({ stop_reason: 'signal_fading' }), at: ['bouts 2 stop_reason'] },
    ],
    holds: [
      { when: 'a fading signal with a volitional knee', rows: walked({ ...signalDriven, stop_reason: 'signal_fading' }) },
      {
        when: 'a fading signal that started the steps',
        rows: walked({ hip_l_control: 'volitional_threshold', stop_reason: 'signal_fading' }),
      },
    ],
  },
  {
    rule: 'T10',
    source: registryRule,
    breaks: [
      { when: 'bouts of 10 minutes in 9 upright', rows: trained({ upright_min: 9 }), at: ['sessions 2 upright_min'] },
      {
        when: 'bouts and the rest between them longer than upright and resting time',
        rows: month({
          sessions: [session({ upright_min: 20, rest_min: 1 })],
          bouts: [bout({ duration_s: 300, rest_after_s: 900 }), bout({ bout_no: 2, duration_s: 300, rest_after_s: 900 })],
        }),
        at: ['sessions 2 rest_min'],
      },
      {
        when: 'a shortened session upright for longer than was planned',
        rows: trained({ status: 'shortened', not_trained_reason: 'fatigue', planned_min: 15 }),
        at: ['sessions 2 upright_min'],
      },
    ],
    holds: [
      { when: 'bouts of 10 minutes in 10 upright', rows: trained({ upright_min: 10 }) },
      { when: 'a rounded minute', rows: trained({ upright_min: 9.5 }) },
      { when: 'a long rest after the last bout', rows: walked({ rest_after_s: 3_600 }) },
      {
        when: 'isolated movement longer than the time upright',
        rows: walked({
          activity: 'isolated_movement',
          surface: undefined,
          distance_m: undefined,
          steps: undefined,
          treadmill_speed_mps: undefined,
          duration_s: 1_800,
        }),
      },
    ],
  },
  {
    rule: 'T11',
    source: registryRule,
    breaks: [{ when: 'walking 6 s longer than upright', rows: trained({ upright_min: 9.9 }), at: ['sessions 2 upright_min'] }],
    holds: [
      { when: 'walking just as long as upright', rows: trained({ upright_min: 10 }) },
      { when: 'no time upright given', rows: trained({ upright_min: undefined }) },
    ],
  },
  {
    rule: 'T12',
    source: 'physiology',
    breaks: [
      { when: 'diastolic above systolic before training', rows: trained({ sbp_pre: 70, dbp_pre: 112 }), at: ['sessions 2 dbp_pre'] },
      { when: 'a highest reading below the one after training', rows: trained({ sbp_max: 117 }), at: ['sessions 2 sbp_max'] },
      { when: 'a lowest reading above the one after training', rows: trained({ dbp_min: 73 }), at: ['sessions 2 dbp_min'] },
    ],
    holds: [
      { when: 'readings in order', rows: trained({ sbp_min: 100, dbp_min: 60, sbp_max: 120, dbp_max: 80, bp_min_posture: 'sitting' }) },
      { when: 'extremes equal to the reading after training', rows: trained({ sbp_max: 118, dbp_min: 72 }) },
    ],
  },
  {
    rule: 'T13',
    source: 'Teasell RW 2000 as quoted in a rehabilitation evidence review',
    breaks: [
      {
        when: 'a rise of 20 at the highest reading without a decision',
        rows: trained({ sbp_max: 132 }),
        at: ['sessions 2 dysreflexia_decision'],
      },
      {
        when: 'a rise of 20 after training at level T6',
        rows: month({ exams: [highCompleteExam], sessions: [session({ sbp_post: 132 })], bouts: [bout()] }),
        at: ['sessions 2 dysreflexia_decision'],
      },
    ],
    holds: [
      { when: 'a rise of 19', rows: trained({ sbp_max: 131 }) },
      { when: 'a rise of 40 with a decision', rows: trained({ sbp_max: 152, dysreflexia_decision: 'absent' }) },
    ],
  },
  {
    rule: 'T14',
    source: 'Freeman R et al. consensus 2011, as quoted in Physiol Rep 2020;8:e14617',
    breaks: [
      {
        when: 'a systolic drop of 20 at minute 3 of standing',
        rows: trained({ sbp_min: 92, bp_min_posture: 'standing', bp_min_minute: 3 }),
        at: ['sessions 2 hypotension_decision'],
      },
      {
        when: 'a diastolic drop of 10 upright in the device, at an unknown minute',
        rows: trained({ sbp_min: 110, dbp_min: 60, bp_min_posture: 'in_device' }),
        at: ['sessions 2 hypotension_decision'],
      },
    ],
    holds: [
      { when: 'drops of 19 and 9', rows: trained({ sbp_min: 93, dbp_min: 61, bp_min_posture: 'standing', bp_min_minute: 1 }) },
      { when: 'a drop after 4 minutes', rows: trained({ sbp_min: 80, bp_min_posture: 'standing', bp_min_minute: 4 }) },
      { when: 'a drop while sitting', rows: trained({ sbp_min: 80, bp_min_posture: 'sitting', bp_min_minute: 1 }) },
      { when: 'a drop with a decision', rows: trained({ sbp_min: 80, bp_min_posture: 'standing', hypotension_decision: 'not_assessed' }) },
    ],
  },
  {
    rule: 'T15',
    source: registryRule,
    breaks: [
      {
        when: 'skin broken in training without an event',
        rows: trained({ skin_check_post: 'broken' }),
        at: ['sessions 2 skin_check_post'],
      },
      {
        when: 'skin broken with an event of another kind',
        rows: month({ sessions: [session({ skin_check_post: 'broken' })], bouts: [bout()], adverse_events: [event()] }),
        at: ['sessions 2 skin_check_post'],
      },
    ],
    holds: [
      {
        when: 'skin broken with its event',
        rows: month({
          sessions: [session({ skin_check_post: 'broken' })],
          bouts: [bout()],
          adverse_events: [event({ kind: 'skin_breakdown', skin_stage: '2', device_contact: 'yes', body_site: 'heel' })],
        }),
      },
      { when: 'skin that was broken before', rows: trained({ skin_check_pre: 'broken', skin_check_post: 'broken' }) },
    ],
  },
  {
    rule: 'T16',
    source: registryRule,
    breaks: [
      {
        when: 'an eighth session in 7 days',
        rows: month({ sessions: sessionsOn([0, 1, 2, 3, 4, 5, 6, 6], (index) => ({ start_hour: index === 7 ? 15 : 9 })) }),
        at: ['sessions 9 session_day'],
      },
      {
        when: 'sessions at 9 and at 12 of one day',
        rows: month({ sessions: sessionsOn([0, 0], (index) => ({ start_hour: 9 + index * 3 })) }),
        at: ['sessions 3 start_hour'],
      },
      {
        when: 'sessions at 22 and at 1 of the next day',
        rows: month({ sessions: sessionsOn([0, 1], (index) => ({ start_hour: index === 0 ? 22 : 1 })) }),
        at: ['sessions 3 start_hour'],
      },
      { when: '22 days without a session', rows: month({ sessions: sessionsOn([0, 22]) }), at: ['sessions 3 session_day'] },
      {
        when: '22 days since a session the registry holds',
        rows: month({ sessions: [session({ session_day: 22, session_no: 2 })] }),
        registry: registry({ sessions: [session()] }),
        at: ['sessions 2 session_day'],
      },
    ],
    holds: [
      { when: '7 sessions in 7 days', rows: month({ sessions: sessionsOn([0, 1, 2, 3, 4, 5, 6]) }) },
      { when: 'an eighth session on day 7', rows: month({ sessions: sessionsOn([0, 1, 2, 3, 4, 5, 6, 7]) }) },
      {
        when: 'sessions at 9 and at 13 of one day',
        rows: month({ sessions: sessionsOn([0, 0], (index) => ({ start_hour: 9 + index * 4 })) }),
      },
      { when: '21 days without a session', rows: month({ sessions: sessionsOn([0, 21]) }) },
      { when: 'a long time between two courses', rows: month({ sessions: sessionsOn([0, 90], (index) => ({ course_no: index + 1 })) }) },
      {
        when: 'a cancelled session beside one that took place',
        rows: month({ sessions: [session(), session({ session_no: 2, status: 'cancelled_before' })] }),
      },
    ],
  },
  {
    rule: 'T17',
    source: registryRule,
    breaks: [
      {
        when: 'a volitional knee of a leg without movement',
        rows: month({ exams: [completeExam()], sessions: [session()], bouts: [bout(signalDriven)] }),
        at: ['bouts 2 knee_r_control'],
      },
      {
        when: 'a volitional hip by an exam 30 days old that the registry holds',
        rows: walked({ ...signalDriven, knee_r_control: 'programmed', hip_l_control: 'volitional' }),
        registry: registry({ exams: [completeExam({ exam_day: -30 })] }),
        at: ['bouts 2 hip_l_control'],
      },
    ],
    holds: [
      {
        when: 'a leg that moves a little',
        rows: month({
          exams: [completeExam({ m_r_l3: '1', recorded_ais: undefined })],
          sessions: [session()],
          bouts: [bout(signalDriven)],
        }),
      },
      {
        when: 'an exam 31 days old',
        rows: month({ exams: [completeExam({ exam_day: -31 })], sessions: [session()], bouts: [bout(signalDriven)] }),
      },
      {
        when: 'a newer exam with movement',
        rows: month({ exams: [completeExam({ exam_day: -20 }), exam()], sessions: [session()], bouts: [bout(signalDriven)] }),
      },
      { when: 'programmed joints', rows: month({ exams: [completeExam()], sessions: [session()], bouts: [bout()] }) },
    ],
  },
  {
    rule: 'T18',
    source: registryRule,
    breaks: [
      { when: 'a highest heart rate below the resting one', rows: trained({ hr_peak: 71 }), at: ['sessions 2 hr_peak'] },
      {
        when: 'exertion rising over three sessions while walking falls by half',
        rows: effort([3, 16], [4, 12], [5, 8]),
        at: ['sessions 4 rpe'],
      },
    ],
    holds: [
      { when: 'a highest heart rate equal to the resting one', rows: trained({ hr_peak: 72 }) },
      { when: 'walking that falls by less than half', rows: effort([3, 16], [4, 12], [5, 9]) },
      { when: 'exertion that does not rise each time', rows: effort([3, 16], [3, 12], [5, 8]) },
      { when: 'two sessions only', rows: effort([3, 16], [5, 8]) },
    ],
  },
]);
