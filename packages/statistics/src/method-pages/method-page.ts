import type { Computation } from './computations.ts';
import type { QuestionKey } from './questions.ts';

/** What the Methods page says about one method. */
export interface MethodPage {
  /** Stable address part, also the `method` of the reference checks that prove it. */
  readonly slug: string;
  readonly title: string;
  readonly question: QuestionKey;
  /**
   * One statement a line, plain text. `_` lowers and `^` raises the letters or the number after it, or what braces hold: `s_1^2`,
   * `x_{i+1}`. Braces stand nowhere else.
   */
  readonly formula: readonly string[];
  readonly whenUsed: string;
  readonly smallN: string;
  /** Paper or manual the variant follows. */
  readonly source: string;
  readonly computedBy: Computation;
}
