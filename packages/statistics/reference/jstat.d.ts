/** jstat ships no types; these are the members the tests use as a second opinion. */
declare module 'jstat' {
  const jStat: {
    readonly normal: { cdf(x: number, mean: number, sd: number): number; inv(p: number, mean: number, sd: number): number };
    readonly studentt: { cdf(t: number, df: number): number };
    readonly chisquare: { cdf(x: number, df: number): number };
    readonly centralF: { cdf(f: number, df1: number, df2: number): number };
    readonly beta: { cdf(x: number, a: number, b: number): number };
    readonly gamma: { cdf(x: number, shape: number, scale: number): number };
    readonly tukey: { cdf(q: number, groups: number, df: number): number; inv(p: number, groups: number, df: number): number };
  };
  export default jStat;
}
