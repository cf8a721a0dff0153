/** How a site's record numbers are brought into one spelling. Kept in the key file: another choice gives other pseudonyms. */
export interface NormalisationOptions {
  /** Drop blanks, dashes, points, slashes and the like. */
  readonly stripSeparators: boolean;
  readonly upper: boolean;
  /** Only where the site says that 0042 and 42 are the same person. */
  readonly stripLeadingZeros: boolean;
}
