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

/** How many digits of one certified data set are reached. */
export interface CertifiedSet {
  /** Slug of the method page. */
  readonly method: string;
  readonly set: string;
  readonly figures: readonly CertifiedFigure[];
}

export interface CertifiedFigure {
  readonly name: string;
  /** Log relative error, -log10(|got - certified| / |certified|), at most 15; the least over several figures of this name. */
  readonly digits: number;
  /** Fewer would fail `npm run verify:statistics`. */
  readonly asked: number;
}
