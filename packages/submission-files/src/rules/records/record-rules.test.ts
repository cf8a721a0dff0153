import type { Row } from '@cairnstep/dictionary';
import { bout, consent, event, exam, month, participant, result, session, someone, someoneElse } from '../../test-support/a-month.ts';
import { registry } from '../../test-support/findings-of.ts';
import { testRules } from '../../test-support/rule-cases.ts';
import { tableFromRows } from '../../table/table-from-rows.ts';

const structure = 'structure of the record';
const order = 'order of events';
const registryRule = 'rule of this registry';

const withdrawn = consent({ consent_no: 2, status: 'withdrawn', withdrawal_scope: 'no_further_use' });
const hasWithdrawn = { withdrawn: new Set([someone]) };

const numbered = (rows: number, make: (index: number) => Row): Row[] => Array.from({ length: rows }, (_, index) => make(index));

testRules([
  {
    rule: 'R01',
    source: structure,
    breaks: [
      {
        when: 'a consent, an assessment and an event of nobody known',
        rows: month({
          consents: [consent(), consent({ participant: someoneElse })],
          assessments: [result('wisci2', 3, { participant: someoneElse })],
        }),
        at: ['consents 3 participant', 'assessments 2 participant'],
      },
    ],
    holds: [
      { when: 'rows of a participant in the file', rows: month({ exams: [exam()] }) },
      {
        when: 'rows of a participant the registry holds',
        rows: { exams: [exam()] },
        registry: registry({ participants: [participant()], consents: [consent()] }),
      },
    ],
  },
  {
    rule: 'R02',
    source: structure,
    breaks: [
      { when: 'a bout without a session', rows: month({ bouts: [bout()] }), at: ['bouts 2 session_no'] },
      {
        when: 'a bout of another day',
        rows: month({ sessions: [session()], bouts: [bout(), bout({ session_day: 1 })] }),
        at: ['bouts 3 session_no'],
      },
      {
        when: 'a bout of a cancelled session',
        rows: month({ sessions: [session({ status: 'cancelled_before' })], bouts: [bout()] }),
        at: ['bouts 2 session_no'],
      },
    ],
    holds: [
      { when: 'a bout of a session in the file', rows: month({ sessions: [session()], bouts: [bout()] }) },
      { when: 'a bout of a session the registry holds', rows: month({ bouts: [bout()] }), registry: registry({ sessions: [session()] }) },
    ],
  },
  {
    rule: 'R03',
    source: structure,
    breaks: [
      { when: 'an event of a session nobody knows', rows: month({ adverse_events: [event()] }), at: ['adverse_events 2 session_no'] },
    ],
    holds: [
      { when: 'an event of a session in the file', rows: month({ sessions: [session()], adverse_events: [event()] }) },
      {
        when: 'an event outside any session',
        rows: month({ adverse_events: [event({ session_day: undefined, session_no: undefined, onset: 'outside', onset_min: undefined })] }),
      },
    ],
  },
  {
    rule: 'R04',
    source: structure,
    breaks: [
      {
        when: 'the same number on two days of a course',
        rows: month({ sessions: [session(), session({ session_day: 2 })] }),
        at: ['sessions 3 session_no'],
      },
      {
        when: 'a number that the registry holds for another day',
        rows: month({ sessions: [session({ session_day: 2 })] }),
        registry: registry({ sessions: [session()] }),
        at: ['sessions 2 session_no'],
      },
    ],
    holds: [
      { when: 'two numbers', rows: month({ sessions: [session(), session({ session_day: 2, session_no: 2 })] }) },
      { when: 'the same number in two courses', rows: month({ sessions: [session(), session({ session_day: 200, course_no: 2 })] }) },
    ],
  },
  {
    rule: 'R05',
    source: order,
    breaks: [
      {
        when: 'an injury 12 years ago at the age of 10',
        rows: month({ participants: [participant({ age_at_index: 10, days_injury_to_index: 4_383 })] }),
        at: ['participants 2 days_injury_to_index'],
      },
    ],
    holds: [
      {
        when: 'an injury 10 years ago at the age of 10',
        rows: month({ participants: [participant({ age_at_index: 10, days_injury_to_index: 3_653 })] }),
      },
      {
        when: 'the age class of 90 and more',
        rows: month({ participants: [participant({ age_at_index: 90, days_injury_to_index: 32_850, injury_year: 1931 })] }),
      },
    ],
  },
  {
    rule: 'F30',
    source: structure,
    breaks: [
      {
        when: 'a participant twice',
        rows: month({ participants: [participant(), participant({ sex: 'male' })] }),
        at: ['participants 3 row'],
      },
      {
        when: 'a bout three times',
        rows: month({ sessions: [session()], bouts: [bout(), bout(), bout({ bout_no: 2 }), bout()] }),
        at: ['bouts 3 row', 'bouts 5 row'],
      },
    ],
    holds: [
      { when: 'two trials of a measure', rows: month({ assessments: [result('tmwt_ss', 0.5), result('tmwt_ss', 0.5, { trial_no: 2 })] }) },
      { when: 'a row that corrects one the registry holds', rows: month({ exams: [exam()] }), registry: registry({ exams: [exam()] }) },
    ],
  },
  {
    rule: 'F31',
    source: 'without consent the registry may not hold the data',
    breaks: [
      {
        when: 'data without any consent',
        rows: { participants: [participant()], exams: [exam()], sessions: [session()] },
        at: ['exams 2 participant'],
      },
      {
        when: 'data after the consent expired',
        rows: month({ consents: [consent(), consent({ consent_no: 2, status: 'expired' })], sessions: [session()] }),
        at: ['sessions 2 participant'],
      },
    ],
    holds: [
      { when: 'data with a consent in force', rows: month({ exams: [exam()] }) },
      {
        when: 'data with a consent the registry holds',
        rows: { participants: [participant()], exams: [exam()] },
        registry: registry({ consents: [consent()] }),
      },
      { when: 'a withdrawal without data', rows: month({ consents: [withdrawn] }) },
    ],
  },
  {
    rule: 'F32',
    source: 'the person ended it',
    breaks: [
      {
        when: 'data of a person who withdrew',
        rows: { participants: [participant()], exams: [exam()], sessions: [session()] },
        registry: registry({ consents: [consent(), withdrawn] }, hasWithdrawn),
        at: ['exams 2 participant', 'sessions 2 participant'],
      },
    ],
    holds: [
      {
        when: 'data sent with a new consent',
        rows: month({ consents: [consent({ consent_no: 3 })], exams: [exam()] }),
        registry: registry({ consents: [consent(), withdrawn] }, hasWithdrawn),
      },
      { when: 'the participant alone', rows: { participants: [participant()] }, registry: registry({}, hasWithdrawn) },
    ],
  },
  {
    rule: 'F38',
    source: registryRule,
    breaks: [
      {
        when: 'a code that the site has replaced, new to the registry or not',
        rows: month({ exams: [exam()] }),
        registry: registry({}, { replaced: new Set([someone]) }),
        at: ['participants 2 participant', 'consents 2 participant', 'exams 2 participant'],
      },
    ],
    holds: [
      {
        when: 'codes in use beside a replaced one',
        rows: month({ exams: [exam()] }),
        registry: registry({}, { replaced: new Set([someoneElse]) }),
      },
    ],
  },
  {
    rule: 'F33',
    source: 'rule of this registry against people entered twice',
    breaks: [
      {
        when: 'two codes that agree in everything',
        rows: month({ participants: [participant(), participant({ participant: someoneElse })] }),
        at: ['participants 2 row', 'participants 3 row'],
      },
      {
        when: 'a code that agrees with one the registry holds',
        rows: month(),
        registry: registry({}, { otherParticipants: tableFromRows('participants', [participant({ participant: someoneElse })]) }),
        at: ['participants 2 row'],
      },
    ],
    holds: [
      {
        when: 'people a day apart',
        rows: month({ participants: [participant(), participant({ participant: someoneElse, days_injury_to_index: 211 })] }),
      },
      {
        when: 'people of whom too little is known',
        rows: month({
          participants: [
            participant({ days_injury_to_index: undefined }),
            participant({ participant: someoneElse, days_injury_to_index: undefined }),
          ],
        }),
      },
    ],
  },
  {
    rule: 'F34',
    source: registryRule,
    breaks: [
      {
        when: 'five bouts of one person that are all alike',
        rows: month({ sessions: [session()], bouts: numbered(5, (index) => bout({ bout_no: index + 1 })) }),
        at: ['bouts 2 row'],
      },
      {
        when: 'a file of sessions that are all alike, one of each participant',
        rows: month({ sessions: numbered(20, (index) => session({ participant: `S${String(index).padStart(21, '0')}` })) }),
        at: ['sessions 2 row'],
      },
    ],
    holds: [
      {
        when: 'four bouts that are alike',
        rows: month({ sessions: [session()], bouts: numbered(4, (index) => bout({ bout_no: index + 1 })) }),
      },
      {
        when: 'bouts that differ in one measured value',
        rows: month({ sessions: [session()], bouts: numbered(8, (index) => bout({ bout_no: index + 1, hr_end: 100 + index })) }),
      },
      {
        when: 'bouts with too few values to tell',
        rows: month({
          sessions: [session()],
          bouts: numbered(8, (index) => bout({ bout_no: index + 1, steps: undefined, hr_end: undefined })),
        }),
      },
    ],
  },
  {
    rule: 'F35',
    source: registryRule,
    breaks: [
      {
        when: 'a total of steps 6% above the bouts',
        rows: month({ sessions: [session({ steps_total: 640 })], bouts: [bout()] }),
        at: ['sessions 2 steps_total'],
      },
      {
        when: 'a total of metres without one of its bouts',
        rows: month({ sessions: [session({ distance_total_m: 600 })], bouts: [bout()] }),
        at: ['sessions 2 distance_total_m'],
      },
    ],
    holds: [
      { when: 'totals that are the sums', rows: month({ sessions: [session()], bouts: [bout()] }) },
      { when: 'a total of steps 5% above the bouts', rows: month({ sessions: [session({ steps_total: 631 })], bouts: [bout()] }) },
      {
        when: 'bouts that were not all counted',
        rows: month({
          sessions: [session({ steps_total: 900 })],
          bouts: [bout(), bout({ bout_no: 2, steps: undefined, distance_m: undefined })],
        }),
      },
    ],
  },
  {
    rule: 'F36',
    source: order,
    breaks: [
      {
        when: 'an injury next year',
        rows: month({ participants: [participant({ injury_year: 2027 })] }),
        at: ['participants 2 injury_year'],
      },
      {
        when: 'a first training day six years from an injury of 2021',
        rows: month({ participants: [participant({ injury_year: 2021, days_injury_to_index: 2_200 })] }),
        at: ['participants 2 days_injury_to_index'],
      },
    ],
    holds: [
      { when: 'an injury this year', rows: month({ participants: [participant({ injury_year: 2026 })] }) },
      {
        when: 'a first training day this year',
        rows: month({ participants: [participant({ injury_year: 2021, days_injury_to_index: 1_900 })] }),
      },
    ],
  },
  {
    rule: 'F37',
    source: order,
    breaks: [
      {
        when: 'a consent that ended the day before it was signed',
        rows: month({ consents: [consent({ valid_until_day: -15 })] }),
        at: ['consents 2 valid_until_day'],
      },
    ],
    holds: [
      { when: 'a consent for one day', rows: month({ consents: [consent({ valid_until_day: -14 })] }) },
      { when: 'a consent without an end', rows: month() },
    ],
  },
]);
