import type { Rule } from '../checking/rule.ts';
import { filledWhereRequired } from './cells/f20-filled-where-required.ts';
import { withinHardLimits } from './cells/f21-within-hard-limits.ts';
import { withinPlausibleLimits } from './cells/f22-within-plausible-limits.ts';
import { onAStep } from './cells/f23-on-a-step.ts';
import { emptyWhereNotApplicable } from './cells/f24-empty-where-not-applicable.ts';
import { nothingComputed } from './cells/f25-nothing-computed.ts';
import { keyOccursOnce } from './records/f30-key-occurs-once.ts';
import { consentInForce } from './records/f31-consent-in-force.ts';
import { noDataAfterWithdrawal } from './records/f32-no-data-after-withdrawal.ts';
import { peopleEnteredTwice } from './records/f33-people-entered-twice.ts';
import { rowsAllAlike } from './records/f34-rows-all-alike.ts';
import { sessionTotals } from './records/f35-session-totals.ts';
import { yearOfInjury } from './records/f36-year-of-injury.ts';
import { consentEndsAfterItBegins } from './records/f37-consent-ends-after-it-begins.ts';
import { codeInUse } from './records/f38-code-in-use.ts';
import { knownParticipant } from './records/r01-known-participant.ts';
import { boutHasASession } from './records/r02-bout-has-a-session.ts';
import { eventNamesASession } from './records/r03-event-names-a-session.ts';
import { sessionNumberOnceInACourse } from './records/r04-session-number-once-in-a-course.ts';
import { injuryAfterBirth } from './records/r05-injury-after-birth.ts';
import { scimTotal } from './assessments/c01-scim-total.ts';
import { motorScoresEqualExam } from './assessments/c02-motor-scores-equal-exam.ts';
import { diastolicBelowSystolic } from './assessments/c03-diastolic-below-systolic.ts';
import { spasmSeverity } from './assessments/c04-spasm-severity.ts';
import { walkingLevelAndTests } from './assessments/c05-walking-level-and-tests.ts';
import { speedFromTime } from './assessments/c06-speed-from-time.ts';
import { sixMinuteSpeed } from './assessments/c07-six-minute-speed.ts';
import { fastNotBelowSelfSelected } from './assessments/c08-fast-not-below-self-selected.ts';
import { upAndGoTime } from './assessments/c09-up-and-go-time.ts';
import { walkingLevelAndAids } from './assessments/c10-walking-level-and-aids.ts';
import { balanceAndWalking } from './assessments/c11-balance-and-walking.ts';
import { mobilityWithoutWalking } from './assessments/c12-mobility-without-walking.ts';
import { completeInjuryAndWalking } from './assessments/c15-complete-injury-and-walking.ts';
import { largeChange } from './assessments/c17-large-change.ts';
import { orderOfAssessments } from './assessments/c18-order-of-assessments.ts';
import { gradeEIsFull } from './exams/c13-grade-e-is-full.ts';
import { gradeBWithoutLegMovement } from './exams/c14-grade-b-without-leg-movement.ts';
import { starsHaveACause } from './exams/e01-stars-have-a-cause.ts';
import { notTestableHasAReason } from './exams/e02-not-testable-has-a-reason.ts';
import { nonKeyMuscleHasEffect } from './exams/e03-non-key-muscle-has-effect.ts';
import { normalButForTheAnus } from './exams/e04-normal-but-for-the-anus.ts';
import { perianalAboveS3 } from './exams/e05-perianal-above-s3.ts';
import { oldEnoughForTheExam } from './exams/e06-old-enough-for-the-exam.ts';
import { examAfterInjury } from './exams/e07-exam-after-injury.ts';
import { earlyExam } from './exams/e08-early-exam.ts';
import { recordedEqualsComputed } from './exams/e09-recorded-equals-computed.ts';
import { meanSpeed } from './training/t01-mean-speed.ts';
import { treadmillSpeed } from './training/t02-treadmill-speed.ts';
import { stepsAndDistance } from './training/t03-steps-and-distance.ts';
import { stepLength } from './training/t04-step-length.ts';
import { cadence } from './training/t05-cadence.ts';
import { weightSupport } from './training/t06-weight-support.ts';
import { deviceAndSurface } from './training/t07-device-and-surface.ts';
import { controlAndDevice } from './training/t08-control-and-device.ts';
import { fadingSignal } from './training/t09-fading-signal.ts';
import { partsWithinTheSession } from './training/t10-parts-within-the-session.ts';
import { walkingWithinUpright } from './training/t11-walking-within-upright.ts';
import { orderOfPressures } from './training/t12-order-of-pressures.ts';
import { pressureRiseDecided } from './training/t13-pressure-rise-decided.ts';
import { pressureDropDecided } from './training/t14-pressure-drop-decided.ts';
import { brokenSkinIsAnEvent } from './training/t15-broken-skin-is-an-event.ts';
import { spacingOfSessions } from './training/t16-spacing-of-sessions.ts';
import { volitionalWithoutStrength } from './training/t17-volitional-without-strength.ts';
import { heartRateAndEffort } from './training/t18-heart-rate-and-effort.ts';
import { seriousByDefinition } from './events/a01-serious-by-definition.ts';
import { fatalSeverityAndOutcome } from './events/a02-fatal-severity-and-outcome.ts';
import { dysreflexiaRise } from './events/a03-dysreflexia-rise.ts';
import { hypotensionDrop } from './events/a04-hypotension-drop.ts';
import { lastingRednessIsAnEvent } from './events/a05-lasting-redness-is-an-event.ts';
import { painThatCounts } from './events/a06-pain-that-counts.ts';
import { resolvedAfterOnset } from './events/a07-resolved-after-onset.ts';
import { decidedEpisodeIsAnEvent } from './events/a08-decided-episode-is-an-event.ts';

