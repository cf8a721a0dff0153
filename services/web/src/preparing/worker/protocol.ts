/**
 * What the page asks of its worker and what it is told. The opened key, record numbers and dates stay in the worker: an answer holds
 * counts, headers, a few example cells of the clinic's own files to look at, and what may leave the site.
 */
import type {
  ColumnMatch,
  DateFormat,
  IdentifierClass,
  IsoDate,
  KeyFileRefusalCode,
  LengthChange,
  ProblemKind,
  PseudonymMode,
  Strength,
} from '@cairnstep/deidentification';
import type { TableKey } from '@cairnstep/dictionary';
import type { Delimiter } from '@cairnstep/submission-files';
import type { PreparedTable, ReplacedCodes } from '../messages.ts';
import type { KeyChanges } from './key-changes.ts';
import type { RowsInMonth } from './rows-in-month.ts';

/** What the worker has to know of the site before anything else. */
export interface Circumstances {
  readonly site: string;
  /** `2026-11`; null where there is only a key. */
  readonly month: string | null;
  /** Null where nobody can tell: offline. */
  readonly knownParticipants: readonly string[] | null;
  readonly safeHeaders: readonly string[];
  /** `2026-12-01`, by the browser's clock; names new secrets. */
  readonly today: IsoDate;
}

export interface NewKey {
  readonly mode: PseudonymMode;
  readonly idType: string;
  /** Whether 0042 and 42 are the same person. */
  readonly stripLeadingZeros: boolean;
  readonly passphrase: string;
}

/** What may be told of an opened key. */
export interface KeyPicture {
  readonly keyId: string;
  readonly revision: number;
  readonly mode: PseudonymMode;
  readonly idType: string;
  readonly stripLeadingZeros: boolean;
  readonly people: number;
  readonly peopleWithFirstDay: number;
  /** Secrets in the file; more than one after a rotation. */
  readonly secrets: number;
  /** Tables whose columns are remembered. */
  readonly tables: readonly TableKey[];
  /** Holds something that its file does not. */
  readonly isUnsaved: boolean;
  /** What that is; null where it is nothing. */
  readonly changes: KeyChanges | null;
  /** Participants of the registry that the key does not know; null when it knows all, or nobody can tell. */
  readonly lacking: { readonly missing: number; readonly of: number } | null;
  /** Codes that were replaced by a rotation, a merging or a joining, of which the registry does not know yet. */
  readonly codesToReplace: number;
}

/** A file, or one sheet of a workbook. */
export interface SourcePicture {
  readonly id: number;
  readonly fileName: string;
  readonly sheet: string | null;
  readonly table: TableKey | null;
  readonly rows: number;
  readonly columns: number;
  /** Null for a workbook. */
  readonly encoding: string | null;
  readonly delimiter: Delimiter | null;
  /** Worth a choice when more than one. */
  readonly fittingDelimiters: readonly Delimiter[];
  readonly decimalMark: '.' | ',';
  /** Numbers of the file are written with both marks. */
  readonly hasBothMarks: boolean;
  /** What a spreadsheet keeps out of sight, in sentences. */
  readonly notes: readonly string[];
}

/** A file that could not be read. */
export interface RefusedFile {
  readonly fileName: string;
  readonly found: string;
  readonly mend: string;
  readonly line: number | null;
}

export interface ColumnPicture {
  /** Position in the clinic's file, 1 for the first. */
  readonly number: number;
  readonly header: string;
  /** Up to three cells, to recognise the column by. */
  readonly examples: readonly string[];
  readonly match: ColumnMatch;
  /** Not as the key file remembers it. */
  readonly isNew: boolean;
  /** Formats in which all of its cells are dates. */
  readonly dateFormats: readonly DateFormat[];
  /** Words that stand for no code of the variable. */
  readonly unknownWords: readonly string[];
  /** Whether the column can be matched: its header is there, and no other column has it. */
  readonly isMatchable: boolean;
}

export interface TableColumns {
  readonly source: number;
  readonly table: TableKey;
  readonly columns: readonly ColumnPicture[];
}

export interface ProblemPicture {
  readonly kind: ProblemKind;
  readonly table: TableKey;
  readonly header: string | null;
  readonly columnNumber: number | null;
  readonly variable: string | null;
  readonly lines: readonly number[];
  readonly count: number;
  readonly message: string;
}

/** Something that looks as if it identified somebody; told without the cell. */
export interface FindingPicture {
  readonly class: IdentifierClass;
  readonly strength: Strength;
  readonly table: TableKey;
  readonly header: string;
  readonly line: number | null;
  readonly count: number;
}

/** A person by the place where they stand, and the first training day that was stated for them. */
export interface FirstDayPlace {
  readonly table: TableKey;
  readonly line: number;
  readonly stated: IsoDate | null;
}

