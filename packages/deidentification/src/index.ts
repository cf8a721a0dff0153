/** Identity out of rows: participant codes, study days, key file and detectors; the same code in the browser and on the server. */
export { identifierClasses } from './detection/identifier-class.ts';
export { identifierWords } from './detection/identifier-words.ts';
export type { IdentifierClass, Strength } from './detection/identifier-class.ts';
export type { IdentifierFinding } from './detection/identifier-finding.ts';
export type { ColumnRole, DetectionContext } from './detection/detection-context.ts';
export type { TextTable } from './detection/text-table.ts';
export { detectIdentifiers, screenCsvText } from './detection/detect-identifiers.ts';
export { IdentifierScreen } from './detection/identifier-screen.ts';
export { showableFileName } from './detection/showable-file-name.ts';
export type { FileOf } from './detection/showable-file-name.ts';
export { showableHeader } from './detection/showable-header.ts';

export { dateFormats } from './dates/date-format.ts';
export type { DateFormat, DateProblem, IsoDate, ParsedDate } from './dates/date-format.ts';
export { ageOn, revealsTopAge, topAge, topCodedAge } from './dates/age.ts';
export { fittingFormats } from './dates/fitting-formats.ts';
export { parseDate } from './dates/parse-date.ts';
export { studyDay } from './dates/study-day.ts';

export type { NormalisationOptions } from './pseudonyms/normalisation-options.ts';
export { normaliseLocalId, usualNormalisation } from './pseudonyms/normalise-local-id.ts';
export { hasValidCheckCharacter } from './pseudonyms/participant-code.ts';
export { pseudonymFromHmac } from './pseudonyms/pseudonym-from-hmac.ts';
export { randomPseudonym } from './pseudonyms/random-pseudonym.ts';

export type { KeyGeneration, KnownPerson, PseudonymMode, SiteKey } from './key-file/site-key.ts';
export { createKeyFile, openKeyFile, saveKeyFile } from './key-file/key-file.ts';
export type { Expectation, KeySettings, SavedKey } from './key-file/key-file.ts';
export { iterationLimits } from './key-file/key-file-header.ts';
export { KeyFileRefusal } from './key-file/key-file-refusal.ts';
export type { KeyFileRefusalCode } from './key-file/key-file-refusal.ts';
export { adoptCodes } from './key-file/adopt-codes.ts';
export type { PersonWithCode } from './key-file/adopt-codes.ts';
export { joinLocalIds } from './key-file/join-local-ids.ts';
export { mergeKeys } from './key-file/merge-keys.ts';
export type { MergedKey } from './key-file/merge-keys.ts';
export { generatePassphrase } from './key-file/passphrase.ts';
export type { RandomBytes } from './key-file/passphrase.ts';
export { passphraseWords } from './key-file/passphrase-words.ts';
export { rotateKey } from './key-file/rotate-key.ts';
export type { KeyChange } from './key-file/rotate-key.ts';

export type { ColumnMatch, StoredMatches } from './preparation/column-match.ts';
export type * from './preparation/month.ts';
export { cleanCsv } from './preparation/clean-csv.ts';
export { matchColumns } from './preparation/match-columns.ts';
export { prepareMonth } from './preparation/prepare-month.ts';
export { unknownWords } from './preparation/unknown-words.ts';
