/** Facts of one outcome, one row per participant (first course), wherever they come from. */
export interface OutcomeFact {
  readonly siteId: string;
  readonly levelGroup: string;
  readonly ais: string;
  readonly baselineStatus: string | null;
  readonly baseline: number | null;
  readonly endStatus: string | null;
  readonly end: number | null;
}

/** One participant of a release, for counts by level and grade. */
export interface CourseFact {
  readonly nli: string;
  readonly levelGroup: string;
  readonly ais: string;
}
