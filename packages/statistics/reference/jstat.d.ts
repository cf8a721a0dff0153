/** jstat ships no types; these are the members the tests use as a second opinion. */
declare module 'jstat' {
  const jStat: {
    readonly tukey: { cdf(q: number, groups: number, df: number): number; inv(p: number, groups: number, df: number): number };
  };
  export default jStat;
}
