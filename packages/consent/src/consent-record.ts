/** What one participant allowed, as the matching reads it: the newest version of the consent. */
import type { IsoDate } from './iso-date.ts';

export type ConsentStatus = 'active' | 'withdrawn' | 'superseded' | 'expired';

/** How far a withdrawal goes. */
export type WithdrawalScope = 'no_new_data' | 'no_further_use' | 'delete';

/**
 * Last day on which the consent holds, at the earliest and at the latest: no calendar date leaves a site, so the registry may know it
 * only within limits. Equal when it is known exactly.
 */
export interface LastDay {
  readonly earliest: IsoDate;
  readonly latest: IsoDate;
}

export interface ConsentPermission {
  /** Shorthand, id or IRI of a permission. */
  readonly code: string;
  /** With DS: the conditions. */
  readonly conditions?: readonly string[];
}

export interface ConsentModifier {
  /** Shorthand, id or IRI of a modifier, or a local flag. */
  readonly code: string;
  /** With RS: a code of the kind of research, or free text that a person must read. */
  readonly researchType?: { readonly value: string; readonly coded: boolean };
  /** With GS: countries, ISO 3166-1 two-letter codes. */
  readonly countries?: readonly string[];
  /** With MOR: first day on which results may be published. */
  readonly until?: IsoDate;
  /** With TS, and with MOR where no date is stated: whole months from the day access is granted. */
  readonly months?: number;
  /** With US, PS, IS: what is approved. */
  readonly approved?: readonly string[];
}

export interface ConsentRecord {
  readonly status: ConsentStatus;
  /** With status `withdrawn`; without it, no further use. */
  readonly withdrawalScope?: WithdrawalScope;
  readonly permissions: readonly ConsentPermission[];
  readonly modifiers: readonly ConsentModifier[];
  /** `unknown`: the consent ends some day, but the registry cannot tell when. Without it, it does not end. */
  readonly lastDay?: LastDay | 'unknown';
}
