import type { IsoDate } from '../dates/date-format.ts';
import type { StoredMatches } from '../preparation/column-match.ts';
import type { NormalisationOptions } from '../pseudonyms/normalisation-options.ts';

/** `random`: drawn and remembered in the key file. `hmac`: computed from the record number with the site's secret. */
export type PseudonymMode = 'random' | 'hmac';

/** One secret and the codes remembered under it. After a rotation the older ones stay until everybody has been carried over. */
export interface KeyGeneration {
  readonly keyId: string;
  /** 32 bytes. */
  readonly secret: Uint8Array<ArrayBuffer>;
  /** Keyed hash of a record number → participant code. In `hmac` mode it holds only record numbers joined to another person's code. */
  readonly codes: ReadonlyMap<string, string>;
  /** Code of this generation → code of a newer one, for those carried over since. */
  readonly replacedBy: ReadonlyMap<string, string>;
}

/** What is remembered of one person. */
export interface KnownPerson {
  /** First training day. */
  readonly indexDate?: IsoDate;
  /** Age on that day as last sent, before a study day made it 90. */
  readonly age?: number;
  /** Highest study day sent so far: with the age it may tell of an age over 89. */
  readonly lastDay?: number;
}

/** Everything that links a site's people to their codes: the content of its key file. Never sent to the registry. */
export interface SiteKey {
  readonly site: string;
  /** Counts the times the file was saved, so that an older copy is recognised. */
  readonly revision: number;
  readonly mode: PseudonymMode;
  /** Kind of record number the codes are made from, such as `mrn`. */
  readonly idType: string;
  readonly normalisation: NormalisationOptions;
  /** Newest first; never empty. */
  readonly generations: readonly [KeyGeneration, ...KeyGeneration[]];
  /** Participant code → what later months need. */
  readonly people: ReadonlyMap<string, KnownPerson>;
  /** How the clinic's columns were matched last time. */
  readonly matches: StoredMatches;
  /** Length of a normalised record number → how many had it in the last month prepared. */
  readonly idLengths: ReadonlyMap<number, number>;
}
