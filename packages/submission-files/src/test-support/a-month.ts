/** Small invented months for tests: the dictionary's example rows, which belong together, with what a test changes in them. */
import { dermatomes, exampleParticipant, exampleRow, keyMuscles, segmentKey } from '@cairnstep/dictionary';
import type { Row, TableKey } from '@cairnstep/dictionary';

export type MonthRows = Partial<Record<TableKey, readonly Row[]>>;

export const someone = exampleParticipant;
export const someoneElse = 'S00000000000000000001Z';

const changed =
  (table: TableKey) =>
  (changes: Row = {}): Row => ({ ...exampleRow(table), ...changes });

export const participant = changed('participants');
export const consent = changed('consents');
export const session = changed('sessions');
export const bout = changed('bouts');
export const event = changed('adverse_events');

/** The six basic rows that any data needs to be free of findings, with other rows in their place where given. */
export function month(rows: MonthRows = {}): MonthRows {
  return { participants: [participant()], consents: [consent()], ...rows };
}

const isOneOf = (measure: string, ...measures: string[]): boolean => measures.includes(measure);

/** A result of a measure with everything its row must have. */
export function result(measure: string, value: number | undefined, changes: Row = {}): Row {
  const isTenMetres = isOneOf(measure, 'tmwt_ss', 'tmwt_fast');
  const isWalk = isTenMetres || isOneOf(measure, 'six_mwt', 'tug');
  return {
    participant: someone,
    assessment_day: -5,
    measure,
    in_device: 'no',
    trial_no: 1,
    course_no: 1,
    timepoint: 'baseline',
    attempt_status: 'done',
    value,
    ...(isWalk ? { aid: 'walker', brace: 'no', assist_persons: 0 } : {}),
    ...(isTenMetres && value ? { timed_distance_m: 10, time_s: 10 / value, start_type: 'static' } : {}),
    ...(measure === 'six_mwt' ? { seconds_walked: 360 } : {}),
    ...(measure === 'wisci2' ? { level_basis: 'self_selected' } : {}),
    ...(isOneOf(measure, 'sbp', 'dbp') ? { posture: 'sitting' } : {}),
    ...(measure === 'mas' ? { muscle_group: 'knee_flex', side: 'left' } : {}),
    ...(measure === 'pain_nrs' ? { pain_window: 'now' } : {}),
    ...changes,
  };
}

/** A walking test that could not be done. */
export function unable(measure: string, changes: Row = {}): Row {
  return {
    ...result(measure, undefined),
    aid: undefined,
    brace: undefined,
    assist_persons: undefined,
    attempt_status: 'unable_physical',
    ...changes,
  };
}

interface ExamDraft {
  /** Score of both modalities below the last normal dermatome, S4-5 included. */
  readonly below: string;
  /** Grade of the leg key muscles. */
  readonly legs: string;
  /** The last dermatome that is normal on both sides. */
  readonly normalTo?: string;
}

/** Cells of an exam that is alike on both sides, arms full. */
export function examCells({ below, legs, normalTo = 'T10' }: ExamDraft): Row {
  const last = dermatomes.indexOf(normalTo);
  const sides = ['r', 'l'];
  const sensory = sides.flatMap((side) =>
    ['lt', 'pp'].flatMap((modality) =>
      dermatomes.map((dermatome, index) => [`${modality}_${side}_${segmentKey(dermatome)}`, index <= last ? '2' : below]),
    ),
  );
  const motor = sides.flatMap((side) =>
    keyMuscles.map(({ segment }) => [`m_${side}_${segmentKey(segment)}`, /^[CT]/.test(segment) ? '5' : legs]),
  );
  return Object.fromEntries([...sensory, ...motor]) as Row;
}

/** The example exam: T10 on both sides, grade C. */
export const exam = changed('exams');

/** T10, grade A: nothing felt or moved below. */
export const completeExam = (changes: Row = {}): Row =>
  exam({ ...examCells({ below: '0', legs: '0' }), vac: 'no', dap: 'no', recorded_ais: 'A', ...changes });

/** T10, grade B: felt below, nothing moved. */
export const sensoryIncompleteExam = (changes: Row = {}): Row =>
  exam({ ...examCells({ below: '1', legs: '0' }), vac: 'no', dap: 'yes', recorded_ais: 'B', ...changes });

/** Everything normal after an earlier deficit: grade E. */
export const normalExam = (changes: Row = {}): Row =>
  exam({
    ...examCells({ below: '2', legs: '5', normalTo: 'S4-5' }),
    vac: 'yes',
    dap: 'yes',
    recorded_ais: 'E',
    recorded_nli: 'INT',
    ...changes,
  });
