/** Scores of one visit beside the walking tests: independence, balance, motor scores, spasticity, pain, quality of life. */
import { scimTotal } from '@cairnstep/scoring';
import type { ScimParts } from '@cairnstep/scoring';
import { isCervical, isHighCervical, isMotorComplete } from '../people/person.ts';
import type { Person } from '../people/person.ts';
import type { Random } from '../random.ts';
import { clamp } from '../rows.ts';
import type { Cells } from '../rows.ts';
import type { Visit } from './visit.ts';

/** What differs between people and stays with one person. */
export interface Disposition {
  /** -1 to 1: better or worse than usual for level and grade. */
  readonly vigour: number;
  /** Usual pain, 0 to 9. */
  readonly pain: number;
  readonly painType: string;
  /** Usual frequency of spasms, 0 to 4. */
  readonly spasms: number;
  /** Usual satisfaction, 0 to 10. */
  readonly contentment: number;
}

export function drawDisposition(random: Random): Disposition {
  return {
    vigour: clamp(random.around(0, 0.45), -1, 1),
    pain: Math.round(clamp(random.around(3.4, 2.1), 0, 8)),
    painType: random.weighted({ neuropathic: 6, nociceptive: 3, unknown: 1 }),
    spasms: Math.round(clamp(random.around(1.6, 1.1), 0, 4)),
    contentment: clamp(random.around(6.2, 1.5), 1, 9.5),
  };
}

const done = (measure: string, value: number, more: Cells = {}): Cells => ({
  measure,
  trial_no: 1,
  attempt_status: 'done',
  value,
  ...more,
});

const points = (value: number, max: number): number => Math.round(clamp(value, 0, max));

function scimParts(random: Random, person: Person, visit: Visit, { vigour }: Disposition): ScimParts {
  const complete = isMotorComplete(person);
  const gained = visit.progress;
  const selfCare = isHighCervical(person) ? (complete ? 2 : 9) : isCervical(person) ? (complete ? 7 : 12) : 17;
  const sphincter = isCervical(person) ? (complete ? 15 : 25) : complete ? 29 : 33;
  const room = isHighCervical(person) ? (complete ? 1 : 5) : isCervical(person) ? (complete ? 3 : 6) : 8;
  // Whoever does not walk moves about in a wheelchair, which reaches 12 of the 30 points at most.
  const about = visit.speed === null ? Math.min(12, (isCervical(person) ? 3 : 7) + 2 * vigour + gained) : 9 + 17 * visit.speed + 2 * vigour;
  return {
    selfCare: points(selfCare + 3 * vigour + 1.2 * gained + random.around(0, 0.6), 20),
    respirationSphincter: points(sphincter + 4 * vigour + 1.5 * gained + random.around(0, 1), 40),
    mobilityRoom: points(room + 2 * vigour + 0.6 * gained + random.around(0, 0.5), 10),
    mobilityInOut: points(about + random.around(0, 0.7), visit.speed === null ? 14 : 30),
  };
}

function independence(random: Random, person: Person, visit: Visit, disposition: Disposition): Cells[] {
  const parts = scimParts(random, person, visit, disposition);
  return [
    done('scim3_self_care', parts.selfCare),
    done('scim3_resp_sphincter', parts.respirationSphincter),
    done('scim3_mobility_room', parts.mobilityRoom),
    done('scim3_mobility_in_out', parts.mobilityInOut),
    done('scim3_total', scimTotal(parts)),
  ];
}

/** Balance is asked of people who stand; who does not walk scores for sitting only. */
function balance(random: Random, person: Person, { speed }: Visit, { vigour }: Disposition): Cells[] {
  if (isMotorComplete(person)) return [];
  const score =
    speed === null ? 7 + 4 * vigour + random.around(0, 2) : 14 + 38 * Math.min(1, speed / 0.95) + 4 * vigour + random.around(0, 3);
  return [done('bbs', points(score, 56))];
}

function motorScores({ uems, lems }: Visit): Cells[] {
  return [...(uems === undefined ? [] : [done('uems', uems)]), ...(lems === undefined ? [] : [done('lems', lems)])];
}

const grades = [0, 0, 1, 1, 1.5, 2, 3] as const;

function spasticity(random: Random, visit: Visit, { spasms }: Disposition): Cells[] {
  const frequency = points(spasms - 0.4 * visit.progress + random.around(0, 0.5), 4);
  const groups = (['knee_ext', 'plantar_flex'] as const).flatMap((group) => (['right', 'left'] as const).map((side) => ({ group, side })));
  return [
    done('psfs_freq', frequency),
    ...(frequency > 0 ? [done('psfs_severity', Math.max(1, points(frequency * 0.6 + random.around(0.3, 0.5), 3)))] : []),
    ...groups.map(({ group, side }, index) => {
      const grade = grades[Math.round(clamp(frequency + random.around(0.8, 0.9), 0, grades.length - 1))] ?? 0;
      return { measure: 'mas', trial_no: index + 1, attempt_status: 'done', value: grade, muscle_group: group, side };
    }),
  ];
}

function pain(random: Random, visit: Visit, { pain: usual, painType }: Disposition): Cells[] {
  const value = points(usual - 0.5 * visit.progress + random.around(0, 0.9), 10);
  return [done('pain_nrs', value, { pain_window: 'average_7d', pain_type: value === 0 ? null : painType })];
}

function satisfaction(random: Random, visit: Visit, { contentment }: Disposition): Cells[] {
  return ['qol_life', 'qol_physical', 'qol_psychological', 'qol_social'].map((item) =>
    done(item, points(contentment + 0.4 * visit.progress + (item === 'qol_physical' ? -0.8 : 0) + random.around(0, 0.9), 10)),
  );
}

/** Which scores are taken when: all before and after the course, some on the way and later. */
export function scoreCells(random: Random, person: Person, visit: Visit, disposition: Disposition): Cells[] {
  const drawn = {
    independence: independence(random, person, visit, disposition),
    balance: balance(random, person, visit, disposition),
    motor: motorScores(visit),
    spasticity: spasticity(random, visit, disposition),
    pain: pain(random, visit, disposition),
    satisfaction: satisfaction(random, visit, disposition),
  };
  const taken: (keyof typeof drawn)[] = {
    baseline: ['independence', 'balance', 'motor', 'spasticity', 'pain', 'satisfaction'] as const,
    interim: ['balance', 'pain'] as const,
    end_of_course: ['independence', 'balance', 'motor', 'spasticity', 'pain', 'satisfaction'] as const,
    follow_up_3m: ['independence', 'pain', 'satisfaction'] as const,
    follow_up_6m: ['independence', 'pain', 'satisfaction'] as const,
    follow_up_12m: ['independence', 'motor', 'pain', 'satisfaction'] as const,
  }[visit.timepoint].filter((part) => !random.chance(part === 'motor' ? 0.25 : 0.05));
  return taken.flatMap((part) => drawn[part].map((cells): Cells => ({ in_device: 'no', ...cells })));
}
