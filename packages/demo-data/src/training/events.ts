/** Adverse events: how often each kind occurs, and what a record of it says. */
import { lastDayOf, monthOf } from '../calendar.ts';
import type { Person } from '../people/person.ts';
import type { Random } from '../random.ts';
import { datedRow } from '../rows.ts';
import type { Cells, DatedRow } from '../rows.ts';

/** An event before it has its number. Days are calendar days. */
export interface EventDraft {
  readonly day: number;
  /** The session it belongs to, by its number; none when it is unrelated to one. */
  readonly session?: number;
  readonly kind: string;
  readonly cells: Cells;
  /** Days until it is over; null when it lasts on. */
  readonly daysToEnd: number | null;
}

type SessionKind =
  'none' | 'fall' | 'pain_increase' | 'spasticity_increase' | 'musculoskeletal' | 'equipment_fault' | 'syncope' | 'chest_symptom' | 'other';

/** Chances in one trained session beside what vital signs and skin checks show. Falls in about 4 of 100 people (Miller et al., Med Devices 2016;9:455-66: 4.4%). */
const chances: Readonly<Record<SessionKind, number>> = {
  none: 0.9867,
  fall: 0.0016,
  pain_increase: 0.0028,
  spasticity_increase: 0.002,
  musculoskeletal: 0.003,
  equipment_fault: 0.0025,
  syncope: 0.0004,
  chest_symptom: 0.0003,
  other: 0.0007,
};

const yesNo = (yes: boolean): string => (yes ? 'yes' : 'no');

function record(random: Random, severity: number, serious: boolean, action: string, expected: boolean): Cells {
  return {
    severity: String(severity),
    serious: yesNo(serious),
    action,
    expected: yesNo(expected),
    narrative_held: yesNo(random.chance(0.8)),
  };
}

function relation(random: Random, mainCause: string): Cells {
  const attribution = random.weighted({ unlikely: 1, possible: 4, probable: 3, definite: 1 });
  return { attribution, attributed_to: attribution === 'unlikely' ? null : mainCause };
}

const aboveTheLegs = ['shoulder', 'hand_thumb', 'trunk'] as const;
const legs = ['knee', 'ankle', 'lower_leg', 'thigh', 'foot_toes'] as const;

type Details = { readonly cells: Cells; readonly daysToEnd: number | null };

function detailsOf(random: Random, kind: Exclude<SessionKind, 'none'>, deviceWorn: boolean): Details {
  switch (kind) {
    case 'fall': {
      const injured = random.chance(0.2);
      return {
        cells: {
          ...record(random, injured ? 2 : 1, false, injured ? 'stopped' : random.pick(['none', 'paused']), true),
          ...relation(random, random.pick(['staff_handling', 'device', 'condition'])),
          onset: 'during',
          fall_injured: yesNo(injured),
          fall_tethered: yesNo(random.chance(0.6)),
          fall_device_worn: yesNo(deviceWorn),
          body_site: injured ? random.pick(['knee', 'hand_thumb', 'pelvis_hip']) : null,
        },
        daysToEnd: injured ? random.whole(2, 14) : 0,
      };
    }
    case 'pain_increase':
      return {
        cells: {
          ...record(random, random.whole(1, 2), false, 'none', true),
          ...relation(random, 'training_load'),
          onset: 'after',
          pain_rise: random.whole(2, 4),
          pain_over_24h: 'yes',
          body_site: random.pick(['shoulder', 'spine', 'knee', 'lower_leg']),
        },
        daysToEnd: random.whole(2, 10),
      };
    case 'spasticity_increase':
      return {
        cells: {
          ...record(random, 1, false, random.pick(['none', 'paused']), true),
          ...relation(random, 'condition'),
          onset: random.pick(['during', 'after']),
          body_site: random.pick(legs),
        },
        daysToEnd: random.whole(0, 4),
      };
    case 'musculoskeletal':
      return {
        cells: {
          ...record(random, random.whole(1, 2), false, random.pick(['none', 'paused', 'stopped']), true),
          ...relation(random, 'training_load'),
          onset: random.pick(['during', 'after']),
          body_site: random.chance(0.5) ? random.pick(aboveTheLegs) : random.pick(legs),
        },
        daysToEnd: random.chance(0.1) ? null : random.whole(1, 21),
      };
    case 'equipment_fault':
      return {
        cells: {
          ...record(random, 1, false, random.pick(['paused', 'stopped']), true),
          attribution: 'definite',
          attributed_to: 'device',
          onset: 'during',
        },
        daysToEnd: 0,
      };
    case 'syncope':
      return {
        cells: { ...record(random, 2, false, 'stopped', false), ...relation(random, 'condition'), onset: 'during' },
        daysToEnd: 0,
      };
    case 'chest_symptom': {
      const hospital = random.chance(0.3);
      return {
        cells: { ...record(random, hospital ? 3 : 2, hospital, 'stopped', false), ...relation(random, 'condition'), onset: 'during' },
        daysToEnd: random.whole(0, 5),
      };
    }
    case 'other':
      return {
        cells: { ...record(random, 1, false, 'none', false), ...relation(random, 'other'), onset: random.pick(['during', 'after']) },
        daysToEnd: random.whole(0, 7),
      };
  }
}

