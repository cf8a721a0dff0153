/** All method pages, in the order the Methods page lists them. One file per method. */
import type { MethodPage } from './method-page.ts';
import { proportionWilsonPage } from './proportion-wilson.ts';
import { proportionClopperPearsonPage } from './proportion-clopper-pearson.ts';
import { proportionDifferencePage } from './proportion-difference.ts';
import { chiSquarePage } from './chi-square.ts';
import { fisherTwoByTwoPage } from './fisher-two-by-two.ts';
import { fisherTablePage } from './fisher-table.ts';
import { cochranArmitagePage } from './cochran-armitage.ts';
import { mantelHaenszelPage } from './mantel-haenszel.ts';
import { mcnemarPage } from './mcnemar.ts';
import { bowkerPage } from './bowker.ts';
import { stuartMaxwellPage } from './stuart-maxwell.ts';
import { weightedKappaPage } from './weighted-kappa.ts';
import { transitionSummaryPage } from './transition-summary.ts';
import { pearsonPage } from './pearson.ts';
import { spearmanPage } from './spearman.ts';
import { kendallPage } from './kendall.ts';
import { linearRegressionPage } from './linear-regression.ts';
import { ancovaPage } from './ancova.ts';
import { logisticRegressionPage } from './logistic-regression.ts';
import { randomInterceptPage } from './random-intercept.ts';
import { randomSlopePage } from './random-slope.ts';
import { kaplanMeierPage } from './kaplan-meier.ts';
import { logRankPage } from './log-rank.ts';
import { coxPage } from './cox.ts';
import { sitePoolingPage } from './site-pooling.ts';
import { intraclassCorrelationPage } from './intraclass-correlation.ts';
import { raterAgreementPage } from './rater-agreement.ts';
import { funnelPage } from './funnel.ts';
import { bootstrapPage } from './bootstrap.ts';
import { rubinsRulesPage } from './rubins-rules.ts';

export type { MethodPage } from './method-page.ts';

export const methodPages: readonly MethodPage[] = [
  proportionWilsonPage,
  proportionClopperPearsonPage,
  proportionDifferencePage,
  chiSquarePage,
  fisherTwoByTwoPage,
  fisherTablePage,
  cochranArmitagePage,
  mantelHaenszelPage,
  mcnemarPage,
  bowkerPage,
  stuartMaxwellPage,
  weightedKappaPage,
  transitionSummaryPage,
  pearsonPage,
  spearmanPage,
  kendallPage,
  linearRegressionPage,
  ancovaPage,
  logisticRegressionPage,
  randomInterceptPage,
  randomSlopePage,
  kaplanMeierPage,
  logRankPage,
  coxPage,
  sitePoolingPage,
  intraclassCorrelationPage,
  raterAgreementPage,
  funnelPage,
  bootstrapPage,
  rubinsRulesPage,
];
