/** Below this n a marked skewness makes the t methods doubtful. */
const fewValues = 15;

/**
 * Whether rank methods take the place of t methods: by the kind of scale, or by n and skewness, never by a test of normality.
 * `skewness` is G1 of the values compared (the changes, for paired data); leave it out where it is not defined.
 */
export function prefersRanks(of: { readonly ordinal: boolean; readonly n: number; readonly skewness?: number }): boolean {
  return of.ordinal || (of.n < fewValues && of.skewness !== undefined && Math.abs(of.skewness) > 1);
}