export interface PreparedTablePicture {
  readonly table: TableKey;
  readonly rows: number;
  readonly rowsInFile: number;
  readonly people: number;
  readonly bytes: number;
  /** SHA-256 of the bytes, in hexadecimal. */
  readonly digest: string;
  readonly headers: readonly string[];
  readonly firstRows: readonly (readonly string[])[];
  /** Every different word of the columns that can hold words, with the rows that have it; numbers among them are only counted. */
  readonly words: readonly {
    readonly column: string;
    readonly values: readonly { readonly value: string; readonly count: number }[];
    readonly numbers: number;
  }[];
}

export interface PreparedPicture {
  readonly tables: readonly PreparedTablePicture[];
  readonly columns: readonly TableColumns[];
  readonly problems: readonly ProblemPicture[];
  readonly findings: readonly FindingPicture[];
  readonly firstDays: readonly FirstDayPlace[];
  /** Tables of whose file no row can be sent. */
  readonly emptyTables: readonly TableKey[];
  readonly rowsLeftBehind: number;
  readonly people: number;
  /** People that the registry does not hold yet; where nobody can tell, that the key file did not. */
  readonly newPeople: number;
  /** People whom the key file did not know when it was opened; null where the registry has said whom it holds. */
  readonly newToKey: number | null;
  readonly agesTopCoded: number;
  readonly lengthChange: LengthChange | null;
  /** Null where no file says when training took place. */
  readonly rowsInMonth: RowsInMonth | null;
}

/** What the worker holds, as far as it may be told. */
export interface Picture {
  readonly key: KeyPicture | null;
  readonly sources: readonly SourcePicture[];
  readonly refused: readonly RefusedFile[];
}

export interface SavedFile {
  readonly name: string;
  readonly text: string;
}

/** Everything that can be asked: what it takes and what it gives. */
export interface Asks {
  begin: { input: Circumstances; answer: Picture };
  'suggest-passphrase': { input: null; answer: string };
  'make-key': { input: NewKey; answer: { readonly picture: Picture; readonly file: SavedFile } };
  'open-key': { input: { readonly file: Blob; readonly passphrase: string }; answer: Picture };
  'merge-key': {
    input: { readonly file: Blob; readonly passphrase: string };
    answer: { readonly picture: Picture; readonly replaced: number; readonly firstDaysMoved: readonly string[] };
  };
  'rotate-key': {
    input: { readonly recordNumbers: readonly string[] };
    answer: { readonly picture: Picture; readonly carriedOver: number };
  };
  'join-numbers': {
    input: { readonly kept: string; readonly joined: string };
    answer: { readonly picture: Picture; readonly replaced: number; readonly firstDayMoved: string | null };
  };
  /** The file saved next is locked with it. */
  'change-passphrase': { input: { readonly passphrase: string }; answer: Picture };
  'save-key': { input: null; answer: { readonly picture: Picture; readonly file: SavedFile } };
  'codes-to-replace': { input: null; answer: ReplacedCodes };
  /** The registry knows of the codes that were replaced. */
  'codes-replaced': { input: null; answer: Picture };
  'add-files': { input: { readonly files: readonly File[] }; answer: Picture };
  'change-source': { input: SourceChange; answer: Picture };
  'leave-out': { input: { readonly id: number }; answer: Picture };
  'match-column': { input: { readonly source: number; readonly match: ColumnMatch }; answer: Picture };
  'state-first-day': {
    input: { readonly table: TableKey; readonly line: number; readonly date: IsoDate | null };
    answer: Picture;
  };
  prepare: { input: null; answer: { readonly picture: Picture; readonly prepared: PreparedPicture } };
  'tables-to-send': { input: null; answer: { readonly tables: PreparedTable[]; readonly replacedCodes: ReplacedCodes } };
}

export interface SourceChange {
  readonly id: number;
  readonly table?: TableKey | null;
  readonly delimiter?: Delimiter;
  readonly decimalMark?: '.' | ',';
}

export type AskName = keyof Asks;

export interface Progress {
  /** What is being done: "Reading sessions.csv". */
  readonly what: string;
  /** How many bytes are done; null where it cannot be told. */
  readonly bytes: { readonly done: number; readonly of: number } | null;
}

export type RefusalCode =
  KeyFileRefusalCode | 'file-cannot-be-read' | 'nobody-known' | 'same-number' | 'no-such-place' | 'cancelled' | 'failed';

export type ToWorker = { readonly id: number; readonly ask: AskName; readonly input: Asks[AskName]['input'] } | { readonly cancel: number };

export type FromWorker =
  | { readonly id: number; readonly kind: 'progress'; readonly progress: Progress }
  | { readonly id: number; readonly kind: 'answer'; readonly answer: Asks[AskName]['answer'] }
  | { readonly id: number; readonly kind: 'refusal'; readonly code: RefusalCode; readonly message: string };
