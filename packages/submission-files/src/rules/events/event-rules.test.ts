import type { Row } from '@cairnstep/dictionary';
import { bout, event, month, session } from '../../test-support/a-month.ts';
import { registry } from '../../test-support/findings-of.ts';
import { testRules } from '../../test-support/rule-cases.ts';

/** A session with one bout, changed, and the events. */
const day = (changes: Row, ...events: Row[]) => month({ sessions: [session(changes)], bouts: [bout()], adverse_events: events });
const happened = (changes: Row) => day({}, event({ ...changes }));

const grading = 'common trial grading of adverse events, from memory';
const noSite = { body_site: undefined };

const dysreflexia = { kind: 'autonomic_dysreflexia', ...noSite, sbp_rise: 20, symptomatic: 'no' };
const hypotension = { kind: 'orthostatic_hypotension', ...noSite, sbp_drop: 20, symptomatic: 'no' };
const skin = { kind: 'skin_breakdown', body_site: 'sacrum', skin_stage: '1', device_contact: 'yes' };
const fracture = { kind: 'fracture', body_site: 'ankle', fracture_imaged: 'yes', bone_density_before: 'low' };
const pain = { kind: 'pain_increase', ...noSite, pain_rise: 2, pain_over_24h: 'yes' };

testRules([
  {
    rule: 'A01',
    source: grading,
    breaks: [
      { when: 'severity 4 that is not serious', rows: happened({ severity: '4' }), at: ['adverse_events 2 serious'] },
      { when: 'a fracture that is not serious', rows: happened(fracture), at: ['adverse_events 2 serious'] },
    ],
    holds: [
      { when: 'severity 4 that is serious', rows: happened({ severity: '4', serious: 'yes' }) },
      { when: 'a serious fracture', rows: happened({ ...fracture, serious: 'yes' }) },
      { when: 'severity 3 that is not serious', rows: happened({ severity: '3' }) },
    ],
  },
  {
    rule: 'A02',
    source: grading,
    breaks: [
      { when: 'severity 5 that was resolved', rows: happened({ severity: '5', serious: 'yes' }), at: ['adverse_events 2 outcome'] },
      {
        when: 'a fatal outcome at severity 4',
        rows: happened({ severity: '4', serious: 'yes', outcome: 'fatal', resolved_day: undefined }),
        at: ['adverse_events 2 severity'],
      },
    ],
    holds: [
      {
        when: 'severity 5 with a fatal outcome',
        rows: happened({ severity: '5', serious: 'yes', outcome: 'fatal', resolved_day: undefined }),
      },
      { when: 'severity 1 that was resolved', rows: happened({}) },
    ],
  },
  {
    rule: 'A03',
    source: 'Teasell RW 2000 as quoted in a rehabilitation evidence review',
    breaks: [
      { when: 'dysreflexia with a rise of 19', rows: happened({ ...dysreflexia, sbp_rise: 19 }), at: ['adverse_events 2 sbp_rise'] },
    ],
    holds: [{ when: 'dysreflexia with a rise of 20', rows: happened(dysreflexia) }],
  },
  {
    rule: 'A04',
    source: 'Freeman R et al. consensus 2011; from sitting Shaw BH et al. J Hypertens 2017;35:1019-25',
    breaks: [
      { when: 'a systolic drop of 19', rows: happened({ ...hypotension, sbp_drop: 19 }), at: ['adverse_events 2 sbp_drop'] },
      {
        when: 'drops of 14 and 6 from sitting',
        rows: happened({ ...hypotension, sbp_drop: 14, dbp_drop: 6, start_posture: 'sitting' }),
        at: ['adverse_events 2 sbp_drop'],
      },
    ],
    holds: [
      { when: 'a systolic drop of 20', rows: happened(hypotension) },
      { when: 'a diastolic drop of 10', rows: happened({ ...hypotension, sbp_drop: 5, dbp_drop: 10 }) },
      { when: 'a systolic drop of 15 from sitting', rows: happened({ ...hypotension, sbp_drop: 15, start_posture: 'sitting' }) },
      {
        when: 'a diastolic drop of 7 from sitting',
        rows: happened({ ...hypotension, sbp_drop: 5, dbp_drop: 7, start_posture: 'sitting' }),
      },
    ],
  },
  {
    rule: 'A05',
    source: 'common practice, from memory',
    breaks: [
      { when: 'redness that stays, without an event', rows: day({ skin_check_post: 'redness_stays' }), at: ['sessions 2 skin_check_post'] },
    ],
    holds: [
      { when: 'redness that stays, with an event', rows: day({ skin_check_post: 'redness_stays' }, event(skin)) },
      { when: 'redness that fades', rows: day({ skin_check_post: 'redness_fades' }) },
    ],
  },
  {
    rule: 'A06',
    source: 'definition of this registry: a rise of 2 points or more for longer than 24 hours',
    breaks: [
      { when: 'a rise of 1', rows: happened({ ...pain, pain_rise: 1 }), at: ['adverse_events 2 pain_rise'] },
      { when: 'a rise that did not last', rows: happened({ ...pain, pain_over_24h: 'no' }), at: ['adverse_events 2 pain_over_24h'] },
    ],
    holds: [{ when: 'a rise of 2 for longer than 24 hours', rows: happened(pain) }],
  },
  {
    rule: 'A07',
    source: 'order of events',
    breaks: [
      {
        when: 'an event resolved the day before it began',
        rows: happened({ event_day: 0, resolved_day: -1 }),
        at: ['adverse_events 2 resolved_day'],
      },
    ],
    holds: [{ when: 'an event resolved on its day', rows: happened({ event_day: 0, resolved_day: 0 }) }],
  },
  {
    rule: 'A08',
    source: 'rule of this registry',
    breaks: [
      {
        when: 'dysreflexia decided as present without an event',
        rows: day({ dysreflexia_decision: 'present' }),
        at: ['sessions 2 dysreflexia_decision'],
      },
      {
        when: 'hypotension decided as present with an event of another kind',
        rows: day({ hypotension_decision: 'present' }, event(dysreflexia)),
        at: ['sessions 2 hypotension_decision'],
      },
    ],
    holds: [
      { when: 'dysreflexia with its event', rows: day({ dysreflexia_decision: 'present' }, event(dysreflexia)) },
      {
        when: 'hypotension with an event of its day that names no session',
        rows: day({ hypotension_decision: 'present' }, event({ ...hypotension, session_day: undefined, session_no: undefined })),
      },
      {
        when: 'an episode whose event the registry holds',
        rows: day({ dysreflexia_decision: 'present' }),
        registry: registry({ adverse_events: [event(dysreflexia)] }),
      },
      { when: 'absence', rows: day({ dysreflexia_decision: 'absent' }) },
    ],
  },
]);
