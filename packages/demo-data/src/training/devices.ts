/** How each class of device is used: by whom, how fast, with what support, and what moves each joint. */
import type { SideSheet } from '../exams/exam-sheet.ts';
import { firstLegMuscle } from '../exams/exam-sheet.ts';
import type { Grade } from '../case-mix.ts';
import type { Random } from '../random.ts';
import { clamp, rounded } from '../rows.ts';
import type { Cells } from '../rows.ts';
import type { DeviceClass, SiteProfile } from '../sites.ts';

type Weights = Readonly<Partial<Record<DeviceClass, number>>>;

const motorComplete: Weights = {
  overground_powered_exoskeleton: 6,
  treadmill_driven_orthosis: 3,
  end_effector_trainer: 1,
  fes_walking: 1,
  passive_orthosis: 1,
};

/** Which devices suit a grade, where the clinic has them. */
const suitable: Readonly<Record<Grade, Weights>> = {
  A: motorComplete,
  B: motorComplete,
  C: {
    signal_driven_exoskeleton: 5,
    treadmill_driven_orthosis: 3,
    manual_bwstt: 2,
    overground_powered_exoskeleton: 1.5,
    end_effector_trainer: 1.5,
    fes_walking: 1,
  },
  D: {
    signal_driven_exoskeleton: 4,
    manual_bwstt: 2,
    overground_bws: 2,
    conventional_overground: 1.5,
    treadmill_driven_orthosis: 1.5,
    end_effector_trainer: 1,
  },
  E: { manual_bwstt: 1, overground_bws: 1, conventional_overground: 1, signal_driven_exoskeleton: 1 },
};

export function chooseDevice(random: Random, site: SiteProfile, grade: Grade): DeviceClass {
  const weights = suitable[grade];
  return random.weighted<DeviceClass>(
    Object.fromEntries(site.devices.flatMap((device) => (weights[device] ? [[device, weights[device]]] : []))),
  );
}

/** Devices in which the tests of walking are also done with the device on. */
export function isPowered(device: DeviceClass): boolean {
  return device === 'overground_powered_exoskeleton' || device === 'signal_driven_exoskeleton';
}

export interface BoutSituation {
  readonly device: DeviceClass;
  /** Walking speed without the device, m/s; 0 for a person who does not walk. */
  readonly ability: number;
  /** 0 to 1 through the course. */
  readonly progress: number;
  /** How apt the person is with the device, from -1 to 1. */
  readonly aptitude: number;
  readonly onTreadmill: boolean;
  readonly legs: { readonly right: SideSheet; readonly left: SideSheet };
}

/**
 * Walking speed in training, m/s. In powered exoskeletons 0.12-0.20 in the first and 0.17-0.30 in the last session
 * (Gagnon et al., J Neuroeng Rehabil 2018, doi 10.1186/s12984-018-0354-2), with braces about 0.06 (Wu et al., same journal 2018,
 * doi 10.1186/s12984-018-0355-1); on treadmills the speeds usual in trials.
 */
const usualSpeed: Readonly<Record<DeviceClass, (situation: BoutSituation) => number>> = {
  treadmill_driven_orthosis: ({ progress, aptitude }) => clamp(0.42 + 0.14 * progress + 0.05 * aptitude, 0.35, 0.7),
  end_effector_trainer: ({ progress, aptitude }) => clamp(0.36 + 0.16 * progress + 0.05 * aptitude, 0.3, 0.65),
  manual_bwstt: ({ ability, progress }) => clamp(0.26 + 0.6 * ability + 0.15 * progress, 0.2, 1.1),
  overground_powered_exoskeleton: ({ progress, aptitude }) => clamp(0.15 + 0.12 * progress + 0.03 * aptitude, 0.09, 0.4),
  signal_driven_exoskeleton: ({ ability, progress, onTreadmill }) =>
    (onTreadmill ? 1 : 0.75) * clamp(0.28 + 0.5 * ability + 0.2 * progress, 0.2, 1),
  overground_bws: ({ ability }) => clamp(0.08 + 0.75 * ability, 0.12, 1.1),
  fes_walking: ({ ability, progress }) => clamp(0.12 + 0.1 * progress + 0.2 * ability, 0.1, 0.5),
  passive_orthosis: ({ progress, aptitude }) => clamp(0.07 + 0.04 * progress + 0.01 * aptitude, 0.06, 0.15),
  conventional_overground: ({ ability }) => clamp(0.85 * ability, 0.1, 1.2),
};

export function trainingSpeed(random: Random, situation: BoutSituation): number {
  return usualSpeed[situation.device](situation) * random.between(0.94, 1.06);
}

const alwaysOnTreadmill = new Set<DeviceClass>(['treadmill_driven_orthosis', 'end_effector_trainer', 'manual_bwstt']);

export function usesTreadmill(random: Random, device: DeviceClass): boolean {
  return alwaysOnTreadmill.has(device) || (device === 'signal_driven_exoskeleton' && random.chance(0.6));
}

