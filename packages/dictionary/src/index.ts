/** The data dictionary: plain constants and functions, without a schema library. Schemas are in `@cairnstep/dictionary/schema`. */
export { dictionary, tableOf, variableOf } from './dictionary.ts';
export { holds, isRequired, mustBeEmpty } from './is-required.ts';
export { measureOf, measures } from './measures.ts';
export { dermatomes, keyMuscles, segmentKey, spinalLevels } from './neurological-levels.ts';
export { pseudonymAlphabet, pseudonymPattern } from './pseudonym.ts';
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
  Range,
  Requirement,
  Row,
  Scale,
  Table,
  TableKey,
  Threshold,
  ValueType,
  Variable,
} from './types.ts';
