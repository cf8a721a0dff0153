import {
  bout,
  completeExam,
  consent,
  exam,
  month,
  normalExam,
  participant,
  result,
  sensoryIncompleteExam,
  session,
  unable,
} from '../../test-support/a-month.ts';
import type { Row } from '@cairnstep/dictionary';
import { registry } from '../../test-support/findings-of.ts';
import { testRules } from '../../test-support/rule-cases.ts';

const assessed = (...assessments: Row[]) => month({ assessments });
const registryRule = 'rule of this registry';
const wisci = 'definition of the WISCI II levels, from memory';
const isncsci = 'ISNCSCI, 2019 revision';

const scim = (total: number) =>
  assessed(
    result('scim3_self_care', 10),
    result('scim3_resp_sphincter', 20),
    result('scim3_mobility_room', 5),
    result('scim3_mobility_in_out', 15),
    result('scim3_total', total),
  );

/** The example exam grades five leg muscles 2 on both sides, arms 5: LEMS 20, UEMS 50. */
const withExam = (...assessments: Row[]) => month({ exams: [exam()], assessments });

const bare = { aid: 'none', brace: 'no', assist_persons: 0 };

testRules([
  {
    rule: 'C01',
    source: 'structure of the instrument: the total is the sum of four parts',
    breaks: [{ when: 'a total one point off', rows: scim(51), at: ['assessments 6 value'] }],
    holds: [
      { when: 'a total that is the sum', rows: scim(50) },
      { when: 'a total without all its parts', rows: assessed(result('scim3_self_care', 10), result('scim3_total', 50)) },
      {
        when: 'parts of another day',
        rows: assessed(
          ...scim(50)
            .assessments!.slice(0, 4)
            .map((part) => ({ ...part, assessment_day: 40 })),
          result('scim3_total', 51),
        ),
      },
    ],
  },
  {
    rule: 'C02',
    source: isncsci,
    breaks: [
      { when: 'a leg score that is not the sum of the exam', rows: withExam(result('lems', 21)), at: ['assessments 2 value'] },
      { when: 'an arm score that is not the sum of the exam', rows: withExam(result('uems', 49)), at: ['assessments 2 value'] },
      {
        when: 'a score that differs from an exam the registry holds',
        rows: assessed(result('lems', 21)),
        registry: registry({ exams: [exam()] }),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'scores that are the sums', rows: withExam(result('lems', 20), result('uems', 50)) },
      { when: 'another score more than 7 days from the exam', rows: withExam(result('lems', 21, { assessment_day: 1 })) },
      {
        when: 'any score when a key muscle was not testable',
        rows: month({ exams: [exam({ m_r_l2: 'NT', nt_reason: 'pain' })], assessments: [result('lems', 21)] }),
      },
    ],
  },
  {
    rule: 'C03',
    source: 'physiology',
    breaks: [
      {
        when: 'a diastolic pressure equal to the systolic',
        rows: assessed(result('sbp', 90), result('dbp', 90)),
        at: ['assessments 3 value'],
      },
    ],
    holds: [
      { when: 'a lower diastolic pressure', rows: assessed(result('sbp', 90), result('dbp', 89)) },
      { when: 'readings of two postures', rows: assessed(result('sbp', 90, { posture: 'standing' }), result('dbp', 95)) },
    ],
  },
  {
    rule: 'C04',
    source: 'Baunsgaard CB et al. Spinal Cord 2016;54:702-8',
    breaks: [
      {
        when: 'a severity where there are no spasms',
        rows: assessed(result('psfs_freq', 0), result('psfs_severity', 1)),
        at: ['assessments 3 value'],
      },
      { when: 'spasms without a severity', rows: assessed(result('psfs_freq', 1)), at: ['assessments 2 value'] },
    ],
    holds: [
      { when: 'no spasms and no severity', rows: assessed(result('psfs_freq', 0)) },
      { when: 'spasms with a severity', rows: assessed(result('psfs_freq', 1), result('psfs_severity', 3)) },
    ],
  },
  {
    rule: 'C05',
    source: wisci,
    breaks: [
      {
        when: 'tests done at level 0',
        rows: assessed(result('wisci2', 0), result('six_mwt', 20), result('tug', 60)),
        at: ['assessments 3 attempt_status', 'assessments 4 attempt_status'],
      },
      {
        when: '10 metres done at level 1',
        rows: assessed(result('wisci2', 1), result('tmwt_ss', 0.1)),
        at: ['assessments 3 attempt_status'],
      },
    ],
    holds: [
      {
        when: 'a test marked unable at level 0',
        rows: assessed(result('wisci2', 0), unable('tmwt_ss'), unable('tug', { attempt_status: 'not_attempted' })),
      },
      { when: 'a six-minute walk at level 1', rows: assessed(result('wisci2', 1), result('six_mwt', 8)) },
      { when: 'a walk in the device at level 0', rows: assessed(result('wisci2', 0), result('tmwt_ss', 0.3, { in_device: 'yes' })) },
      { when: '10 metres at level 2', rows: assessed(result('wisci2', 2), result('tmwt_ss', 0.1)) },
    ],
  },
  {
    rule: 'C06',
    source: registryRule,
    breaks: [
      {
        when: 'a speed 0.006 above distance by time',
        rows: assessed(result('tmwt_ss', 0.506, { time_s: 20 })),
        at: ['assessments 2 value'],
      },
      {
        when: 'a speed 0.006 below distance by time',
        rows: assessed(result('tmwt_fast', 0.494, { time_s: 20 })),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'a speed 0.005 off', rows: assessed(result('tmwt_ss', 0.505, { time_s: 20 })) },
      { when: '6 metres in 12 s as 0.5 m/s', rows: assessed(result('tmwt_ss', 0.5, { timed_distance_m: 6, time_s: 12 })) },
    ],
  },
  {
    rule: 'C07',
    source: registryRule,
    breaks: [
      {
        when: 'six minutes faster than 1.1 times the fast speed and 0.05',
        rows: assessed(result('six_mwt', 217), result('tmwt_fast', 0.5)),
        at: ['assessments 2 value'],
      },
      {
        when: 'six minutes slower than half the self-selected speed',
        rows: assessed(result('six_mwt', 89), result('tmwt_ss', 0.5)),
        at: ['assessments 2 value'],
      },
      {
        when: 'six minutes faster than 1.3 times the self-selected speed',
        rows: assessed(result('six_mwt', 235), result('tmwt_ss', 0.5)),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      {
        when: 'six minutes just within 1.1 times the fast speed and 0.05',
        rows: assessed(result('six_mwt', 215), result('tmwt_fast', 0.5)),
      },
      { when: 'six minutes at half the self-selected speed', rows: assessed(result('six_mwt', 90), result('tmwt_ss', 0.5)) },
      { when: 'tests with different aids', rows: assessed(result('six_mwt', 300), result('tmwt_fast', 0.5, { aid: 'stick' })) },
      {
        when: 'a test in the device beside one without',
        rows: assessed(result('six_mwt', 300, { in_device: 'yes' }), result('tmwt_fast', 0.5)),
      },
      {
        when: 'a walk that stopped after three minutes, by its own seconds',
        rows: assessed(result('six_mwt', 90, { attempt_status: 'stopped_early', seconds_walked: 180 }), result('tmwt_ss', 0.5)),
      },
    ],
  },
  {
    rule: 'C08',
    source: registryRule,
    breaks: [
      {
        when: 'a fast speed 0.04 below the self-selected',
        rows: assessed(result('tmwt_ss', 0.5), result('tmwt_fast', 0.46)),
        at: ['assessments 3 value'],
      },
    ],
    holds: [
      { when: 'a fast speed 0.03 below the self-selected', rows: assessed(result('tmwt_ss', 0.5), result('tmwt_fast', 0.47)) },
      { when: 'different aids', rows: assessed(result('tmwt_ss', 0.5), result('tmwt_fast', 0.3, { aid: 'stick' })) },
      {
        when: 'a slower second trial',
        rows: assessed(result('tmwt_ss', 0.5), result('tmwt_fast', 0.6), result('tmwt_fast', 0.4, { trial_no: 2 })),
      },
    ],
  },
  {
    rule: 'C09',
    source: registryRule,
    breaks: [
      {
        when: 'a time under 0.9 times 6 m at the fast speed',
        rows: assessed(result('tug', 10.7), result('tmwt_fast', 0.5)),
        at: ['assessments 2 value'],
      },
      {
        when: 'a time over 6 times 6 m at the self-selected speed and 20 s',
        rows: assessed(result('tug', 92.1), result('tmwt_ss', 0.5)),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'a time of 0.9 times 6 m at the fast speed', rows: assessed(result('tug', 10.8), result('tmwt_fast', 0.5)) },
      { when: 'a time of 6 times 6 m at the self-selected speed and 20 s', rows: assessed(result('tug', 92), result('tmwt_ss', 0.5)) },
    ],
  },
  {
    rule: 'C10',
    source: wisci,
    breaks: [
      { when: 'an aid at level 20', rows: assessed(result('wisci2', 20), result('tmwt_ss', 0.5)), at: ['assessments 3 aid'] },
      {
        when: 'a helper at level 20',
        rows: assessed(result('wisci2', 20), result('tug', 20, { ...bare, assist_persons: 1 })),
        at: ['assessments 3 aid'],
      },
      {
        when: 'nothing and nobody at level 13',
        rows: assessed(result('wisci2', 13), result('six_mwt', 180, bare)),
        at: ['assessments 3 aid'],
      },
    ],
    holds: [
      { when: 'nothing and nobody at level 20', rows: assessed(result('wisci2', 20), result('tmwt_ss', 0.9, bare)) },
      { when: 'a brace at level 18', rows: assessed(result('wisci2', 18), result('tmwt_ss', 0.9, { ...bare, brace: 'yes' })) },
      {
        when: 'a test at one of two levels of the day',
        rows: assessed(result('wisci2', 13), result('wisci2', 20, { trial_no: 2, level_basis: 'maximum' }), result('tmwt_ss', 0.9, bare)),
      },
    ],
  },
  {
    rule: 'C11',
    source: registryRule,
    breaks: [
      {
        when: 'balance 50 of a person unable to walk 10 metres',
        rows: assessed(result('bbs', 50), unable('tmwt_ss')),
        at: ['assessments 2 value'],
      },
      {
        when: 'balance 5 of a person walking 0.81 m/s',
        rows: assessed(result('bbs', 5), result('tmwt_ss', 0.81)),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'balance 49 of a person unable to walk', rows: assessed(result('bbs', 49), unable('tmwt_ss')) },
      { when: 'balance 5 of a person walking 0.8 m/s', rows: assessed(result('bbs', 5), result('tmwt_ss', 0.8)) },
      { when: 'balance 6 of a person walking 0.9 m/s', rows: assessed(result('bbs', 6), result('tmwt_ss', 0.9)) },
    ],
  },
  {
    rule: 'C12',
    source: registryRule,
    breaks: [
      {
        when: 'mobility 20 at walking level 0',
        rows: assessed(result('scim3_mobility_in_out', 20), result('wisci2', 0)),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'mobility 19 at walking level 0', rows: assessed(result('scim3_mobility_in_out', 19), result('wisci2', 0)) },
      { when: 'mobility 20 at walking level 1', rows: assessed(result('scim3_mobility_in_out', 20), result('wisci2', 1)) },
    ],
  },
  {
    rule: 'C15',
    source: registryRule,
    breaks: [
      {
        when: 'a walk with grade A',
        rows: month({ exams: [completeExam()], assessments: [result('tmwt_ss', 0.5)] }),
        at: ['assessments 2 in_device'],
      },
      {
        when: 'a walk with grade B in an exam the registry holds',
        rows: assessed(result('tmwt_fast', 0.5)),
        registry: registry({ exams: [sensoryIncompleteExam()] }),
        at: ['assessments 2 in_device'],
      },
    ],
    holds: [
      { when: 'a walk with grade C', rows: withExam(result('tmwt_ss', 0.5)) },
      {
        when: 'a walk in the device with grade A',
        rows: month({ exams: [completeExam()], assessments: [result('tmwt_ss', 0.5, { in_device: 'yes' })] }),
      },
      {
        when: 'a walk after a newer exam with grade C',
        rows: month({ exams: [completeExam({ exam_day: -30 }), exam()], assessments: [result('tmwt_ss', 0.5)] }),
      },
    ],
  },
  {
    rule: 'C17',
    source: registryRule,
    breaks: [
      {
        when: '0.81 m/s more within 90 days',
        rows: assessed(
          result('tmwt_ss', 0.2, { assessment_day: 0 }),
          result('tmwt_ss', 1.01, { assessment_day: 90, timepoint: 'interim' }),
        ),
        at: ['assessments 3 value'],
      },
      {
        when: '13 levels less, by steps of less than 12',
        rows: assessed(
          result('wisci2', 16, { assessment_day: 0 }),
          result('wisci2', 9, { assessment_day: 30, timepoint: 'interim' }),
          result('wisci2', 3, { assessment_day: 60, timepoint: 'interim' }),
        ),
        at: ['assessments 4 value'],
      },
      {
        when: '251 m against a result the registry holds',
        rows: assessed(result('six_mwt', 351, { assessment_day: 30 })),
        registry: registry({ assessments: [result('six_mwt', 100, { assessment_day: 0 })] }),
        at: ['assessments 2 value'],
      },
      {
        when: '21 leg points, told at the row of the file when the later one is held',
        rows: assessed(result('lems', 10, { assessment_day: 0 })),
        registry: registry({ assessments: [result('lems', 31, { assessment_day: 30 })] }),
        at: ['assessments 2 value'],
      },
      {
        when: '46 points of the SCIM total',
        rows: assessed(
          result('scim3_total', 20, { assessment_day: 0 }),
          result('scim3_total', 66, { assessment_day: 30, timepoint: 'interim' }),
        ),
        at: ['assessments 3 value'],
      },
    ],
    holds: [
      {
        when: '0.8 m/s more within 90 days',
        rows: assessed(result('tmwt_ss', 0.2, { assessment_day: 0 }), result('tmwt_ss', 1, { assessment_day: 90 })),
      },
      {
        when: '1 m/s more after 91 days',
        rows: assessed(result('tmwt_ss', 0.2, { assessment_day: 0 }), result('tmwt_ss', 1.2, { assessment_day: 91 })),
      },
      {
        when: 'a large difference between device worn and not',
        rows: assessed(result('tmwt_ss', 0.2, { assessment_day: 0 }), result('tmwt_ss', 1.2, { assessment_day: 30, in_device: 'yes' })),
      },
      {
        when: 'a held result that the file corrects',
        rows: assessed(result('lems', 10, { assessment_day: 0 }), result('lems', 12, { assessment_day: 30 })),
        registry: registry({ assessments: [result('lems', 45, { assessment_day: 30 })] }),
      },
    ],
  },
  {
    rule: 'C18',
    source: 'order of a course of training',
    breaks: [
      {
        when: 'an assessment before the injury',
        rows: assessed(result('wisci2', 3, { assessment_day: -211 })),
        at: ['assessments 2 assessment_day'],
      },
      {
        when: 'a baseline after the first session',
        rows: month({ sessions: [session()], bouts: [bout()], assessments: [result('wisci2', 3, { assessment_day: 1 })] }),
        at: ['assessments 2 timepoint'],
      },
      {
        when: 'an end of course before the first session, which the registry holds',
        rows: assessed(result('wisci2', 3, { assessment_day: 4, timepoint: 'end_of_course' })),
        registry: registry({ sessions: [session({ session_day: 5 })] }),
        at: ['assessments 2 timepoint'],
      },
    ],
    holds: [
      { when: 'an assessment on the day of the injury', rows: assessed(result('wisci2', 3, { assessment_day: -210 })) },
      {
        when: 'a baseline on the day of the first session',
        rows: month({ sessions: [session()], bouts: [bout()], assessments: [result('wisci2', 3, { assessment_day: 0 })] }),
      },
      {
        when: 'the baseline of a second course',
        rows: month({ sessions: [session()], bouts: [bout()], assessments: [result('wisci2', 3, { assessment_day: 100, course_no: 2 })] }),
      },
      {
        when: 'an unknown day of injury',
        rows: {
          participants: [participant({ days_injury_to_index: undefined })],
          consents: [consent()],
          assessments: [result('wisci2', 3, { assessment_day: -400 })],
        },
      },
    ],
  },
]);

testRules([
  {
    rule: 'C13',
    source: isncsci,
    breaks: [
      { when: 'grade E with a leg muscle at 4', rows: month({ exams: [normalExam({ m_r_l2: '4' })] }), at: ['exams 2 recorded_ais'] },
      { when: 'grade E with a dermatome at 1', rows: month({ exams: [normalExam({ pp_l_t5: '1' })] }), at: ['exams 2 recorded_ais'] },
    ],
    holds: [
      { when: 'grade E with full scores', rows: month({ exams: [normalExam()] }) },
      {
        when: 'grade E with a lower score that another condition explains',
        rows: month({ exams: [normalExam({ m_r_c5: '4**', tag_cause: 'pain' })] }),
      },
    ],
  },
  {
    rule: 'C14',
    source: `${isncsci}: L2 lies four levels below T10`,
    breaks: [
      {
        when: 'grade B, motor level T10, and a leg muscle at 1',
        rows: month({ exams: [sensoryIncompleteExam({ m_l_s1: '1' })] }),
        at: ['exams 2 m_l_s1'],
      },
    ],
    holds: [
      { when: 'grade B without leg movement', rows: month({ exams: [sensoryIncompleteExam()] }) },
      {
        when: 'grade B, motor level T11, and L2 at 1',
        rows: month({
          exams: [sensoryIncompleteExam({ lt_l_t11: '2', pp_l_t11: '2', lt_r_t11: '2', pp_r_t11: '2', recorded_nli: 'T11', m_l_l2: '1' })],
        }),
      },
    ],
  },
]);
