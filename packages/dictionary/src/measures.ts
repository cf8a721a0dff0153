/**
 * The 33 outcome measures: what each is, its limits, and the published sizes of change.
 * Scores only; no instrument's wording. Limits are set by this registry to catch entry errors, unless the instrument itself has them.
 * Thresholds are sizes of change in the better direction; where no figure for spinal cord injury was found, none is given.
 */
import { distanceUnits, secondUnits, speedUnits } from './accepted-units.ts';
import type { Confidence, Measure, Range, Threshold } from './types.ts';

const none: Measure['thresholds'] = { mdc: [], mcid: [] };

const courseTiming = ['baseline', 'every 20 sessions or mid-course', 'end of course', '3, 6 and 12 months after'];
const lifeTiming = ['baseline', 'end of course', '6 and 12 months after'];
const exertionTiming = ['end of each bout or session'];
const pressureTiming = ['before, during and after each session'];

const noLicence = 'No licence is known to be needed to record a score (from memory).';
const scimLicence = 'The authors keep the rights; clinical use is free (from memory). Scores only.';
const inventoryLicence = "Ask the owners before showing any of the instrument's wording (from memory).";
const exertionLicence = 'The owner asks for permission to print the scale (from memory). The number only.';
const internationalLicence = 'Data set of the international societies, free to use (from memory).';

const walkingCautions = [
  'Only after medical clearance to stand and walk. Guard the person, and stop at signs of low or high blood pressure.',
  'Record the aid, brace, persons helping, and whether a powered training device was worn.',
];

const instrumentRange = "The instrument's own range of scores";
const registryLimits = 'limits set by this registry to catch entry errors';
const vanHedel = 'van Hedel HJ, Wirz M, Dietz V. Arch Phys Med Rehabil 2005;86:190-6';
const qualityOfLifeSource = 'Charlifue S et al. Spinal Cord 2012;50:672-5; Post MWM et al. Spinal Cord 2019, doi 10.1038/s41393-019-0302-4';
const ashworthSource = 'Baunsgaard CB et al. Spinal Cord 2016;54:702-8';

const lam = 'Lam T, Noonan VK, Eng JJ. Spinal Cord 2008;46:246-54';
const forrest = 'Forrest GF et al. PLoS ONE 2014;9(5):e94108';
const scivoletto2013 = 'Scivoletto G et al. Disabil Rehabil 2013;35(21):1808-13';
const scivoletto2013motor = 'Scivoletto G et al. Eur J Phys Rehabil Med 2013;49(3):373-84';
const scivoletto2014 = 'Scivoletto G et al. Spinal Cord 2014;52:65-69';
const corallo = 'Corallo V et al. Eur J Phys Rehabil Med 2017;53(4):508-15';

function threshold(
  value: Threshold['value'],
  unit: string,
  population: string,
  citation: string,
  confidence: Confidence,
  note?: string,
): Threshold {
  return { value, unit, population, citation, confidence, ...(note === undefined ? {} : { note }) };
}

const halfRemembered = 'paper-looked-up-figure-from-memory';

type MeasureDraft = Omit<Measure, 'since' | 'meanIsCustomary' | 'scoredWhenStoppedEarly' | 'entered' | 'thresholds' | 'cautions'> &
  Partial<Pick<Measure, 'meanIsCustomary' | 'scoredWhenStoppedEarly' | 'entered' | 'thresholds' | 'cautions'>>;

function measure(draft: MeasureDraft): Measure {
  return {
    meanIsCustomary: draft.scale !== 'ordinal',
    scoredWhenStoppedEarly: false,
    entered: true,
    thresholds: none,
    cautions: [],
    ...draft,
    since: '1.0',
  };
}

type ScoreDraft = Omit<MeasureDraft, 'scale' | 'hard' | 'plausible' | 'decimals' | 'step'>;

/** A whole-number score with the instrument's own range, in which every value is plausible. */
function score(min: number, max: number, draft: ScoreDraft): Measure {
  const range: Range = { min, max, step: 1 };
  return measure({ ...draft, scale: 'ordinal', hard: range, plausible: { min, max }, decimals: 0, step: 1 });
}

