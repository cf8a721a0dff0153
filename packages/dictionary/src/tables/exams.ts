import { codeList, flagCodes } from '../code-lists.ts';
import { defineTable } from '../define-table.ts';
import type { VariableDraft } from '../define-table.ts';
import { dermatomes, keyMuscles, segmentKey, spinalLevels } from '../neurological-levels.ts';
import { sources } from '../sources.ts';
import type { Code } from '../types.ts';
import { participantVariable, studyDayRange } from './shared-variables.ts';

const sides = [
  { key: 'r', word: 'right' },
  { key: 'l', word: 'left' },
] as const;

const modalities = [
  { key: 'lt', name: 'Light touch' },
  { key: 'pp', name: 'Pin prick' },
] as const;

const asNotNormal = 'affected by another condition, treated as not normal';
const asNormal = 'affected by another condition, treated as normal';

/** Scores of a cell: plain, then with one star (treated as not normal), then with two (treated as normal). */
function scoreCodes(grades: readonly Code[], highestTagged: number): Code[] {
  const tagged = grades.slice(0, highestTagged + 1);
  return [
    ...grades,
    ...tagged.map(({ code, label }) => ({ code: `${code}*`, label: `${label}; ${asNotNormal}` })),
    ...tagged.map(({ code, label }) => ({ code: `${code}**`, label: `${label}; ${asNormal}` })),
  ];
}

const notTestable: readonly Code[] = [
  { code: 'NT', label: 'not testable' },
  { code: 'NT*', label: `not testable; ${asNotNormal}` },
  { code: 'NT**', label: `not testable; ${asNormal}` },
];

const sensoryCodes = scoreCodes(codeList({ '0': 'absent', '1': 'altered', '2': 'normal' }), 1);

const motorCodes = scoreCodes(
  codeList({
    '0': 'no contraction',
    '1': 'flicker',
    '2': 'full movement with gravity removed',
    '3': 'full movement against gravity',
    '4': 'full movement against some resistance',
    '5': 'full movement against full resistance',
  }),
  4,
);

const sensoryCells: readonly VariableDraft[] = modalities.flatMap((modality) =>
  sides.flatMap((side) =>
    dermatomes.map((dermatome): VariableDraft => ({
      key: `${modality.key}_${side.key}_${segmentKey(dermatome)}`,
      name: `${modality.name}, ${side.word}, ${dermatome}`,
      definition: `${modality.name} in the ${dermatome} dermatome on the ${side.word}. A star says that another condition affects the score, and how the score is to be treated.`,
      type: 'code',
      codes: sensoryCodes,
      missingCodes: notTestable,
      required: { when: 'always' },
      better: 'higher',
      exposure: 'quasi-identifier',
      aliases: [`${modality.key}${side.key}_${segmentKey(dermatome)}`],
      source: sources.isncsci,
    })),
  ),
);

const muscleCells: readonly VariableDraft[] = sides.flatMap((side) =>
  keyMuscles.map(({ segment, movement }): VariableDraft => ({
    key: `m_${side.key}_${segmentKey(segment)}`,
    name: `Key muscle, ${side.word}, ${segment}`,
    definition: `Strength of the ${movement} (${segment}) on the ${side.word}. A star says that another condition affects the score, and how the score is to be treated.`,
    type: 'code',
    codes: motorCodes,
    missingCodes: notTestable,
    required: { when: 'always' },
    better: 'higher',
    exposure: 'quasi-identifier',
    aliases: [`motor_${side.key}_${segmentKey(segment)}`],
    source: sources.isncsci,
  })),
);

const segmentCodes = keyMuscles.map(({ segment }) => ({ code: segment, label: segment }));

const nonKeyMuscles: readonly VariableDraft[] = sides.map((side) => ({
  key: `non_key_${side.key}`,
  name: `Lowest non-key muscle, ${side.word}`,
  definition: `Lowest segment on the ${side.word} at which a muscle other than the key muscles moves. Leave it empty when none was looked for or found.`,
  type: 'code',
  codes: segmentCodes,
  required: { when: 'optional' },
  exposure: 'quasi-identifier',
  aliases: [`lowest_non_key_${side.word}`],
  source: sources.isncsci,
}));

const answerNotTestable = codeList({ NT: 'not testable' });
const notDetermined = codeList({ ND: 'could not be determined' });

