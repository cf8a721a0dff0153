import { describeRange, describeRequirement } from './describe.ts';
import { dictionary } from './dictionary.ts';
import { measures } from './measures.ts';
import type { Code, Threshold, Variable } from './types.ts';

/** One line of the codebook. Every field is text, so that it can go straight into a CSV file. */
export interface CodebookRow {
  readonly table: string;
  readonly column: string;
  readonly name: string;
  readonly definition: string;
  readonly type: string;
  readonly unit: string;
  readonly range: string;
  readonly codes: string;
  readonly missing: string;
  readonly required: string;
  readonly source: string;
  readonly since: string;
}

const listed = (codes: readonly Code[] = []): string =>
  codes.map(({ code, label }) => (code === label ? code : `${code} = ${label}`)).join('; ');

function codebookRow(variable: Variable): CodebookRow {
  return {
    table: variable.table,
    column: variable.key,
    name: variable.name,
    definition: variable.definition,
    type: variable.type,
    unit: variable.measuredBy ? `as ${variable.measuredBy.column} says` : (variable.unit ?? ''),
    range: variable.hard ? describeRange(variable.hard) : '',
    codes: listed(variable.codes),
    missing: listed(variable.missingCodes),
    required: describeRequirement(variable),
    source: variable.source,
    since: variable.since,
  };
}

/** The codebook of every table, in the dictionary's order. */
export function codebookRows(): CodebookRow[] {
  return dictionary.tables.flatMap((table) => table.variables.map(codebookRow));
}

/** One line of the list of outcome measures that goes with the codebook. */
export interface MeasureRow {
  readonly measure: string;
  readonly name: string;
  readonly definition: string;
  readonly unit: string;
  readonly scale: string;
  readonly range: string;
  readonly better: string;
  readonly mdc: string;
  readonly mcid: string;
  readonly source: string;
  readonly since: string;
}

function describeThreshold({ value, unit, population, citation, confidence }: Threshold): string {
  const size = typeof value === 'number' ? String(value) : describeRange(value);
  return `${size} ${unit} (${population}; ${citation}; ${confidence.replaceAll('-', ' ')})`;
}

/** The outcome measures as lines of text, thresholds with their citation and how sure they are. */
export function measureRows(): MeasureRow[] {
  return measures.map((measure) => ({
    measure: measure.key,
    name: measure.name,
    definition: measure.definition,
    unit: measure.unit,
    scale: measure.scale,
    range: measure.grades ? measure.grades.map((grade) => grade.written).join(', ') : describeRange(measure.hard),
    better: measure.better,
    mdc: measure.thresholds.mdc.map(describeThreshold).join('; '),
    mcid: measure.thresholds.mcid.map(describeThreshold).join('; '),
    source: measure.source,
    since: measure.since,
  }));
}
