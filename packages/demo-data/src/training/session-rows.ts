/** Rows of the sessions of a course, their bouts and the adverse events that belong to them. */
import type { ExamSheet } from '../exams/exam-sheet.ts';
import type { Person } from '../people/person.ts';
import type { Random } from '../random.ts';
import { clamp, datedRow, rounded } from '../rows.ts';
import type { Cells, DatedRow } from '../rows.ts';
import type { DeviceClass } from '../sites.ts';
import { drawBouts } from './bouts.ts';
import type { Course, ScheduledSession } from './course.ts';
import { usesTreadmill } from './devices.ts';
import { drawSessionEvent, dysreflexiaEvent, fractureEvent, hypotensionEvent, skinEvent } from './events.ts';
import type { EventDraft } from './events.ts';
import { drawVitalSigns } from './vital-signs.ts';
import type { Circulation } from './vital-signs.ts';

export interface TrainingContext {
  readonly person: Person;
  readonly circulation: Circulation;
  readonly device: DeviceClass;
  /** A second device, used now and then. */
  readonly otherDevice: DeviceClass;
  readonly plannedMinutes: number;
  readonly aptitude: number;
  /** What the last exam up to a calendar day found. */
  readonly sheetAt: (day: number) => ExamSheet;
  /** Walking speed without the device in m/s, by progress through the course; 0 when the person does not walk. */
  readonly abilityAt: (progress: number) => number;
  readonly dailyAid: string;
  readonly usualPain: number;
  readonly usualExertion: number;
}

export interface TrainingRows {
  readonly rows: readonly DatedRow[];
  readonly events: readonly EventDraft[];
}

interface Times {
  readonly don: number;
  readonly doff: number;
  readonly walking: number;
  readonly resting: number;
}

const slowToPutOn = new Set<DeviceClass>(['overground_powered_exoskeleton', 'signal_driven_exoskeleton', 'treadmill_driven_orthosis']);

/** Minutes of a session, which together fit into what was planned. Walking for 19 to 41 minutes in an hour: Gagnon et al. 2018. */
function drawTimes(random: Random, planned: number, device: DeviceClass, { progress }: ScheduledSession, share: number): Times {
  const slow = slowToPutOn.has(device);
  const don = rounded((slow ? 11 - 6 * progress : 4 - 1.5 * progress) * random.between(0.8, 1.2), 0);
  const doff = Math.max(1, rounded(don * random.between(0.4, 0.7), 0));
  const free = planned - don - doff - 2;
  const walking = free * random.between(0.42, 0.58) * (0.85 + 0.2 * progress) * share;
  return { don: Math.max(1, don), doff, walking, resting: Math.min(free - walking * 1.25, walking * random.between(0.25, 0.5)) };
}

/** Exertion of a session: what is usual, a little more after more work. */
function drawExertion(random: Random, { person, usualExertion }: TrainingContext, share: number): number {
  const felt = usualExertion - 1.5 * (1 - share) + random.around(0, 0.6);
  return person.site.exertionScale === 'cr10' ? clamp(Math.round(felt * 2) / 2, 1, 9.5) : clamp(Math.round(6 + felt * 1.4), 7, 19);
}

function drawSkin(random: Random): { readonly pre: string; readonly post: string } {
  const pre = random.chance(0.02) ? 'redness_fades' : 'intact';
  return { pre, post: random.weighted({ intact: 95.6, redness_fades: 4, redness_stays: 0.32, broken: pre === 'intact' ? 0.08 : 0 }) };
}

interface TrainedSession {
  /** Parts of the session's row. */
  readonly cells: readonly Cells[];
  /** Parts of the row of each bout. */
  readonly bouts: readonly (readonly Cells[])[];
  readonly events: readonly EventDraft[];
}