function surfaceOf(random: Random, { device, onTreadmill, ability }: BoutSituation): string {
  if (onTreadmill) return 'treadmill';
  if (device !== 'conventional_overground' || ability < 0.4) return 'overground_level';
  return random.weighted({ overground_level: 75, ramp: 8, stairs: 4, outdoor: 13 });
}

/** Weight support in per cent at the start and at the end of a course. */
const supportFromTo: Readonly<Partial<Record<DeviceClass, readonly [number, number]>>> = {
  treadmill_driven_orthosis: [55, 30],
  end_effector_trainer: [45, 25],
  manual_bwstt: [45, 15],
  overground_bws: [35, 10],
};

/** Share of the body weight taken by a support, in per cent; none in devices that stand on the ground. */
function supportPercent(random: Random, { device, progress }: BoutSituation): number | null {
  const range = supportFromTo[device];
  if (!range) return null;
  const [from, to] = range;
  return Math.round(from + (to - from) * progress + random.between(-4, 4));
}

type Joint = 'hip' | 'knee';

/** The own signal drives a joint whose muscle moves; where it does not, the device moves it. */
function signalControl(muscles: readonly number[], joint: Joint): string {
  const strength = muscles[firstLegMuscle + (joint === 'hip' ? 0 : 1)] ?? 0;
  if (strength >= 2) return 'volitional';
  return strength === 1 ? 'volitional_threshold' : 'programmed';
}

function jointControl({ device, progress, legs }: BoutSituation, joint: Joint, side: 'right' | 'left'): string {
  switch (device) {
    case 'treadmill_driven_orthosis':
      return progress > 0.5 && (legs[side].muscles[firstLegMuscle] ?? 0) > 1 ? 'assist_as_needed' : 'programmed';
    case 'overground_powered_exoskeleton':
      return 'programmed';
    case 'signal_driven_exoskeleton':
      return signalControl(legs[side].muscles, joint);
    case 'fes_walking':
      return joint === 'knee' ? 'stimulated' : 'absent';
    case 'passive_orthosis':
      return joint === 'knee' ? 'locked' : 'passive';
    case 'end_effector_trainer':
    case 'manual_bwstt':
    case 'overground_bws':
    case 'conventional_overground':
      return 'absent';
  }
}

const ankles: Readonly<Partial<Record<DeviceClass, string>>> = {
  treadmill_driven_orthosis: 'passive',
  overground_powered_exoskeleton: 'passive',
  end_effector_trainer: 'programmed',
  passive_orthosis: 'locked',
};

const withGain = new Set(['volitional', 'volitional_threshold', 'assist_as_needed']);

/** Control of each joint, and the assistance where it can be set. */
export function jointCells(random: Random, situation: BoutSituation): Cells {
  const gain = clamp(Math.round((80 - 40 * situation.progress + random.between(-10, 10)) / 5) * 5, 10, 100);
  const cells: Record<string, string | number | null> = {};
  for (const joint of ['hip', 'knee'] as const) {
    for (const side of ['right', 'left'] as const) {
      const control = jointControl(situation, joint, side);
      cells[`${joint}_${side.charAt(0)}_control`] = control;
      if (withGain.has(control)) cells[`${joint}_${side.charAt(0)}_gain_pct`] = gain;
    }
  }
  const ankle = ankles[situation.device] ?? null;
  return { ...cells, ankle_r_control: ankle, ankle_l_control: ankle };
}

export function followsSignal(joints: Cells): boolean {
  return Object.values(joints).includes('volitional');
}

const deviceAids: Readonly<Partial<Record<DeviceClass, string>>> = {
  overground_powered_exoskeleton: 'walker',
  fes_walking: 'walker',
  passive_orthosis: 'walker',
  overground_bws: 'none',
};

/** Cells of a walking bout that follow from the device. `aid` is the aid the person walks with in daily life. */
export function settingCells(random: Random, situation: BoutSituation, massKg: number, dailyAid: string): Cells {
  const { device, onTreadmill, progress } = situation;
  const support = supportPercent(random, situation);
  const driven = device === 'treadmill_driven_orthosis';
  const late = progress > 0.5 && device === 'overground_powered_exoskeleton';
  return {
    surface: surfaceOf(random, situation),
    bws_pct: support,
    bws_kg: support === null ? null : rounded((support * massKg) / 100, 1),
    guidance_pct: driven ? clamp(Math.round((100 - 50 * progress) / 5) * 5 + random.pick([-5, 0, 0, 5]), 30, 100) : null,
    stim_on: device === 'fes_walking' ? 'yes' : null,
    stim_channels: device === 'fes_walking' ? random.pick([4, 6, 8]) : null,
    aid: onTreadmill ? null : late ? 'two_crutches' : (deviceAids[device] ?? dailyAid),
    assist_persons:
      { manual_bwstt: 2, conventional_overground: random.whole(0, 1) }[device as string] ?? (progress < 0.6 ? 1 : random.whole(0, 1)),
  };
}
