/** All method pages, in the order the Methods page lists them. One file per method. */
import type { MethodPage } from './method-page.ts';
import { descriptionPage } from './description.ts';
import { quantileTypeSevenPage } from './quantile-type-7.ts';
import { meanWithIntervalPage } from './mean-with-interval.ts';
import { oneSampleTPage } from './one-sample-t.ts';
import { pairedChangePage } from './paired-change.ts';
import { welchPage } from './welch.ts';
import { signedRankPage } from './signed-rank.ts';
import { mannWhitneyPage } from './mann-whitney.ts';
import { welchAnovaPage } from './welch-anova.ts';
import { oneWayAnovaPage } from './one-way-anova.ts';
import { brownForsythePage } from './brown-forsythe.ts';
import { tukeyKramerPage } from './tukey-kramer.ts';
import { kruskalWallisPage } from './kruskal-wallis.ts';
import { dunnPage } from './dunn.ts';
import { jonckheerePage } from './jonckheere-terpstra.ts';
import { friedmanPage } from './friedman.ts';
import { multiplicityPage } from './multiplicity.ts';
import { hedgesGPage } from './hedges-g.ts';
import { standardisedResponseMeanPage } from './standardised-response-mean.ts';
import { standardisedMeanDifferencePage } from './standardised-mean-difference.ts';
import { minimalDetectableChangePage } from './minimal-detectable-change.ts';
import { distributionsPage } from './distributions.ts';
import { roundingPage } from './rounding.ts';
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

export type { Computation, Library } from './computations.ts';
export type { CertifiedFigure, CertifiedSet, EvidenceRow } from './evidence-row.ts';
export { certifiedSets, evidenceTable } from './evidence-table.ts';
export type { MethodPage } from './method-page.ts';
export { questions } from './questions.ts';
export type { QuestionKey } from './questions.ts';

export const methodPages: readonly MethodPage[] = [
  descriptionPage,
  quantileTypeSevenPage,
  meanWithIntervalPage,
  oneSampleTPage,
  pairedChangePage,
  welchPage,
  signedRankPage,
  mannWhitneyPage,
  welchAnovaPage,
  oneWayAnovaPage,
  brownForsythePage,
  tukeyKramerPage,
  kruskalWallisPage,
  dunnPage,
  jonckheerePage,
  friedmanPage,
  multiplicityPage,
  hedgesGPage,
  standardisedResponseMeanPage,
  standardisedMeanDifferencePage,
  minimalDetectableChangePage,
  distributionsPage,
  roundingPage,
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