/** Checks of single cells, which need nothing but their row. */
export const cellRules: readonly Rule[] = [
  filledWhereRequired,
  withinHardLimits,
  withinPlausibleLimits,
  onAStep,
  emptyWhereNotApplicable,
  nothingComputed,
];

/** Every check of a submission, in the order in which findings are worked off: single cells first, then records, then medicine. */
export const submissionRules: readonly Rule[] = [
  ...cellRules,
  keyOccursOnce,
  consentInForce,
  noDataAfterWithdrawal,
  peopleEnteredTwice,
  rowsAllAlike,
  sessionTotals,
  yearOfInjury,
  consentEndsAfterItBegins,
  codeInUse,
  knownParticipant,
  boutHasASession,
  eventNamesASession,
  sessionNumberOnceInACourse,
  injuryAfterBirth,
  scimTotal,
  motorScoresEqualExam,
  diastolicBelowSystolic,
  spasmSeverity,
  walkingLevelAndTests,
  speedFromTime,
  sixMinuteSpeed,
  fastNotBelowSelfSelected,
  upAndGoTime,
  walkingLevelAndAids,
  balanceAndWalking,
  mobilityWithoutWalking,
  completeInjuryAndWalking,
  largeChange,
  orderOfAssessments,
  gradeEIsFull,
  gradeBWithoutLegMovement,
  starsHaveACause,
  notTestableHasAReason,
  nonKeyMuscleHasEffect,
  normalButForTheAnus,
  perianalAboveS3,
  oldEnoughForTheExam,
  examAfterInjury,
  earlyExam,
  recordedEqualsComputed,
  meanSpeed,
  treadmillSpeed,
  stepsAndDistance,
  stepLength,
  cadence,
  weightSupport,
  deviceAndSurface,
  controlAndDevice,
  fadingSignal,
  partsWithinTheSession,
  walkingWithinUpright,
  orderOfPressures,
  pressureRiseDecided,
  pressureDropDecided,
  brokenSkinIsAnEvent,
  spacingOfSessions,
  volitionalWithoutStrength,
  heartRateAndEffort,
  seriousByDefinition,
  fatalSeverityAndOutcome,
  dysreflexiaRise,
  hypotensionDrop,
  lastingRednessIsAnEvent,
  painThatCounts,
  resolvedAfterOnset,
  decidedEpisodeIsAnEvent,
];
