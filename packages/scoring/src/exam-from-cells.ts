import { cellKey, cellPlaces } from './cell-key.ts';
import type { ExamIssue } from './exam-issue.ts';
import type { Modality, Side } from './segments.ts';
import { keyMuscles, sensorySegments } from './segments.ts';

/** An exam as far as a row tells: not yet checked, so pass it to `validateExam`. */
export type ExamInput = Readonly<Record<string, unknown>>;

type ReadCell = (key: string) => string | undefined;

const observationWords = new Map([
  ['yes', 'Yes'],
  ['no', 'No'],
  ['nt', 'NT'],
]);
const flagWords = new Map([
  ['yes', true],
  ['no', false],
]);

/** What is written under a key; an empty cell counts as absent. */
function written(get: ReadCell, key: string): string | undefined {
  const cell = get(key)?.trim();
  return cell === '' ? undefined : cell;
}

function row(get: ReadCell, side: Side, modality: Modality): Record<string, string | undefined> {
  const segments = modality === 'motor' ? keyMuscles : sensorySegments;
  return Object.fromEntries(segments.map((segment) => [segment, written(get, cellKey(side, modality, segment))?.toUpperCase()]));
}

function side(get: ReadCell, name: Side): ExamInput {
  const nonKey = written(get, name === 'right' ? 'non_key_r' : 'non_key_l')?.toUpperCase();
  return {
    lightTouch: row(get, name, 'lightTouch'),
    pinPrick: row(get, name, 'pinPrick'),
    motor: row(get, name, 'motor'),
    nonKey,
  };
}

/** The word's meaning, or the word itself so that validation refuses it where it stands. */
function meaning<T>(words: ReadonlyMap<string, T>, word: string | undefined): T | string | undefined {
  return word === undefined ? undefined : (words.get(word.toLowerCase()) ?? word);
}

/**
 * Builds an exam from the cells of a row: scores `lt_r_c2` to `pp_l_s4_5` and `m_r_c5` to `m_l_s1`; `vac` and `dap`
 * (yes, no, NT); `non_key_r` and `non_key_l` (a key muscle's segment); `earlier_deficit` (yes, no); `nt_reason` and
 * `tag_cause` (one code for the exam). Nothing is checked here and nothing guessed: what a cell holds beyond these words
 * is passed on for `validateExam` to refuse in its place.
 */
export function examFromCells(get: ReadCell): ExamInput {
  return {
    right: side(get, 'right'),
    left: side(get, 'left'),
    vac: meaning(observationWords, written(get, 'vac')),
    dap: meaning(observationWords, written(get, 'dap')),
    earlierDeficit: meaning(flagWords, written(get, 'earlier_deficit')),
    ntReason: written(get, 'nt_reason'),
    tagCause: written(get, 'tag_cause'),
  };
}

const fieldColumns = new Map([
  ['vac', 'vac'],
  ['dap', 'dap'],
  ['earlierDeficit', 'earlier_deficit'],
  ['ntReason', 'nt_reason'],
  ['tagCause', 'tag_cause'],
]);

/** The column of a row an issue is about; `undefined` when it is about no single column. */
export function columnOfIssue({ side, modality, segment, field }: ExamIssue): string | undefined {
  if (field === 'nonKey') return side === 'right' ? 'non_key_r' : 'non_key_l';
  if (field !== undefined) return fieldColumns.get(field);
  return cellPlaces.find((place) => place.side === side && place.modality === modality && place.segment === segment)?.key;
}
