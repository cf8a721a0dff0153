/** Identity out of rows: pseudonyms, study days and detectors, the same code in the browser and on the server. */
export { identifierClasses } from './detection/identifier-class.ts';
export type { IdentifierClass, Strength } from './detection/identifier-class.ts';
export type { IdentifierFinding } from './detection/identifier-finding.ts';
export type { ColumnRole, DetectionContext } from './detection/detection-context.ts';
export type { TextTable } from './detection/text-table.ts';
export { dateFormats } from './dates/date-format.ts';
export type { DateFormat, DateProblem, IsoDate, ParsedDate } from './dates/date-format.ts';
export type { KeyGeneration, PseudonymMode, SiteKey } from './key-file/site-key.ts';
export type { ColumnMatch, StoredMatches } from './preparation/column-match.ts';
export type * from './preparation/month.ts';
export type { NormalisationOptions } from './pseudonyms/normalisation-options.ts';
