import type { Row } from '@cairnstep/dictionary';
import {
  completeExam,
  consent,
  exam,
  examCells,
  month,
  normalExam,
  participant,
  sensoryIncompleteExam,
} from '../../test-support/a-month.ts';
import { registry } from '../../test-support/findings-of.ts';
import { testRules } from '../../test-support/rule-cases.ts';

const examined = (...exams: Row[]) => month({ exams });
const isncsci = 'ISNCSCI, 2019 revision';

/** T10 with legs at 0 but for a non-key muscle of the hip at L2, which lies four levels below T10. */
const motorByNonKey = sensoryIncompleteExam({ non_key_r: 'L2', recorded_ais: 'C' });

testRules([
  {
    rule: 'E01',
    source: isncsci,
    breaks: [
      { when: 'one star without its cause', rows: examined(exam({ m_l_l3: '2*' })), at: ['exams 2 tag_cause'] },
      {
        when: 'a starred cell that was not testable',
        rows: examined(exam({ pp_r_s1: 'NT**', nt_reason: 'pain' })),
        at: ['exams 2 tag_cause'],
      },
    ],
    holds: [
      { when: 'stars with a cause', rows: examined(exam({ m_l_l3: '2*', tag_cause: 'peripheral_nerve' })) },
      { when: 'an exam without stars', rows: examined(exam()) },
    ],
  },
  {
    rule: 'E02',
    source: isncsci,
    breaks: [
      { when: 'a cell marked NT without a reason', rows: examined(exam({ lt_r_l1: 'NT' })), at: ['exams 2 nt_reason'] },
      { when: 'anal pressure not tested without a reason', rows: examined(exam({ dap: 'NT' })), at: ['exams 2 nt_reason'] },
    ],
    holds: [
      { when: 'a cell marked NT with a reason', rows: examined(exam({ lt_r_l1: 'NT', nt_reason: 'cast_or_dressing' })) },
      { when: 'an exam without NT', rows: examined(exam()) },
    ],
  },
  {
    rule: 'E03',
    source: isncsci,
    breaks: [
      {
        when: 'a non-key muscle three levels below the motor level',
        rows: examined(exam({ ...examCells({ below: '1', legs: '2', normalTo: 'T11' }), recorded_nli: 'T11', non_key_l: 'L2' })),
        at: ['exams 2 non_key_l'],
      },
      { when: 'a non-key muscle above the motor level', rows: examined(exam({ non_key_r: 'C8' })), at: ['exams 2 non_key_r'] },
    ],
    holds: [
      { when: 'a non-key muscle four levels below the motor level', rows: examined(motorByNonKey) },
      { when: 'no non-key muscle', rows: examined(exam()) },
    ],
  },
  {
    rule: 'E04',
    source: `${isncsci}; judgement of this registry`,
    breaks: [
      {
        when: 'everything normal but contraction',
        rows: examined(normalExam({ vac: 'no', recorded_ais: undefined, recorded_nli: undefined })),
        at: ['exams 2 vac'],
      },
      { when: 'everything normal but pressure', rows: examined(normalExam({ dap: 'no' })), at: ['exams 2 dap'] },
    ],
    holds: [
      { when: 'everything normal', rows: examined(normalExam()) },
      { when: 'no contraction in a complete injury', rows: examined(completeExam()) },
    ],
  },
  {
    rule: 'E05',
    source: `${isncsci}; judgement of this registry`,
    breaks: [
      { when: 'pin prick 2 at S4-5 and 0 at S3', rows: examined(exam({ pp_l_s4_5: '2', pp_l_s3: '0' })), at: ['exams 2 pp_l_s4_5'] },
    ],
    holds: [
      { when: '2 at S4-5 and 1 at S3', rows: examined(exam({ pp_l_s4_5: '2', pp_l_s3: '1' })) },
      { when: '1 at S4-5 and 0 at S3', rows: examined(exam({ pp_l_s4_5: '1', pp_l_s3: '0' })) },
      { when: '2 and 0 on different sides', rows: examined(exam({ pp_l_s4_5: '2', pp_r_s3: '0' })) },
    ],
  },
  {
    rule: 'E06',
    source: 'Mulcahey MJ et al. Arch Phys Med Rehabil 2011;92:1264-9',
    breaks: [
      {
        when: 'an exam of a child of 4',
        rows: { participants: [participant({ age_at_index: 4 })], consents: [consent()], exams: [exam()] },
        at: ['exams 2 exam_day'],
      },
    ],
    holds: [
      {
        when: 'an exam of a child of 6',
        rows: { participants: [participant({ age_at_index: 6 })], consents: [consent()], exams: [exam()] },
      },
      {
        when: 'an exam two years after the first training day at 5',
        rows: { participants: [participant({ age_at_index: 5 })], consents: [consent()], exams: [exam({ exam_day: 731 })] },
      },
    ],
  },
  {
    rule: 'E07',
    source: 'order of events',
    breaks: [
      { when: 'an exam a day before the injury', rows: examined(exam({ exam_day: -211 })), at: ['exams 2 exam_day'] },
      {
        when: 'an exam before the injury of a participant the registry holds',
        rows: { exams: [exam({ exam_day: -211 })] },
        registry: registry({ participants: [participant()], consents: [consent()] }),
        at: ['exams 2 exam_day'],
      },
    ],
    holds: [
      { when: 'an exam on the day of the injury', rows: examined(exam({ exam_day: -210 })) },
      {
        when: 'an unknown day of injury',
        rows: {
          participants: [participant({ days_injury_to_index: undefined })],
          consents: [consent()],
          exams: [exam({ exam_day: -300 })],
        },
      },
    ],
  },
  {
    rule: 'E08',
    source: 'Kirshblum S et al. J Neurotrauma 2021;38:1267-84, table 10',
    breaks: [
      { when: 'an exam on the day of the injury', rows: examined(exam({ exam_day: -210 })), at: ['exams 2 exam_day'] },
      { when: 'an exam on the day after', rows: examined(exam({ exam_day: -209 })), at: ['exams 2 exam_day'] },
    ],
    holds: [
      { when: 'an exam two days after', rows: examined(exam({ exam_day: -208 })) },
      { when: 'an exam before the injury, which is an error of its own', rows: examined(exam({ exam_day: -211 })) },
    ],
  },
  {
    rule: 'E09',
    source: isncsci,
    breaks: [
      { when: 'another grade than the cells give', rows: examined(exam({ recorded_ais: 'D' })), at: ['exams 2 recorded_ais'] },
      { when: 'another level than the cells give', rows: examined(exam({ recorded_nli: 'T9' })), at: ['exams 2 recorded_nli'] },
      { when: '"not determined" where the cells determine it', rows: examined(exam({ recorded_ais: 'ND' })), at: ['exams 2 recorded_ais'] },
      { when: 'grade E without an earlier deficit', rows: examined(normalExam({ earlier_deficit: 'no' })), at: ['exams 2 recorded_ais'] },
    ],
    holds: [
      {
        when: 'grade and level that the cells give',
        rows: examined(exam(), completeExam({ exam_day: -6 }), sensoryIncompleteExam({ exam_day: -5 }), normalExam({ exam_day: 300 })),
      },
      { when: 'nothing recorded', rows: examined(exam({ recorded_ais: undefined, recorded_nli: undefined })) },
      {
        when: 'a grade that is possible where a cell was not testable',
        rows: examined(
          completeExam({ dap: 'NT', nt_reason: 'pain', recorded_ais: 'A' }),
          completeExam({ exam_day: -6, dap: 'NT', nt_reason: 'pain', recorded_ais: 'B' }),
        ),
      },
      {
        when: '"not determined" where a cell was not testable',
        rows: examined(completeExam({ dap: 'NT', nt_reason: 'pain', recorded_ais: 'ND' })),
      },
    ],
  },
]);
