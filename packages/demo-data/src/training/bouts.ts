/** The bouts of one session. */
import type { Person } from '../people/person.ts';
import type { Random } from '../random.ts';
import { clamp, rounded } from '../rows.ts';
import type { Cells } from '../rows.ts';
import { followsSignal, jointCells, settingCells, trainingSpeed } from './devices.ts';
import type { BoutSituation } from './devices.ts';

export interface BoutPlan {
  readonly person: Person;
  readonly situation: BoutSituation;
  readonly massKg: number;
  /** Seconds of walking to share out. */
  readonly walkingSeconds: number;
  /** Seconds of rest to share out between the bouts. */
  readonly restSeconds: number;
  readonly dailyAid: string;
  readonly restingRate: number;
  readonly peakRate: number;
  /** Exertion of the whole session on the site's scale. */
  readonly exertion: number;
  readonly stepsCounted: boolean;
  /** Reason that ends the session early, if any. */
  readonly lastReason?: string;
}

export interface Bouts {
  /** For each bout the parts of its row. */
  readonly rows: readonly (readonly Cells[])[];
  readonly walkingSeconds: number;
  readonly metres: number;
  /** Null when the steps were not counted. */
  readonly steps: number | null;
}

/** Splits a whole number into parts of random sizes; every part is at least half of an equal share. */
function split(random: Random, total: number, parts: number): number[] {
  const weights = Array.from({ length: parts }, () => random.between(0.5, 1.5));
  const sum = weights.reduce((kept, weight) => kept + weight, 0);
  return weights.map((weight) => Math.floor((total * weight) / sum));
}

/** Longer steps at higher speeds; between 0.17 and 0.8 m. */
function stepLength(random: Random, speed: number): number {
  return clamp((0.2 + 0.5 * speed) * random.between(0.92, 1.08), 0.17, 0.8);
}

function exertionCells({ person, exertion }: BoutPlan, random: Random, part: number): Cells {
  if (random.chance(0.12)) return {};
  const scale = person.site.exertionScale;
  const felt = exertion + (part - 1) * (scale === 'cr10' ? 1 : 2);
  return {
    rpe_end: scale === 'cr10' ? clamp(Math.round(felt * 2) / 2, 0, 10) : clamp(Math.round(felt), 6, 20),
    rpe_scale: scale,
  };
}

function stopReason(random: Random, signal: boolean): string {
  return random.weighted({
    planned: 82,
    fatigue: 9,
    signal_fading: signal ? 6 : 0,
    spasm: 2,
    pain: 1,
    symptoms: 0.7,
    equipment: 0.7,
    fit: 0.6,
    skin: 0.2,
    participant_choice: 1.4,
    other: 0.5,
  });
}

/** One bout: the parts of its row, and what it adds to the session. */
interface Bout {
  readonly parts: readonly Cells[];
  readonly seconds: number;
  readonly metres: number;
  readonly steps: number;
}

/** Movement of single joints before walking, as done with a device that follows the muscle signal. */
function isolatedMovement(random: Random, plan: BoutPlan): readonly Cells[] {
  const cells: Cells = {
    activity: 'isolated_movement',
    device_class: plan.situation.device,
    duration_s: random.whole(60, 240),
    hr_end: plan.restingRate + random.whole(2, 8),
    stop_reason: 'planned',
    rest_after_s: random.whole(20, 60),
  };
  return [cells, jointCells(random, plan.situation)];
}

function walkingBout(random: Random, plan: BoutPlan, seconds: number, rest: number, part: number): Bout {
  const { person, situation, restingRate, peakRate } = plan;
  const speed = trainingSpeed(random, situation);
  const belt = situation.onTreadmill && situation.device !== 'end_effector_trainer' ? Math.max(0.1, rounded(speed, 2)) : null;
  const metres = rounded(Math.max(1, seconds * (belt === null ? speed : belt * random.between(0.975, 1))), 1);
  const joints = jointCells(random, situation);
  const steps = Math.max(2, Math.round(metres / stepLength(random, metres / seconds)));
  const cells: Cells = {
    activity: 'walking',
    device_class: situation.device,
    duration_s: seconds,
    distance_m: metres,
    steps: plan.stepsCounted ? steps : null,
    treadmill_speed_mps: belt,
    hr_end: random.chance(person.site.gaps * 2) ? null : Math.round(restingRate + (peakRate - restingRate) * random.between(0.6, 1)),
    stop_reason: part === 1 && plan.lastReason !== undefined ? plan.lastReason : stopReason(random, followsSignal(joints)),
    rest_after_s: rest,
  };
  const parts = [cells, joints, settingCells(random, situation, plan.massKg, plan.dailyAid), exertionCells(plan, random, part)];
  return { parts, seconds, metres, steps };
}

const shortestBout = 20;
const longestRest = 900;

export function drawBouts(random: Random, plan: BoutPlan): Bouts {
  const { walkingSeconds, restSeconds, situation } = plan;
  const count = clamp(random.whole(3, 7), 1, Math.max(1, Math.floor(walkingSeconds / 80)));
  const rests = split(random, restSeconds, count);
  const walks = split(random, walkingSeconds, count).map((seconds, index) => {
    const isLast = index === count - 1;
    const rest = isLast ? 0 : Math.min(rests[index] ?? 0, longestRest);
    return walkingBout(random, plan, Math.max(shortestBout, seconds), rest, (index + 1) / count);
  });
  const before = situation.device === 'signal_driven_exoskeleton' && random.chance(0.2) ? [isolatedMovement(random, plan)] : [];
  const sum = (of: 'seconds' | 'metres' | 'steps'): number => walks.reduce((kept, bout) => kept + bout[of], 0);
  return {
    rows: [...before, ...walks.map(({ parts }) => parts)],
    walkingSeconds: sum('seconds'),
    metres: rounded(sum('metres'), 1),
    steps: plan.stepsCounted ? sum('steps') : null,
  };
}
