/** The tables of an export: each column once, with its meaning. CSV, codebook and checks follow from it. */
import { grades } from '@cairnstep/contract';
import { measures, tableOf, variableOf } from '@cairnstep/dictionary';
import { levelGroups } from '@cairnstep/scoring';

export type ExportTableKey = 'participants' | 'outcomes' | 'sessions';

export interface ExportColumn {
  readonly key: string;
  readonly definition: string;
  readonly type: 'pseudonym' | 'code' | 'integer' | 'decimal';
  readonly unit?: string;
  readonly codes?: readonly { readonly code: string; readonly label: string }[];
}

export type ExportCell = string | number | null;

const participant: ExportColumn = {
  key: 'participant',
  definition: 'Code of the person in this export only. It is new in each export and cannot be joined with another.',
  type: 'pseudonym',
};
const bandCodes = (codes: readonly string[]) => codes.map((code) => ({ code, label: code }));
const codesOf = (table: 'participants' | 'sessions' | 'assessments', key: string) => variableOf(table, key)?.codes ?? [];
const attempt = codesOf('assessments', 'attempt_status');
const notGiven = { code: 'not_given', label: 'left out to protect people' };

export const tenYearBands = ['under20', '20to29', '30to39', '40to49', '50to59', '60to69', '70plus'] as const;
export const threeBands = ['under40', '40to59', '60plus'] as const;
export const regions = [
  { code: 'cervical', label: 'C1 to C8' },
  { code: 'thoracic', label: 'T1 to T12' },
  { code: 'lumbosacral', label: 'L1 to S3' },
  { code: 'other', label: 'intact or not determinable' },
];

export const exportTables: Readonly<Record<ExportTableKey, readonly ExportColumn[]>> = {
  participants: [
    participant,
    {
      key: 'level_group',
      definition: 'Neurological level at baseline, grouped as far as protection asks for.',
      type: 'code',
      codes: [
        ...levelGroups.groups.map(({ id, label }) => ({ code: id, label })),
        { code: 'ND', label: 'not determinable' },
        ...regions,
        notGiven,
      ],
    },
    {
      key: 'ais',
      definition: 'AIS grade at baseline, grouped as far as protection asks for.',
      type: 'code',
      codes: [
        ...bandCodes(grades),
        { code: 'AB', label: 'motor complete (A or B)' },
        { code: 'CDE', label: 'motor incomplete or normal (C, D or E)' },
        notGiven,
      ],
    },
    {
      key: 'age_band',
      definition: 'Age at the index date in years, in bands.',
      type: 'code',
      codes: [...bandCodes([...tenYearBands, ...threeBands]), notGiven],
    },
    {
      key: 'sex',
      definition: tableOf('participants').variables.find((one) => one.key === 'sex')?.definition ?? 'Sex.',
      type: 'code',
      codes: [...codesOf('participants', 'sex'), notGiven],
    },
  ],
  outcomes: [
    participant,
    {
      key: 'measure',
      definition: 'Outcome measure.',
      type: 'code',
      codes: measures.map(({ key, name, unit }) => ({ code: key, label: `${name} (${unit})` })),
    },
    {
      key: 'in_device',
      definition: 'Whether it was measured in the training device. Never mix the two.',
      type: 'code',
      codes: bandCodes(['yes', 'no']),
    },
    {
      key: 'baseline_status',
      definition: 'How the attempt at baseline went. Unable is a result, not a missing value.',
      type: 'code',
      codes: attempt,
    },
    { key: 'baseline_value', definition: 'Result at baseline, in the unit of the measure.', type: 'decimal' },
    { key: 'end_status', definition: 'How the attempt at the end of the course went.', type: 'code', codes: attempt },
    { key: 'end_value', definition: 'Result at the end of the course, in the unit of the measure.', type: 'decimal' },
  ],
  sessions: [
    participant,
    { key: 'session_ordinal', definition: 'First, second, third … session of the course.', type: 'integer' },
    {
      key: 'four_week_block',
      definition: 'Four-week block since the first session of the course; 1 is the first. Days are not given.',
      type: 'integer',
    },
    { key: 'status', definition: 'How the session went.', type: 'code', codes: codesOf('sessions', 'status') },
    { key: 'device_class', definition: 'Class of device mainly used.', type: 'code', codes: codesOf('sessions', 'device_class') },
    { key: 'bouts', definition: 'Walking bouts.', type: 'integer' },
    { key: 'walking_min', definition: 'Time walked, the sum of the bouts.', type: 'decimal', unit: 'min' },
    { key: 'distance_m', definition: 'Distance walked, the sum of the bouts.', type: 'decimal', unit: 'm' },
    { key: 'steps', definition: 'Steps, the sum of the bouts.', type: 'integer' },
  ],
};
