/** Code lists that more than one column uses. */
import type { Code } from './types.ts';

/** A code list from codes and their labels. */
export const codeList = (labels: Readonly<Record<string, string>>): readonly Code[] =>
  Object.entries(labels).map(([code, label]) => ({ code, label }));

export const flagCodes = codeList({ yes: 'yes', no: 'no' });

export const deviceClasses = codeList({
  treadmill_driven_orthosis: 'driven orthosis on a treadmill with weight support',
  overground_powered_exoskeleton: 'powered exoskeleton overground, steps triggered by weight shift or button',
  signal_driven_exoskeleton: "exoskeleton whose torque follows the wearer's surface muscle signal",
  end_effector_trainer: 'foot plates that move the feet',
  manual_bwstt: 'weight-supported treadmill, legs moved by therapists',
  overground_bws: 'overground with ceiling or frame support',
  fes_walking: 'walking with functional electrical stimulation',
  passive_orthosis: 'unpowered braces',
  conventional_overground: 'conventional overground walking',
});

export const jointControls = codeList({
  volitional: "follows the person's own muscle signal",
  volitional_threshold: 'own muscle signal starts a preset step',
  programmed: 'preset trajectory',
  assist_as_needed: 'device helps as far as needed',
  passive: 'moved freely by the leg',
  locked: 'locked',
  stimulated: 'moved by electrical stimulation',
  absent: 'joint not in the device',
});

export const walkingAids = codeList({
  none: 'none',
  bars: 'parallel bars',
  walker: 'walker',
  two_crutches: 'two crutches',
  one_crutch: 'one crutch',
  stick: 'one stick',
});

export const postures = codeList({ supine: 'supine', sitting: 'sitting', standing: 'standing', in_device: 'upright in the device' });

/** Each code is the measure's key without its beginning `rpe_`. */
export const exertionScales = codeList({ cr10: '0-10 category-ratio scale', '6_20': '6-20 scale' });

export const decisions = codeList({ present: 'present', absent: 'absent', not_assessed: 'not assessed' });

export const skinChecks = codeList({
  intact: 'intact',
  redness_fades: 'redness that fades within 30 minutes',
  redness_stays: 'redness that stays longer than 30 minutes',
  broken: 'skin broken',
});

export const bodySites = codeList({
  shoulder: 'shoulder',
  upper_arm: 'upper arm',
  elbow: 'elbow',
  forearm_wrist: 'forearm or wrist',
  hand_thumb: 'hand or thumb',
  neck: 'neck',
  trunk: 'trunk',
  spine: 'spine',
  sacrum: 'sacrum',
  ischium: 'ischium',
  trochanter: 'trochanter',
  pelvis_hip: 'pelvis or hip',
  thigh: 'thigh',
  knee: 'knee',
  lower_leg: 'lower leg',
  ankle: 'ankle',
  heel: 'heel',
  foot_toes: 'foot or toes',
  other: 'other',
});
