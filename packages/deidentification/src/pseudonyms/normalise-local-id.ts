import type { NormalisationOptions } from './normalisation-options.ts';

const invisible = /[\p{Cc}\p{Cf}\ufe00-\ufe0f]/gu;
const separators = /[\s\p{Pd}\u2212_.,:;/\\|#'’]/gu;

/** What sites start with: leading zeros stay, because 0042 and 42 may be two people. */
export const usualNormalisation: NormalisationOptions = { stripSeparators: true, upper: true, stripLeadingZeros: false };

/**
 * A record number in the one spelling that its pseudonym is made from. A number that consists of separators only gives the empty text,
 * which stands for nobody.
 */
export function normaliseLocalId(localId: string, { stripSeparators, upper, stripLeadingZeros }: NormalisationOptions): string {
  let id = localId.normalize('NFKC').replace(invisible, '').trim();
  if (stripSeparators) id = id.replace(separators, '');
  if (upper) id = id.toUpperCase();
  // Letters and accents that a separator kept apart may have come together.
  id = id.normalize('NFC');
  return stripLeadingZeros ? id.replace(/^0+(?=.)/u, '') : id;
}
