/** What stands on the sheet: cells in the codes of the dictionary, and the remarks that belong to them. */
import { variableOf } from '@cairnstep/dictionary';
import type { Code } from '@cairnstep/dictionary';
import { examFromCells } from '@cairnstep/scoring';
import type { CellKey, ExamInput, KeyMuscle, Side } from '@cairnstep/scoring';
import { allCells, isAnswer, placeOf } from './places.ts';

type ByCell = Readonly<Partial<Record<CellKey, string>>>;

export interface ExamSheet {
  /** Scores such as `1`, `1*`, `NT`; answers `yes`, `no`, `NT`. A blank cell has no entry. */
  readonly written: ByCell;
  /** The condition behind each tag. */
  readonly tagCauses: ByCell;
  /** Why a cell was not tested, where it differs from `ntReason`. */
  readonly ntReasons: ByCell;
  /** Why cells were not tested, for all without a reason of their own. */
  readonly ntReason: string | null;
  readonly nonKey: Readonly<Record<Side, KeyMuscle | null>>;
  /** Null: not answered. */
  readonly earlierDeficit: boolean | null;
}

export const blankSheet: ExamSheet = {
  written: {},
  tagCauses: {},
  ntReasons: {},
  ntReason: null,
  nonKey: { right: null, left: null },
  earlierDeficit: null,
};

export function isBlankSheet(sheet: ExamSheet): boolean {
  return (
    Object.keys(sheet.written).length === 0 &&
    sheet.nonKey.right === null &&
    sheet.nonKey.left === null &&
    sheet.earlierDeficit === null &&
    sheet.ntReason === null
  );
}

export function blankCells({ written }: ExamSheet): readonly CellKey[] {
  return allCells.filter((key) => written[key] === undefined);
}

const codesOf = (key: string): readonly Code[] => {
  const { codes = [], missingCodes = [] } = variableOf('exams', key);
  return [...codes, ...missingCodes];
};

/** What may be written in a cell, in any case; undefined for anything else. */
export function codeFor(key: CellKey, text: string): string | undefined {
  const typed = text.trim().toUpperCase();
  return codesOf(key).find(({ code }) => code.toUpperCase() === typed)?.code;
}

/** The examined score, without a tag. */
export function scoreIn(written: string): string {
  return written.replace(/\*+$/, '');
}

/** How a tagged cell counts in the classification. */
export type Treatment = 'not-normal' | 'normal';

export function treatmentIn(written: string): Treatment | null {
  if (!written.endsWith('*')) return null;
  return written.endsWith('**') ? 'normal' : 'not-normal';
}

/** A score with its tag: one star counts as not normal, two as normal. */
export function tagged(score: string, treatment: Treatment): string {
  return `${score}${treatment === 'normal' ? '**' : '*'}`;
}

/** The score of normal function in a cell. */
export function normalScore(key: CellKey): string {
  if (isAnswer(key)) return 'yes';
  return placeOf(key)?.modality === 'motor' ? '5' : '2';
}

/** "Light touch, right, C5" */
export function cellTitle(key: CellKey): string {
  return variableOf('exams', key).name;
}

/** "altered", "not testable; …" */
export function meaningOf(key: CellKey, written: string): string {
  return codesOf(key).find(({ code }) => code === written)?.label ?? written;
}

export const tagCauses: readonly Code[] = variableOf('exams', 'tag_cause').codes ?? [];
export const ntReasons: readonly Code[] = variableOf('exams', 'nt_reason').codes ?? [];

export function labelIn(codes: readonly Code[], code: string | undefined): string | undefined {
  return codes.find((known) => known.code === code)?.label;
}

/** The reason a cell was not tested; undefined when it was, or when none is given. */
export function reasonFor(sheet: ExamSheet, key: CellKey): string | undefined {
  return sheet.written[key]?.startsWith('NT') === true ? (sheet.ntReasons[key] ?? sheet.ntReason ?? undefined) : undefined;
}

/** The sheet as the classification takes it. `blank`: what a blank cell is read as; absent, it is reported as missing. */
export function examInput(sheet: ExamSheet, blank?: 'NT'): ExamInput {
  const { written, nonKey, earlierDeficit } = sheet;
  const fields: Readonly<Record<string, string | undefined>> = {
    non_key_r: nonKey.right ?? undefined,
    non_key_l: nonKey.left ?? undefined,
    earlier_deficit: earlierDeficit === null ? undefined : earlierDeficit ? 'yes' : 'no',
  };
  const isCell = (key: string): key is CellKey => (allCells as readonly string[]).includes(key);
  return {
    ...examFromCells((key) => (isCell(key) ? (written[key] ?? blank) : fields[key])),
    ntReason: Object.fromEntries(allCells.map((key) => [key, reasonFor(sheet, key)])),
    tagCause: sheet.tagCauses,
  };
}
