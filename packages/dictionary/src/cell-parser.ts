/** From the text of a cell to the typed value of a variable. */
import { exactQuotient } from './exact-quotient.ts';
import { describeRange } from './describe.ts';
import { fitsRange } from './fits-range.ts';
import { pseudonymPattern } from './pseudonym.ts';
import type { AcceptedUnit, Measure, Range, Variable } from './types.ts';

export type CellProblemKind =
  | 'not-a-code'
  | 'not-a-number'
  | 'decimal-comma'
  | 'not-whole'
  | 'not-a-participant-code'
  | 'outside-limits'
  | 'unlikely'
  | 'unknown-unit'
  | 'never-entered';

/** What is wrong with a cell and how to mend it. The message never holds the value. */
export interface CellProblem {
  readonly kind: CellProblemKind;
  readonly message: string;
}

/** An empty cell has the value undefined. A value outside the plausible range is read, with a doubt to confirm. */
export type ParsedCell =
  | { readonly ok: true; readonly value: string | number | undefined; readonly doubt?: CellProblem }
  | { readonly ok: false; readonly problem: CellProblem };

/** @param text the trimmed text; @param writtenUnit the unit the file states, when it is not the stored one */
export type CellParser = (text: string, writtenUnit?: string) => ParsedCell;

const refuse = (kind: CellProblemKind, message: string): ParsedCell => ({ ok: false, problem: { kind, message } });

const longestNumber = 40;
const numberPattern = /^-?(\d+(\.\d+)?|\.\d+)$/;
const commaPattern = /^-?\d*,\d+$/;

/** Other spellings of yes and no. A flag has no numbers, so 1 and 0 can mean nothing else. */
const flagSpellings: Readonly<Record<string, string>> = { y: 'yes', true: 'yes', '1': 'yes', n: 'no', false: 'no', '0': 'no' };

interface NumberShape {
  readonly unit?: string | undefined;
  readonly whole: boolean;
  readonly hard?: Range | undefined;
  readonly plausible?: Range | undefined;
  readonly acceptedUnits?: readonly AcceptedUnit[] | undefined;
}

function numberParser({ unit, whole, hard, plausible, acceptedUnits = [] }: NumberShape): CellParser {
  return (text, writtenUnit) => {
    if (text === '') return { ok: true, value: undefined };
    if (commaPattern.test(text)) return refuse('decimal-comma', 'Write a point, not a comma, as the decimal mark.');
    if (text.length > longestNumber || !numberPattern.test(text))
      return refuse('not-a-number', 'Write a number without unit or sign of thousands.');

    const accepted = acceptedUnits.find((each) => each.unit === writtenUnit);
    if (writtenUnit !== undefined && writtenUnit !== unit && accepted === undefined) {
      const allowed = [...(unit === undefined ? [] : [unit]), ...acceptedUnits.map((each) => each.unit)];
      return refuse('unknown-unit', allowed.length === 0 ? 'This column has no unit.' : `Write the value in ${allowed.join(', ')}.`);
    }
    const value = exactQuotient(text, accepted?.times ?? 1, accepted?.dividedBy ?? 1);

    if (whole && !Number.isInteger(value)) return refuse('not-whole', 'Write a whole number.');
    if (hard && !fitsRange(value, hard)) return refuse('outside-limits', `Allowed is ${describeRange(hard, unit)}.`);
    if (plausible && !fitsRange(value, plausible)) {
      return {
        ok: true,
        value,
        doubt: { kind: 'unlikely', message: `Usual is ${describeRange(plausible, unit)}. Check the value, or confirm it.` },
      };
    }
    return { ok: true, value };
  };
}

function codeParser(codes: readonly string[], spellings: Readonly<Record<string, string>> = {}): CellParser {
  const written = new Map(codes.map((code) => [code.toLowerCase(), code]));
  const list = codes.length > 12 ? `one of the ${codes.length} codes of the codebook` : `one of ${codes.join(', ')}`;
  return (text) => {
    if (text === '') return { ok: true, value: undefined };
    const folded = text.toLowerCase();
    const value = written.get(folded) ?? (Object.hasOwn(spellings, folded) ? spellings[folded] : undefined);
    return value === undefined ? refuse('not-a-code', `Write ${list}.`) : { ok: true, value };
  };
}

const pseudonymParser: CellParser = (text) => {
  if (text === '') return { ok: true, value: undefined };
  return pseudonymPattern.test(text)
    ? { ok: true, value: text }
    : refuse('not-a-participant-code', 'Write the participant code that the site made: the letter S and 21 characters.');
};

/**
 * The parser of a variable's cells. Codes are read in any case. Numbers have a decimal point; a stated unit is converted exactly.
 * A result of a measure is read by {@link measureParser}, because its unit and limits depend on the row.
 */
export function cellParser(variable: Variable): CellParser {
  switch (variable.type) {
    case 'pseudonym':
      return pseudonymParser;
    case 'flag':
      return codeParser(['yes', 'no'], flagSpellings);
    case 'code':
      return codeParser([...(variable.codes ?? []), ...(variable.missingCodes ?? [])].map(({ code }) => code));
    case 'integer':
      return numberParser({ ...variable, whole: true });
    case 'decimal':
      return numberParser({ ...variable, whole: false });
  }
}

/** The parser of a result of this measure. Where the measure has grades, each is read as written (`1+`) or as stored (`1.5`). */
export function measureParser(measure: Measure): CellParser {
  if (!measure.entered) {
    return (text) =>
      text === '' ? { ok: true, value: undefined } : refuse('never-entered', 'The registry computes this result. Leave it out.');
  }
  const { grades } = measure;
  if (grades === undefined) return numberParser({ ...measure, whole: measure.hard.step === 1 });
  const stored = new Map(
    grades.flatMap((grade) => [[grade.written, grade.stored] as const, [String(grade.stored), grade.stored] as const]),
  );
  return (text) => {
    if (text === '') return { ok: true, value: undefined };
    const value = stored.get(text);
    return value === undefined
      ? refuse('not-a-code', `Write one of ${grades.map((grade) => grade.written).join(', ')}.`)
      : { ok: true, value };
  };
}
