/**
 * The determinate classification written a second time, step by step in the order the standard states it, with no
 * regard to speed and nothing shared with the classifier under test. Tests compare the two.
 *
 * Takes exams without NT and without tags only.
 */
import type { Exam, SideExam } from '../src/exam.ts';
import type { ResultName } from './flat-results.ts';

const order = 'C1 C2 C3 C4 C5 C6 C7 C8 T1 T2 T3 T4 T5 T6 T7 T8 T9 T10 T11 T12 L1 L2 L3 L4 L5 S1 S2 S3 INT'.split(' ');
const dermatomes = order.slice(1, 28);
const arms = ['C5', 'C6', 'C7', 'C8', 'T1'] as const;
const legs = ['L2', 'L3', 'L4', 'L5', 'S1'] as const;

const place = (level: string) => order.indexOf(level);
const mostRostral = (found: string[]) => order[Math.min(...found.map(place))] as string;

function sensoryLevel(side: SideExam): string {
  let last = 'C1';
  for (const name of [...dermatomes, 'S4_5'] as (keyof SideExam['lightTouch'])[]) {
    if (side.lightTouch[name] !== '2' || side.pinPrick[name] !== '2') return last;
    last = name;
  }
  return 'INT';
}

function scan(side: SideExam, muscles: readonly (keyof SideExam['motor'])[], before: string): string | undefined {
  let previous = before;
  for (const muscle of muscles) {
    const grade = Number(side.motor[muscle]);
    if (grade <= 2) return previous;
    if (grade <= 4) return muscle;
    previous = muscle;
  }
  return undefined;
}

function motorLevel(side: SideExam, sensory: string, vac: string): string {
  if (place(sensory) < place('C4')) return sensory;
  const arm = scan(side, arms, 'C4');
  if (arm !== undefined) return arm;
  if (place(sensory) < place('T2')) return 'T1';
  if (place(sensory) <= place('T12')) return sensory;
  const leg = scan(side, legs, 'L1');
  if (leg !== undefined) return leg;
  if (place(sensory) < place('S2')) return 'S1';
  if (sensory !== 'INT') return sensory;
  return vac === 'Yes' ? 'INT' : 'S3';
}

function perianal(side: SideExam): number {
  return Number(side.lightTouch.S4_5) + Number(side.pinPrick.S4_5);
}

function keyMusclesFarBelow(side: SideExam, level: string): boolean {
  return [...arms, ...legs].some((muscle) => side.motor[muscle] !== '0' && place(muscle) - place(level) > 3);
}

function nonKeyFarBelow(side: SideExam, level: string): boolean {
  return side.nonKey !== undefined && place(side.nonKey) - place(level) > 3;
}

function sensoryZone(side: SideExam, dap: string): string {
  if (dap === 'Yes' || perianal(side) > 0) return 'NA';
  const felt = dermatomes.filter((name) => {
    const segment = name as keyof SideExam['lightTouch'];
    return side.lightTouch[segment] !== '0' || side.pinPrick[segment] !== '0';
  });
  return felt.at(-1) ?? 'C1';
}

function motorZone(side: SideExam, level: string, vac: string, ais: string): string {
  if (vac === 'Yes') return 'NA';
  const reached = [level, ...[...arms, ...legs].filter((muscle) => side.motor[muscle] !== '0')];
  if (ais === 'C' && side.nonKey !== undefined && nonKeyFarBelow(side, level)) reached.push(side.nonKey);
  return order[Math.max(...reached.map(place))] as string;
}

export type NaiveClassification = Record<ResultName, string>;

export function classifyNaively(exam: Exam): NaiveClassification {
  const { right, left, vac, dap } = exam;
  const sensoryRight = sensoryLevel(right);
  const sensoryLeft = sensoryLevel(left);
  const motorRight = motorLevel(right, sensoryRight, vac);
  const motorLeft = motorLevel(left, sensoryLeft, vac);
  const nli = mostRostral([sensoryRight, sensoryLeft, motorRight, motorLeft]);

  const complete = vac === 'No' && dap === 'No' && perianal(right) + perianal(left) === 0;
  const sensorySacral = dap === 'Yes' || perianal(right) + perianal(left) > 0;
  const movementFarBelow =
    keyMusclesFarBelow(right, motorRight) ||
    nonKeyFarBelow(right, motorRight) ||
    keyMusclesFarBelow(left, motorLeft) ||
    nonKeyFarBelow(left, motorLeft);
  const motorIncomplete = vac === 'Yes' || (sensorySacral && movementFarBelow);

  const below = [right, left].flatMap((side) =>
    [...arms, ...legs].filter((muscle) => place(muscle) > place(nli)).map((muscle) => Number(side.motor[muscle])),
  );
  const strong = below.filter((grade) => grade >= 3).length;

  let ais: string;
  if (complete) ais = 'A';
  else if (nli === 'INT' && vac === 'Yes') ais = exam.earlierDeficit === true ? 'E' : 'none';
  else if (!motorIncomplete) ais = 'B';
  else ais = strong >= below.length / 2 ? 'D' : 'C';

  return {
    sensoryRight,
    sensoryLeft,
    motorRight,
    motorLeft,
    nli,
    completeness: complete ? 'C' : 'I',
    ais,
    zppSensoryRight: sensoryZone(right, dap),
    zppSensoryLeft: sensoryZone(left, dap),
    zppMotorRight: motorZone(right, motorRight, vac, ais),
    zppMotorLeft: motorZone(left, motorLeft, vac, ais),
  };
}