const walkTest = {
  unit: 'm/s',
  scale: 'ratio',
  better: 'higher',
  decimals: 2,
  step: 0.01,
  acceptedUnits: speedUnits,
  timing: courseTiming,
  licence: noLicence,
  cautions: walkingCautions,
} as const;
const scimPart = {
  unit: 'points',
  better: 'higher',
  meanIsCustomary: true,
  timing: courseTiming,
  licence: scimLicence,
  source: instrumentRange,
} as const;
const inventory = { better: 'higher', timing: courseTiming, licence: inventoryLicence, source: `${instrumentRange}, from memory` } as const;
const qualityOfLife = {
  unit: 'points',
  better: 'higher',
  timing: lifeTiming,
  licence: internationalLicence,
  source: qualityOfLifeSource,
} as const;
const heartRate = {
  unit: 'beats/min',
  scale: 'count',
  better: 'neutral',
  decimals: 0,
  step: 1,
  licence: noLicence,
  source: `Common practice, from memory; ${registryLimits}`,
} as const;
const pressure = {
  unit: 'mmHg',
  scale: 'ratio',
  better: 'neutral',
  decimals: 0,
  step: 1,
  timing: pressureTiming,
  licence: noLicence,
} as const;

export const measures: readonly Measure[] = [
  measure({
    ...walkTest,
    key: 'tmwt_ss',
    name: '10-metre walk test, self-selected speed',
    definition: 'Walking speed at a comfortable pace over a timed distance of 6 or 10 metres.',
    hard: { min: 0.01, max: 3 },
    plausible: { min: 0.05, max: 1.8 },
    thresholds: {
      mdc: [threshold(0.13, 'm/s', 'spinal cord injury', lam, 'from-memory', 'smallest real difference; the figure was not confirmed')],
      mcid: [
        threshold(
          0.06,
          'm/s',
          'incomplete spinal cord injury',
          'Musselman KE. Phys Ther Rev 2007;12:287-96',
          'from-memory',
          'small change; citation from memory too',
        ),
        threshold(0.15, 'm/s', 'AIS C and D, 249 people', forrest, halfRemembered),
      ],
    },
    source: `${vanHedel}; ${registryLimits}`,
  }),
  measure({
    ...walkTest,
    key: 'tmwt_fast',
    name: '10-metre walk test, fast speed',
    definition: 'Walking speed as fast as is safe over a timed distance of 6 or 10 metres.',
    hard: { min: 0.01, max: 4 },
    plausible: { min: 0.05, max: 2.5 },
    thresholds: { mdc: [threshold(0.13, 'm/s', 'spinal cord injury', lam, 'from-memory', 'usually quoted for both speeds')], mcid: [] },
    source: `${vanHedel}; ${registryLimits}`,
  }),
  measure({
    key: 'six_mwt',
    name: '6-minute walk test',
    definition: 'Distance walked in six minutes, rests included. A test that ended early still has a distance.',
    unit: 'm',
    scale: 'ratio',
    hard: { min: 0, max: 1_000 },
    plausible: { min: 3, max: 700 },
    better: 'higher',
    decimals: 1,
    step: 0.1,
    acceptedUnits: distanceUnits,
    scoredWhenStoppedEarly: true,
    timing: courseTiming,
    thresholds: {
      mdc: [
        threshold(
          45.8,
          'm',
          'spinal cord injury',
          lam,
          'from-memory',
          'a case series of 2020 counts 44.65 m as above it, so a smaller figure is in use',
        ),
      ],
      mcid: [threshold(0.11, 'm/s', 'AIS C and D', forrest, halfRemembered, 'as a speed over the six minutes, about 40 m')],
    },
    licence: noLicence,
    cautions: [...walkingCautions, 'Record heart rate and blood pressure before and after.'],
    source: `${vanHedel}; ${registryLimits}`,
  }),
  measure({
    key: 'tug',
    name: 'Timed up and go',
    definition: 'Time to rise from a chair, walk three metres, turn, walk back and sit down.',
    unit: 's',
    scale: 'ratio',
    hard: { min: 2, max: 600 },
    plausible: { min: 5, max: 180 },
    better: 'lower',
    decimals: 1,
    step: 0.1,
    acceptedUnits: secondUnits,
    timing: courseTiming,
    thresholds: { mdc: [threshold(10.8, 's', 'spinal cord injury', lam, 'from-memory')], mcid: [] },
    licence: noLicence,
    cautions: [...walkingCautions, 'Blood pressure may drop on rising from the chair.'],
    source: `${vanHedel}; ${registryLimits}`,
  }),
  score(0, 20, {
    key: 'wisci2',
    name: 'Walking Index for Spinal Cord Injury II',
    definition: 'Level that names the aid, brace and help a person needs to walk 10 metres, from 0 (cannot) to 20 (needs none).',
    unit: 'levels',
    better: 'higher',
    timing: courseTiming,
    thresholds: {
      mdc: [
        threshold(1.147, 'levels', 'acute tetraplegia, maximum level', scivoletto2014, 'looked-up'),
        threshold(
          1.682,
          'levels',
          'acute paraplegia, maximum level',
          scivoletto2014,
          'looked-up',
          'the authors call two levels a real change',
        ),
      ],
      mcid: [],
    },
    licence: 'Free of charge when the authors are credited (from memory). Levels only.',
    cautions: walkingCautions,
    source: instrumentRange,
  }),
  score(0, 100, {
    ...scimPart,
    key: 'scim3_total',
    name: 'Spinal Cord Independence Measure III, total',
    definition: 'Independence in daily activities: the sum of the four parts of the instrument.',
    derivedFrom: 'scim3_self_care + scim3_resp_sphincter + scim3_mobility_room + scim3_mobility_in_out',
    thresholds: {
      mdc: [],
      mcid: [
        threshold(4, 'points', '255 inpatients, small improvement', scivoletto2013, 'looked-up'),
        threshold(10, 'points', '255 inpatients, substantial improvement', scivoletto2013, 'looked-up'),
        threshold(
          { min: 12, max: 45.3 },
          'points',
          'from complete tetraplegia to incomplete thoracic injury, anchor based',
          corallo,
          'looked-up',
        ),
      ],
    },
    cautions: ['Some reports print the mobility part as the whole instrument. Name which one was scored.'],
  }),
  score(0, 20, {
    ...scimPart,
    key: 'scim3_self_care',
    name: 'SCIM III, self-care',
    definition: 'Independence in feeding, washing, dressing and grooming.',
    thresholds: { mdc: [], mcid: [threshold({ min: 3.3, max: 8.5 }, 'points', 'by level and severity', corallo, 'looked-up')] },
  }),
  score(0, 40, {
    ...scimPart,
    key: 'scim3_resp_sphincter',
    name: 'SCIM III, respiration and sphincter management',
    definition: 'Independence in breathing, bladder, bowel and use of the toilet.',
    thresholds: { mdc: [], mcid: [threshold({ min: 10, max: 18 }, 'points', 'by level and severity', corallo, 'looked-up')] },
  }),
  score(0, 10, {
    ...scimPart,
    key: 'scim3_mobility_room',
    name: 'SCIM III, mobility in room and toilet',
    definition: 'Independence in bed and in transfers within the room.',
    thresholds: { mdc: [], mcid: [threshold({ min: 1, max: 3 }, 'points', 'by level and severity', corallo, 'looked-up')] },
  }),
  score(0, 30, {
    ...scimPart,
    key: 'scim3_mobility_in_out',
    name: 'SCIM III, mobility indoors and outdoors',
    definition: 'Independence in moving about indoors and outdoors, stairs included.',
    thresholds: { mdc: [], mcid: [threshold({ min: 2.5, max: 7.26 }, 'points', 'by level and severity', corallo, 'looked-up')] },
  }),
  score(0, 40, {
    ...scimPart,
    key: 'scim3_mobility',
    name: 'SCIM III, mobility, both parts',
    definition: 'Sum of the two mobility parts of the instrument.',
    derivedFrom: 'scim3_mobility_room + scim3_mobility_in_out',
    cautions: ['Some reports print this part as the whole instrument: a total that never passes 40 is probably this one.'],
  }),
  score(0, 56, {
    key: 'bbs',
    name: 'Berg Balance Scale',
    definition: 'Balance in sitting and standing tasks.',
    unit: 'points',
    better: 'higher',
    meanIsCustomary: true,
    timing: courseTiming,
    licence: noLicence,
    cautions: [
      'Guard the person. Not for people who need much help to stand.',
      'Good walkers reach the top of the scale: 28% of 46 chronic walkers did (Joergensen V et al. Phys Ther 2017, doi 10.1093/ptj/pzx030).',
    ],
    source: 'Lemay JF, Nadeau S. Spinal Cord 2010;48:245-50',
  }),
  score(0, 50, {
    key: 'lems',
    name: 'Lower extremity motor score',
    definition: 'Sum of the grades of the ten key muscles of the legs. It cannot be given when one of them was not testable.',
    unit: 'points',
    better: 'higher',
    meanIsCustomary: true,
    derivedFrom: 'the ten leg key muscles of the neurological exam',
    timing: courseTiming,
    thresholds: { mdc: [threshold(3.66, 'points', '600 inpatients', scivoletto2013motor, halfRemembered)], mcid: [] },
    licence: noLicence,
    source: 'ISNCSCI, 2019 revision',
  }),
  score(0, 50, {
    key: 'uems',
    name: 'Upper extremity motor score',
    definition: 'Sum of the grades of the ten key muscles of the arms. It cannot be given when one of them was not testable.',
    unit: 'points',
    better: 'higher',
    meanIsCustomary: true,
    derivedFrom: 'the ten arm key muscles of the neurological exam',
    timing: courseTiming,
    thresholds: { mdc: [threshold(2.72, 'points', '600 inpatients', scivoletto2013motor, halfRemembered)], mcid: [] },
    licence: noLicence,
    source: 'ISNCSCI, 2019 revision',
  }),
  measure({
    key: 'mas',
    name: 'Modified Ashworth Scale',
    definition:
      'Resistance of one muscle group on one side to passive stretch. The grade 1+ lies between 1 and 2 and is stored as 1.5, for order only.',
    unit: 'grades',
    scale: 'ordinal',
    hard: { min: 0, max: 4, step: 0.5 },
    plausible: { min: 0, max: 4 },
    grades: [
      { written: '0', stored: 0 },
      { written: '1', stored: 1 },
      { written: '1+', stored: 1.5 },
      { written: '2', stored: 2 },
      { written: '3', stored: 3 },
      { written: '4', stored: 4 },
    ],
    better: 'lower',
    decimals: 1,
    step: 0.5,
    timing: courseTiming,
    licence: noLicence,
    cautions: [
      'Agreement between raters is poor: keep the same rater, and never average over muscles.',
      'Grades have an order, not distances: no means.',
    ],
    source: ashworthSource,
  }),
  score(0, 4, {
    key: 'psfs_freq',
    name: 'Penn Spasm Frequency Scale, frequency',
    definition: 'How often spasms occur, in the words of the person.',
    unit: 'grades',
    better: 'lower',
    timing: courseTiming,
    licence: noLicence,
    source: ashworthSource,
  }),
  score(1, 3, {
    key: 'psfs_severity',
    name: 'Penn Spasm Frequency Scale, severity',
    definition: 'How severe spasms are. Not asked when there are none.',
    unit: 'grades',
    better: 'lower',
    timing: courseTiming,
    licence: noLicence,
    source: `${instrumentRange}`,
  }),
  score(0, 10, {
    key: 'pain_nrs',
    name: 'Pain intensity, numeric rating',
    definition: 'Pain from 0 (none) to 10 (worst imaginable), now or on average over seven days.',
    unit: 'points',
    better: 'lower',
    timing: ['before and after each session', ...courseTiming],
    thresholds: {
      mdc: [],
      mcid: [
        threshold(
          1.8,
          'points',
          '82 people with spinal cord injury and 34 with amputation',
          'Hanley MA et al. Clin J Pain 2006;22:25-31',
          'looked-up',
          'or about 36%; the authors back about 33% as a general standard',
        ),
      ],
    },
    licence: noLicence,
    source: instrumentRange,
  }),
  measure({
    ...walkTest,
    key: 'speed_derived',
    name: 'Walking speed from a timed distance',
    definition: 'Distance divided by time, computed by the registry.',
    hard: { min: 0, max: 4 },
    plausible: { min: 0.03, max: 2.5 },
    decimals: 3,
    step: 0.001,
    derivedFrom: 'distance ÷ time',
    entered: false,
    cautions: [],
    source: `This registry; ${registryLimits}`,
  }),
  score(1, 7, {
    key: 'fim_locomotion',
    name: 'FIM, locomotion item',
    definition: 'Help needed to walk or to use a wheelchair, from 1 (total) to 7 (none). Optional.',
    unit: 'grades',
    better: 'higher',
    timing: courseTiming,
    licence: 'Proprietary; only licensed sites may record it (from memory).',
    cautions: [
      'Only grades for walking enter gait statistics.',
      'Experts saw little value in it for research on spinal cord injury (Jackson AB et al. J Spinal Cord Med 2008;31:487-99).',
    ],
    source: instrumentRange,
  }),
  score(0, 20, {
    ...inventory,
    key: 'sci_fai_gait',
    name: 'SCI Functional Ambulation Inventory, gait',
    definition: 'Observed quality of gait. Optional.',
    unit: 'points',
  }),
  score(0, 14, {
    ...inventory,
    key: 'sci_fai_aid',
    name: 'SCI Functional Ambulation Inventory, aids',
    definition: 'Walking aids used. Optional.',
    unit: 'points',
  }),
  score(0, 5, {
    ...inventory,
    key: 'sci_fai_mobility',
    name: 'SCI Functional Ambulation Inventory, walking mobility',
    definition: 'Usual walking in daily life. Optional.',
    unit: 'grades',
    cautions: ['A report may print only this part as the whole instrument.'],
  }),
  score(0, 10, {
    ...qualityOfLife,
    key: 'qol_life',
    name: 'International SCI Quality of Life Basic Data Set, life as a whole',
    definition: 'Satisfaction with life as a whole, from 0 to 10.',
  }),
  score(0, 10, {
    ...qualityOfLife,
    key: 'qol_physical',
    name: 'International SCI Quality of Life Basic Data Set, physical health',
    definition: 'Satisfaction with physical health, from 0 to 10.',
  }),
  score(0, 10, {
    ...qualityOfLife,
    key: 'qol_psychological',
    name: 'International SCI Quality of Life Basic Data Set, psychological health',
    definition: 'Satisfaction with psychological health, from 0 to 10.',
  }),
  score(0, 10, {
    ...qualityOfLife,
    key: 'qol_social',
    name: 'International SCI Quality of Life Basic Data Set, social life',
    definition: 'Satisfaction with social life, from 0 to 10. Asked since version 2.0 of the data set.',
  }),
  measure({
    key: 'rpe_cr10',
    name: 'Perceived exertion, 0-10 category-ratio scale',
    definition: 'How hard the effort felt on the category-ratio scale.',
    unit: 'points',
    scale: 'ordinal',
    hard: { min: 0, max: 10, step: 0.5 },
    plausible: { min: 0, max: 10 },
    better: 'neutral',
    decimals: 1,
    step: 0.5,
    timing: exertionTiming,
    licence: exertionLicence,
    source: instrumentRange,
  }),
  score(6, 20, {
    key: 'rpe_6_20',
    name: 'Perceived exertion, 6-20 scale',
    definition: 'How hard the effort felt on the scale from 6 to 20.',
    unit: 'points',
    better: 'neutral',
    timing: exertionTiming,
    licence: exertionLicence,
    source: instrumentRange,
  }),
  measure({
    ...heartRate,
    key: 'hr_rest',
    name: 'Resting heart rate',
    definition: 'Heart rate at rest before training.',
    hard: { min: 25, max: 220, step: 1 },
    plausible: { min: 40, max: 110 },
    timing: ['before each session'],
    cautions: ['A slow heart with a rise in blood pressure suggests autonomic dysreflexia.'],
  }),
  measure({
    ...heartRate,
    key: 'hr_exercise',
    name: 'Highest exercise heart rate',
    definition: 'Highest heart rate reached during training.',
    hard: { min: 30, max: 230, step: 1 },
    plausible: { min: 50, max: 190 },
    timing: ['each session'],
    cautions: ['A complete cervical injury often limits it to 100 to 130 (from memory): formulas from age do not apply.'],
  }),
  measure({
    ...pressure,
    key: 'sbp',
    name: 'Systolic blood pressure',
    definition: 'Systolic blood pressure, with the posture it was taken in.',
    hard: { min: 40, max: 320, step: 1 },
    plausible: { min: 75, max: 180 },
    cautions: [
      'Resting pressure is often 15 to 20 mmHg lower after cervical and high thoracic injury, so a usual reading may already be an episode of dysreflexia.',
    ],
    source: `Rehabilitation evidence review on autonomic dysreflexia (pressures up to 300 mmHg); ${registryLimits}`,
  }),
  measure({
    ...pressure,
    key: 'dbp',
    name: 'Diastolic blood pressure',
    definition: 'Diastolic blood pressure, with the posture it was taken in.',
    hard: { min: 20, max: 220, step: 1 },
    plausible: { min: 40, max: 110 },
    source: `Common practice, from memory; ${registryLimits}`,
  }),
];

const byKey = new Map(measures.map((each) => [each.key, each]));

/** The measure with this key, if there is one. */
export function findMeasure(key: string): Measure | undefined {
  return byKey.get(key);
}

/** The measure with this key. Throws a RangeError when there is none. */
export function measureOf(key: string): Measure {
  const found = findMeasure(key);
  if (!found) throw new RangeError('no measure has this key');
  return found;
}