const onsetMinutes = (random: Random, onset: unknown): number | null => {
  if (onset === 'during') return random.whole(5, 30);
  return onset === 'after' ? random.whole(10, 600) : null;
};

/** An event of one session, or nothing, which is by far the most frequent. */
export function drawSessionEvent(random: Random, day: number, session: number, deviceWorn: boolean): EventDraft | null {
  const kind = random.weighted<SessionKind>(chances);
  if (kind === 'none') return null;
  const { cells, daysToEnd } = detailsOf(random, kind, deviceWorn);
  return { day, session, kind, cells: { ...cells, onset_min: onsetMinutes(random, cells['onset']) }, daysToEnd };
}

export function dysreflexiaEvent(random: Random, day: number, session: number, { rise, peak }: { rise: number; peak: number }): EventDraft {
  const cells: Cells = {
    ...record(random, rise >= 40 ? 2 : 1, false, rise >= 40 ? 'stopped' : 'paused', true),
    ...relation(random, random.pick(['condition', 'device'])),
    onset: 'during',
    onset_min: random.whole(5, 30),
    sbp_rise: rise,
    sbp_peak: peak,
    symptomatic: yesNo(random.chance(0.7)),
    bradycardia: yesNo(random.chance(0.3)),
    dysreflexia_trigger: random.weighted({ bladder: 4, bowel: 1, harness_or_strap: 3, spasm: 1, unknown: 2 }),
  };
  return { day, session, kind: 'autonomic_dysreflexia', cells, daysToEnd: 0 };
}

export function hypotensionEvent(
  random: Random,
  day: number,
  session: number,
  drop: { readonly systolic: number; readonly diastolic: number },
  postureBefore: string,
): EventDraft {
  const cells: Cells = {
    ...record(random, 1, false, random.pick(['none', 'paused']), true),
    ...relation(random, 'condition'),
    onset: 'during',
    onset_min: random.whole(1, 5),
    sbp_drop: drop.systolic,
    dbp_drop: drop.diastolic,
    start_posture: postureBefore,
    symptomatic: yesNo(random.chance(0.6)),
  };
  return { day, session, kind: 'orthostatic_hypotension', cells, daysToEnd: 0 };
}

export function skinEvent(random: Random, day: number, session: number, broken: boolean): EventDraft {
  const cells: Cells = {
    ...record(random, broken ? 2 : 1, false, broken ? 'stopped' : 'none', true),
    ...relation(random, random.weighted({ device: 5, training_load: 2, condition: 1 })),
    onset: 'after',
    onset_min: random.whole(5, 40),
    skin_stage: broken ? '2' : '1',
    body_site: random.pick(['lower_leg', 'thigh', 'pelvis_hip', 'foot_toes', 'sacrum']),
    device_contact: yesNo(random.chance(0.85)),
  };
  return { day, session, kind: 'skin_breakdown', cells, daysToEnd: broken ? random.whole(7, 35) : random.whole(1, 4) };
}

/** A fracture, after which the course ends. Few: the 3.4% of Miller et al. rest on one event. */
export function fractureEvent(random: Random, day: number, session: number): EventDraft {
  const cells: Cells = {
    ...record(random, 3, true, 'course_ended', false),
    ...relation(random, random.pick(['device', 'training_load'])),
    onset: 'during',
    onset_min: random.whole(10, 40),
    body_site: random.pick(['ankle', 'lower_leg', 'foot_toes']),
    fracture_imaged: 'yes',
    bone_density_before: random.pick(['low', 'osteoporosis', 'not_measured']),
  };
  return { day, session, kind: 'fracture', cells, daysToEnd: null };
}

/** Illness that training did not cause. */
export function unrelatedEvent(random: Random, day: number): EventDraft {
  const kind = random.weighted({ infection: 20, other: 4, dvt: 0.6 });
  const hospital = kind === 'dvt' || random.chance(0.12);
  const cells: Cells = {
    ...record(random, hospital ? 3 : 2, hospital, 'none', kind !== 'other'),
    attribution: random.pick(['unrelated', 'unlikely']),
    onset: 'outside',
  };
  return { day, kind, cells, daysToEnd: random.chance(0.08) ? null : random.whole(4, 24) };
}

/** Days after the end of a month in which its file is made: what ends by then is recorded as over. */
const daysToFile = 9;

/** Rows of all events of a participant, numbered in the order of their days. */
export function eventRows(person: Person, events: readonly EventDraft[]): DatedRow[] {
  return [...events]
    .sort((a, b) => a.day - b.day)
    .map(({ day, session, kind, cells, daysToEnd }, index) => {
      const studyDay = day - person.indexDay;
      const end = daysToEnd === null ? Infinity : day + daysToEnd;
      const isOver = end <= lastDayOf(monthOf(day)) + daysToFile;
      const own: Cells = {
        participant: person.code,
        event_no: index + 1,
        event_day: studyDay,
        ...(session === undefined ? {} : { session_day: studyDay, session_no: session }),
        kind,
        outcome: isOver ? 'resolved' : 'ongoing',
        resolved_day: isOver ? end - person.indexDay : null,
      };
      return datedRow('adverse_events', studyDay, cells, own);
    });
}
