/** The data dictionary: plain constants and functions, without a schema library. Schemas are in `@cairnstep/dictionary/schema`. */
export { cellParser, measureParser } from './cell-parser.ts';
export type { CellParser, CellProblem, CellProblemKind, ParsedCell } from './cell-parser.ts';
export { codebookRows, measureRows } from './codebook.ts';
export type { CodebookRow, MeasureRow } from './codebook.ts';
export { dataPackageFields } from './data-package-fields.ts';
export type { DataPackageField } from './data-package-fields.ts';
export { describeConversion, describeRange, describeRequirement } from './describe.ts';
export { dictionaryAsJson } from './dictionary-document.ts';
export type { DictionaryDocument } from './dictionary-document.ts';
export { dictionary, tableOf, variableOf } from './dictionary.ts';
export { exampleParticipant, exampleRow } from './example-row.ts';
export { fitsRange } from './fits-range.ts';
export { history } from './history.ts';
export type { Revision, RowChange } from './history.ts';
export { holds, isRequired, mustBeEmpty } from './is-required.ts';
export { findMeasure, measureOf, measures } from './measures.ts';
export { dermatomes, keyMuscles, segmentKey, spinalLevels } from './neurological-levels.ts';
export { checkCharacterOf, pseudonymAlphabet, pseudonymPattern } from './pseudonym.ts';
export { readAs } from './read-as.ts';
export { measureInRow, rowProblems } from './row-problems.ts';
export type { RowProblem, RowProblemKind } from './row-problems.ts';
export { rulesAbout, rulesAboutMeasure, subjectOf } from './rule-subjects.ts';
export type { RuleSubject } from './rule-subjects.ts';
export { ruleOf, rules } from './rules.ts';
export { sqlCheck } from './sql-check.ts';
export { sqlType } from './sql-type.ts';
export { tableKeys } from './types.ts';
export type {
  AcceptedUnit,
  Code,
  Condition,
  Confidence,
  Dictionary,
  Direction,
  Exposure,
  Measure,
  MeasuredBy,
  Range,
  Requirement,
  Row,
  Rule,
  RuleScope,
  Scale,
  Severity,
  Table,
  TableKey,
  Threshold,
  ValueType,
  Variable,
} from './types.ts';
export { keyWithoutUnit, unitSpellings } from './units-in-names.ts';
