/** What the Methods page says about one method. Plain text: formulae as one would type them, no markup. */
export interface MethodPage {
  /** Stable address part, also the `method` of the reference checks that prove it. */
  readonly slug: string;
  readonly title: string;
  readonly formula: string;
  readonly whenUsed: string;
  readonly smallN: string;
  /** Paper or manual the variant follows. */
  readonly source: string;
}
