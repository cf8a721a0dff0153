/** How far the functions of a method are from the published figures of one source. */
export interface EvidenceRow {
  /** Slug of the method page. */
  readonly method: string;
  /** Software with version, paper, or certified set. */
  readonly source: string;
  readonly cases: number;
  /** Numbers compared in these cases. */
  readonly figures: number;
  /** Largest |got - published| / |published|; absolute where the published figure is 0. */
  readonly worstRelativeError: number;
}
