import { bout, consent, month, participant, result, session } from '../../test-support/a-month.ts';
import { testRules } from '../../test-support/rule-cases.ts';

const dictionary = "the dictionary's requirements";
const limits = "the dictionary's limits";

testRules([
  {
    rule: 'F20',
    source: dictionary,
    breaks: [
      {
        when: 'an empty cell that is always filled',
        rows: month({ participants: [participant({ sex: undefined })] }),
        at: ['participants 2 sex'],
      },
      {
        when: 'an empty cell that another one asks for',
        rows: month({ sessions: [session({ status: 'shortened' })] }),
        at: ['sessions 2 not_trained_reason'],
      },
      { when: 'a result of a done test', rows: month({ assessments: [result('wisci2', undefined)] }), at: ['assessments 2 value'] },
      { when: 'a rating without its scale', rows: month({ sessions: [session({ rpe_scale: undefined })] }), at: ['sessions 2 rpe_scale'] },
    ],
    holds: [
      { when: 'complete rows', rows: month({ sessions: [session()], bouts: [bout()] }) },
      {
        when: 'a test that was not attempted',
        rows: month({ assessments: [result('wisci2', undefined, { attempt_status: 'not_attempted', level_basis: undefined })] }),
      },
    ],
  },
  {
    rule: 'F21',
    source: limits,
    breaks: [
      { when: 'an age of 91', rows: month({ participants: [participant({ age_at_index: 91 })] }), at: ['participants 2 age_at_index'] },
      {
        when: 'a speed above the limit of its measure',
        rows: month({ assessments: [result('tmwt_ss', 3.01)] }),
        at: ['assessments 2 value'],
      },
      {
        when: 'a rating of 5 on the scale from 6',
        rows: month({ sessions: [session({ rpe: 5, rpe_scale: '6_20' })] }),
        at: ['sessions 2 rpe'],
      },
      { when: 'a rating of 11 on the scale to 10', rows: month({ sessions: [session({ rpe: 11 })] }), at: ['sessions 2 rpe'] },
    ],
    holds: [
      { when: 'an age of 90', rows: month({ participants: [participant({ age_at_index: 90, injury_year: 1990 })] }) },
      { when: 'a fast speed that would be too high for the other pace', rows: month({ assessments: [result('tmwt_fast', 3.01)] }) },
      { when: 'a rating of 6 on the scale from 6', rows: month({ sessions: [session({ rpe: 6, rpe_scale: '6_20' })] }) },
    ],
  },
  {
    rule: 'F22',
    source: limits,
    breaks: [
      {
        when: 'a training day before the first',
        rows: month({ sessions: [session({ session_day: -1 })] }),
        at: ['sessions 2 session_day'],
      },
      {
        when: 'a speed above the plausible limit of its measure',
        rows: month({ assessments: [result('tmwt_ss', 1.81)] }),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      { when: 'the first training day', rows: month({ sessions: [session()] }) },
      { when: 'a speed at the plausible limit', rows: month({ assessments: [result('tmwt_ss', 1.8)] }) },
      { when: 'a speed beyond the hard limit, which is an error of its own', rows: month({ assessments: [result('tmwt_ss', 3.01)] }) },
    ],
  },
  {
    rule: 'F23',
    source: limits,
    breaks: [
      { when: 'half a point of a whole score', rows: month({ assessments: [result('bbs', 40.5)] }), at: ['assessments 2 value'] },
      {
        when: 'a timed distance of 8 m',
        rows: month({ assessments: [result('tmwt_ss', 0.5, { timed_distance_m: 8, time_s: 16 })] }),
        at: ['assessments 2 timed_distance_m'],
      },
      { when: 'a rating of 3.2', rows: month({ sessions: [session({ rpe: 3.2 })] }), at: ['sessions 2 rpe'] },
    ],
    holds: [
      { when: 'a whole score', rows: month({ assessments: [result('bbs', 40)] }) },
      { when: 'a rating of 3.5', rows: month({ sessions: [session({ rpe: 3.5 })] }) },
      { when: 'the grade 1+', rows: month({ assessments: [result('mas', 1.5)] }) },
      { when: 'any decimals of a time', rows: month({ assessments: [result('tug', 20.37)] }) },
    ],
  },
  {
    rule: 'F24',
    source: dictionary,
    breaks: [
      {
        when: 'a surface of movement that is no walking',
        rows: month({
          sessions: [session()],
          bouts: [bout({ activity: 'isolated_movement', distance_m: undefined, steps: undefined, treadmill_speed_mps: undefined })],
        }),
        at: ['bouts 2 surface'],
      },
      {
        when: 'a condition beside a general permission',
        rows: month({ consents: [consent({ condition: 'traumatic_sci' })] }),
        at: ['consents 2 condition'],
      },
      {
        when: 'a result of a test that was stopped early and has none',
        rows: month({ assessments: [result('tmwt_ss', 0.5, { attempt_status: 'stopped_early', timed_distance_m: 10, time_s: 20 })] }),
        at: ['assessments 2 value'],
      },
    ],
    holds: [
      {
        when: 'a distance of a walk that was stopped early',
        rows: month({ assessments: [result('six_mwt', 90, { attempt_status: 'stopped_early', seconds_walked: 180 })] }),
      },
      {
        when: 'a condition where the permission is limited to one',
        rows: month({ consents: [consent({ permission: 'DS', condition: 'traumatic_sci' })] }),
      },
    ],
  },
  {
    rule: 'F25',
    source: 'the dictionary marks measures that are only ever computed',
    breaks: [{ when: 'a derived speed', rows: month({ assessments: [result('speed_derived', 0.5)] }), at: ['assessments 2 measure'] }],
    holds: [{ when: 'a measured speed', rows: month({ assessments: [result('tmwt_ss', 0.5)] }) }],
  },
]);
