/**
 * The npm package `isncsci` 2.0.6 as a second opinion, for tests and benchmarks only. Its stars are left out: they are
 * known to be incomplete.
 */
import { ISNCSCI } from 'isncsci';
import type { Exam as PeerExam } from 'isncsci';
import type { Totals } from '../src/classification.ts';
import type { Exam, SideExam } from '../src/exam.ts';
import type { ResultName } from './flat-results.ts';

function peerSide(side: SideExam): PeerExam['right'] {
  const { lightTouch, pinPrick, motor, nonKey } = side;
  return {
    lightTouch,
    pinPrick,
    motor,
    ...(nonKey === undefined ? {} : { lowestNonKeyMuscleWithMotorFunction: nonKey }),
  } as PeerExam['right'];
}

export function toPeerExam(exam: Exam): PeerExam {
  return { right: peerSide(exam.right), left: peerSide(exam.left), voluntaryAnalContraction: exam.vac, deepAnalPressure: exam.dap };
}

export function classifyByPeer(exam: PeerExam): ISNCSCI {
  return new ISNCSCI(exam);
}

function values(printed: string): string[] {
  return [...new Set(printed.replaceAll('*', '').split(','))].sort();
}

/** The peer's results as sorted sets of values, under our names. */
export function peerResults(exam: Exam): { results: Record<ResultName, string[]>; totals: Totals } {
  const { classification, totals } = classifyByPeer(toPeerExam(exam));
  const { neurologicalLevels, zoneOfPartialPreservations } = classification;
  const total = (printed: string) => (printed === 'ND' ? 'ND' : Number(printed));
  return {
    results: {
      sensoryRight: values(neurologicalLevels.sensoryRight),
      sensoryLeft: values(neurologicalLevels.sensoryLeft),
      motorRight: values(neurologicalLevels.motorRight),
      motorLeft: values(neurologicalLevels.motorLeft),
      nli: values(classification.neurologicalLevelOfInjury),
      completeness: values(classification.injuryComplete),
      ais: values(classification.ASIAImpairmentScale),
      zppSensoryRight: values(zoneOfPartialPreservations.sensoryRight),
      zppSensoryLeft: values(zoneOfPartialPreservations.sensoryLeft),
      zppMotorRight: values(zoneOfPartialPreservations.motorRight),
      zppMotorLeft: values(zoneOfPartialPreservations.motorLeft),
    },
    totals: {
      uer: total(totals.right.upperExtremity),
      uel: total(totals.left.upperExtremity),
      uems: total(totals.upperExtremity),
      ler: total(totals.right.lowerExtremity),
      lel: total(totals.left.lowerExtremity),
      lems: total(totals.lowerExtremity),
      ltr: total(totals.right.lightTouch),
      ltl: total(totals.left.lightTouch),
      lt: total(totals.lightTouch),
      ppr: total(totals.right.pinPrick),
      ppl: total(totals.left.pinPrick),
      pp: total(totals.pinPrick),
    },
  };
}