export const exams = defineTable({
  key: 'exams',
  name: 'Neurological exams',
  definition:
    'One row for each neurological exam after the international standard (ISNCSCI). The registry computes levels and grade from the cells.',
  rowKey: ['participant', 'exam_day'],
  studyDay: 'exam_day',
  variables: [
    participantVariable,
    {
      key: 'exam_day',
      name: 'Day of the exam',
      definition: 'Study day of the exam. Days before the first training day are negative.',
      type: 'integer',
      unit: 'days',
      hard: studyDayRange,
      plausible: { min: -365, max: 3_650 },
      required: { when: 'always' },
      exposure: 'time',
      aliases: ['isncsci_day'],
      source: sources.registry,
    },
    ...sensoryCells,
    ...muscleCells,
    {
      key: 'vac',
      name: 'Voluntary anal contraction',
      definition: 'Whether the anal sphincter contracts at will.',
      type: 'code',
      codes: flagCodes,
      missingCodes: answerNotTestable,
      required: { when: 'always' },
      exposure: 'quasi-identifier',
      aliases: ['voluntary_anal_contraction'],
      source: sources.isncsci,
    },
    {
      key: 'dap',
      name: 'Deep anal pressure',
      definition: 'Whether pressure inside the anus is felt. It may be left untested when touch or pin prick is felt at S4-5.',
      type: 'code',
      codes: flagCodes,
      missingCodes: answerNotTestable,
      required: { when: 'always' },
      exposure: 'quasi-identifier',
      aliases: ['deep_anal_pressure'],
      source: sources.isncsci,
    },
    ...nonKeyMuscles,
    {
      key: 'earlier_deficit',
      name: 'Earlier deficit on record',
      definition: 'Whether an earlier exam showed a deficit from the injury. Without one, a normal exam gets no grade rather than grade E.',
      type: 'flag',
      required: { when: 'always' },
      exposure: 'measurement',
      source: `${sources.isncsci}; reading from memory`,
    },
    {
      key: 'nt_reason',
      name: 'Why cells were not testable',
      definition: 'Main reason why one or more cells could not be tested. Leave it empty when every cell was tested.',
      type: 'code',
      codes: codeList({
        sacral_sparing_felt: 'deep anal pressure skipped because touch or pin prick is felt at S4-5',
        cast_or_dressing: 'cast, brace or dressing in the way',
        pain: 'pain',
        amputation: 'amputation',
        contracture: 'contracture',
        cooperation: 'person could not take part',
        declined: 'person declined',
        medical: 'not allowed for a medical reason',
        other: 'other',
      }),
      required: { when: 'optional' },
      exposure: 'measurement',
      source: sources.isncsci,
    },
    {
      key: 'tag_cause',
      name: 'Condition behind the stars',
      definition: 'Main condition other than the spinal cord injury that affects starred cells. Leave it empty when no cell has a star.',
      type: 'code',
      codes: codeList({
        peripheral_nerve: 'peripheral nerve injury',
        brachial_plexus: 'injury of the brachial plexus',
        fracture_or_cast: 'fracture or cast',
        burn_or_scar: 'burn or scar',
        pain: 'pain',
        amputation: 'amputation',
        contracture: 'contracture',
        brain_injury: 'brain injury',
        other_neurological: 'other neurological condition',
        other: 'other',
      }),
      required: { when: 'optional' },
      exposure: 'measurement',
      source: sources.tags,
    },
    {
      key: 'examiner_role',
      name: "Examiner's profession",
      definition: 'Profession of the person who examined. Never a name.',
      type: 'code',
      codes: codeList({
        physician: 'physician',
        physiotherapist: 'physiotherapist',
        occupational_therapist: 'occupational therapist',
        nurse: 'nurse',
        other: 'other',
        unknown: 'not known',
      }),
      required: { when: 'always' },
      exposure: 'measurement',
      aliases: ['examiner'],
      source: sources.isncsci,
    },
    {
      key: 'recorded_ais',
      name: 'AIS grade the clinic recorded',
      definition: 'AIS grade that the clinic wrote down. The registry computes its own and reports a difference.',
      type: 'code',
      codes: codeList({
        A: 'complete',
        B: 'sensory incomplete',
        C: 'motor incomplete, under half of the key muscles below the level at grade 3 or more',
        D: 'motor incomplete, half or more of the key muscles below the level at grade 3 or more',
        E: 'normal after an earlier deficit',
      }),
      missingCodes: notDetermined,
      required: { when: 'optional' },
      exposure: 'quasi-identifier',
      aliases: ['ais', 'asia_grade'],
      source: sources.isncsci,
    },
    {
      key: 'recorded_nli',
      name: 'Neurological level the clinic recorded',
      definition: 'Neurological level of injury that the clinic wrote down. The registry computes its own and reports a difference.',
      type: 'code',
      codes: [...spinalLevels.map((level) => ({ code: level, label: level })), { code: 'INT', label: 'intact' }],
      missingCodes: notDetermined,
      required: { when: 'optional' },
      exposure: 'quasi-identifier',
      aliases: ['nli', 'neurological_level'],
      source: sources.isncsci,
    },
    {
      key: 'non_sci_affects',
      name: 'Results touched by another condition',
      definition: 'Whether a condition other than the spinal cord injury affects the level, the grade, both or neither.',
      type: 'code',
      codes: codeList({ none: 'neither', nli: 'the level', ais: 'the grade', both: 'both' }),
      required: { when: 'optional' },
      exposure: 'measurement',
      source: sources.coreDataSet,
    },
  ],
});
