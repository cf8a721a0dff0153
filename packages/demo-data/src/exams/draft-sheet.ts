/**
 * Invents the scores of an exam that shows a given level and grade: normal above the level, altered just below it, and
 * further down as much sensation and strength as the grade leaves. Every draft is classified; one that shows something
 * else is thrown away.
 */
import { levels, sides } from '@cairnstep/scoring';
import type { AisGrade, Side } from '@cairnstep/scoring';
import type { Random } from '../random.ts';
import { classifySheet, firstLegMuscle, muscleLevels, perianal, shows } from './exam-sheet.ts';
import type { ExamSheet, Finding, SideSheet } from './exam-sheet.ts';

const place = {
  c3: levels.indexOf('C3'),
  c4: levels.indexOf('C4'),
  t1: levels.indexOf('T1'),
  l1: levels.indexOf('L1'),
  s1: levels.indexOf('S1'),
  s3: levels.indexOf('S3'),
};

const mostDrafts = 400;

/** Strength far below the level: the mean grade of the muscles, drawn once for an exam. */
function meanStrength(random: Random, grade: AisGrade): number {
  if (grade === 'C') return random.between(0.7, 2.4);
  return grade === 'D' ? random.between(3, 4.6) : 0;
}

/** The grade of a muscle below the motor level; `distance` in levels. Arms keep a little more than legs. */
function weakened(random: Random, mean: number, distance: number, isArm: boolean): number {
  if (mean > 0) return Math.max(0, Math.min(5, Math.round(random.around(mean + (isArm ? 0.5 : 0), 0.9))));
  if (distance > 3) return 0;
  return distance <= 1 ? random.whole(0, 2) : random.whole(0, 1);
}

/** The level at which the muscles of a side begin to fail, where they have a say in it; else the sensory level decides. */
function motorAim(random: Random, nli: number, sensory: number): number {
  const near = sensory + random.whole(-1, 1);
  if (sensory <= place.t1) return Math.max(nli, place.c4, Math.min(near, place.t1));
  if (sensory < place.l1 || sensory > place.s1) return sensory;
  return Math.max(nli, place.l1, Math.min(near, place.s1));
}

function drawMuscles(random: Random, sensory: number, aim: number, mean: number): number[] {
  const arms = aim <= place.t1;
  const decided = sensory > place.c3 && (arms || aim >= place.l1);
  let mayBeStrong = true;
  return muscleLevels.map((level, index) => {
    const isArm = index < firstLegMuscle;
    if (!decided) return isArm && sensory > place.t1 ? 5 : weakened(random, mean, level - sensory, isArm);
    if (level < aim) return 5;
    const weak = weakened(random, mean, level - aim, isArm);
    const isFirstBelow = mayBeStrong;
    mayBeStrong = false;
    // The motor level is either a muscle of grade 3 or 4, or the last one of grade 5 before a grade below 3.
    if (level === aim) return random.whole(3, 4);
    return isFirstBelow ? Math.min(weak, 2) : weak;
  });
}

const touchBelow = { A: {}, B: { '0': 2, '1': 6, '2': 2 }, C: { '0': 1, '1': 6, '2': 3 }, D: { '0': 0.5, '1': 4, '2': 5.5 } } as const;
const prickBelow = { A: {}, B: { '0': 5, '1': 4, '2': 1 }, C: { '0': 3, '1': 5, '2': 2 }, D: { '0': 1, '1': 4.5, '2': 4.5 } } as const;
type ImpairedGrade = keyof typeof touchBelow;

const firstAltered = [
  [1, 1],
  [1, 0],
  [2, 1],
  [1, 2],
] as const;

function drawSensation(random: Random, sensory: number, grade: ImpairedGrade): Pick<SideSheet, 'touch' | 'prick'> {
  const touch: number[] = [];
  const prick: number[] = [];
  const zoneEnd = Math.min(sensory + random.whole(0, 3), perianal - 1);
  for (let index = 0; index <= perianal; index += 1) {
    if (index < sensory) {
      touch.push(2);
      prick.push(2);
    } else if (grade === 'A') {
      touch.push(index <= zoneEnd ? 1 : 0);
      prick.push(index <= zoneEnd ? random.whole(0, 1) : 0);
    } else if (index === sensory) {
      const [light, sharp] = random.pick(firstAltered);
      touch.push(light);
      prick.push(sharp);
    } else {
      touch.push(Number(random.weighted(touchBelow[grade])));
      prick.push(Number(random.weighted(prickBelow[grade])));
    }
  }
  // Normal at S4-5 and absent at S3 hardly ever go together.
  for (const scores of [touch, prick]) if (scores[perianal] === 2 && scores[perianal - 1] === 0) scores[perianal - 1] = 1;
  return { touch, prick };
}

function normalSide(): SideSheet {
  return { touch: Array<number>(perianal + 1).fill(2), prick: Array<number>(perianal + 1).fill(2), muscles: muscleLevels.map(() => 5) };
}

const contraction: Readonly<Record<ImpairedGrade, number>> = { A: 0, B: 0, C: 0.75, D: 0.93 };
const pressure: Readonly<Record<ImpairedGrade, number>> = { A: 0, B: 0.85, C: 0.9, D: 0.96 };

function drawSheet(random: Random, nli: number, grade: ImpairedGrade): ExamSheet {
  const mean = meanStrength(random, grade);
  const leading = random.pick(sides);
  const musclesMayLead = muscleLevels.includes(nli) || nli === place.c4 || nli === place.l1;
  const musclesLead = musclesMayLead && random.chance(0.4);
  const side = (name: Side): SideSheet => {
    const leads = name === leading;
    const sensory = leads && !musclesLead ? nli : Math.min(nli + random.whole(musclesLead ? 1 : 0, 2), place.s3);
    const aim = leads && musclesLead ? nli : motorAim(random, nli, sensory);
    return { ...drawSensation(random, sensory, grade), muscles: drawMuscles(random, sensory, aim, mean) };
  };
  return { right: side('right'), left: side('left'), vac: random.chance(contraction[grade]), dap: random.chance(pressure[grade]) };
}

/** @throws Error when no draft shows the finding, which only an impossible one can cause (no grade C at S1 to S3). */
export function draftSheet(random: Random, finding: Finding): ExamSheet {
  const { nli, grade } = finding;
  if (grade === 'E' || grade === 'none') return { right: normalSide(), left: normalSide(), vac: true, dap: true };
  for (let drafts = 0; drafts < mostDrafts; drafts += 1) {
    const sheet = drawSheet(random, levels.indexOf(nli), grade);
    if (shows(classifySheet(sheet), finding)) return sheet;
  }
  throw new Error(`No exam was found that shows ${nli} ${grade}.`);
}