function trainedSession(random: Random, context: TrainingContext, session: ScheduledSession): TrainedSession {
  const { person, plannedMinutes } = context;
  const { gaps } = person.site;
  const device = random.chance(0.12) ? context.otherDevice : context.device;
  const event = session.fracture
    ? fractureEvent(random, session.day, session.number)
    : drawSessionEvent(random, session.day, session.number, device !== 'conventional_overground');
  const stopped = event?.cells['action'] === 'stopped' || session.status === 'shortened';
  const share = stopped ? random.between(0.45, 0.75) : random.between(0.9, 1.05);
  const times = drawTimes(random, plannedMinutes, device, session, share);
  const vital = drawVitalSigns(random, context.circulation, Math.min(1, share), gaps);
  const skin = drawSkin(random);
  const exertion = drawExertion(random, context, share);
  const massKg = rounded(person.massKg + 2 * (session.progress - 0.5) + random.between(-0.4, 0.4), 1);

  const ability = context.abilityAt(session.progress);
  const sheet = context.sheetAt(session.day);
  const bouts = drawBouts(random, {
    person,
    situation: {
      device,
      ability,
      progress: session.progress,
      aptitude: context.aptitude,
      onTreadmill: usesTreadmill(random, device),
      legs: sheet,
    },
    massKg,
    walkingSeconds: Math.floor(times.walking * 60),
    restSeconds: Math.floor(times.resting * 60),
    dailyAid: context.dailyAid,
    restingRate: vital.restingRate,
    peakRate: vital.peakRate,
    exertion,
    stepsCounted: slowToPutOn.has(device) || random.chance(0.7),
    ...(stopped ? { lastReason: lastReason(session, event) } : {}),
  });

  const pain = Math.round(clamp(context.usualPain + random.around(0, 0.8), 0, 9));
  const upright = rounded((bouts.walkingSeconds / 60) * random.between(1.06, 1.22) + 0.1, 1);
  const maybe = <T>(value: T): T | null => (random.chance(gaps) ? null : value);
  const events = [
    ...(event ? [event] : []),
    ...(vital.dysreflexia ? [dysreflexiaEvent(random, session.day, session.number, vital.dysreflexia)] : []),
    ...(vital.hypotension
      ? [hypotensionEvent(random, session.day, session.number, vital.hypotension, String(vital.cells['bp_pre_posture']))]
      : []),
    ...(skin.post === 'redness_stays' || skin.post === 'broken'
      ? [skinEvent(random, session.day, session.number, skin.post === 'broken')]
      : []),
  ];
  const cells: Cells = {
    status: stopped ? 'shortened' : 'completed',
    not_trained_reason: stopped ? (session.reason ?? (event?.kind === 'equipment_fault' ? 'equipment' : 'medical')) : null,
    device_class: device,
    don_min: maybe(times.don),
    doff_min: maybe(times.doff),
    upright_min: maybe(upright),
    rest_min: maybe(rounded(times.resting + 0.5, 1)),
    steps_total: bouts.steps === null ? null : maybe(bouts.steps),
    distance_total_m: maybe(bouts.metres),
    body_mass_kg: massKg,
    staff_count: maybe(clamp(Math.round(random.around(ability > 0.4 ? 1.3 : 2, 0.5)), 1, 3)),
    assist_level: maybe(clamp(Math.round(2.5 + 2 * session.progress + 3 * ability + random.around(0, 0.6)), 1, 7)),
    pain_pre: maybe(pain),
    pain_post: maybe(clamp(pain + random.pick([-1, 0, 0, 0, 1]), 0, 10)),
    spasticity_change: maybe(random.weighted({ less: 32, same: 60, more: 8 })),
    skin_check_pre: skin.pre,
    skin_check_post: skin.post,
  };
  const rated: Cells = random.chance(gaps) ? {} : { rpe: exertion, rpe_scale: person.site.exertionScale };
  return { cells: [cells, vital.cells, rated], bouts: bouts.rows, events };
}

/** Why the last bout of a shortened session ended. */
function lastReason({ reason }: ScheduledSession, event: EventDraft | null): string {
  if (event?.kind === 'equipment_fault' || reason === 'equipment') return 'equipment';
  return reason === 'fatigue' ? 'fatigue' : 'symptoms';
}

export function trainingRows(random: Random, context: TrainingContext, course: Course): TrainingRows {
  const { person } = context;
  const rows: DatedRow[] = [];
  const events: EventDraft[] = [];
  for (const session of course.sessions) {
    const studyDay = session.day - person.indexDay;
    const key = { participant: person.code, session_day: studyDay, session_no: session.number };
    const common: Cells = { ...key, course_no: course.number, start_hour: session.hour, planned_min: context.plannedMinutes };
    if (session.status === 'completed' || session.status === 'shortened') {
      const trained = trainedSession(random, context, session);
      rows.push(datedRow('sessions', studyDay, common, ...trained.cells));
      trained.bouts.forEach((bout, index) => rows.push(datedRow('bouts', studyDay, key, { bout_no: index + 1 }, ...bout)));
      events.push(...trained.events);
    } else {
      rows.push(datedRow('sessions', studyDay, common, { status: session.status, not_trained_reason: session.reason }));
    }
  }
  return { rows, events };
}
