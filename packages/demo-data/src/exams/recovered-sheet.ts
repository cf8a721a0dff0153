/** The exam of the same person some weeks or months later. */
import { levels, sides } from '@cairnstep/scoring';
import type { AisGrade } from '@cairnstep/scoring';
import type { Random } from '../random.ts';
import { classifySheet, copySheet, firstLegMuscle, muscleLevels, perianal, shows } from './exam-sheet.ts';
import type { ExamSheet, Finding } from './exam-sheet.ts';

export interface Recovery {
  /** Motor points to gain, as far as grade and level allow. */
  readonly points: number;
  /** The grade to change to; the old one when nothing changes. */
  readonly grade: AisGrade;
  /** Whether the level moves down by one. */
  readonly levelGained: boolean;
}

export interface ShownSheet {
  readonly sheet: ExamSheet;
  readonly finding: Finding;
}

const mostTries = 30;

function reachPerianal(random: Random, sheet: ExamSheet): ExamSheet {
  const side = sheet[random.pick(sides)];
  side.touch[perianal] = 1;
  return { ...sheet, dap: true };
}

function reachLegs(random: Random, sheet: ExamSheet): ExamSheet {
  for (const side of sides) {
    const { muscles } = sheet[side];
    for (let index = firstLegMuscle; index < muscles.length; index += 1) {
      if (random.chance(0.6)) muscles[index] = Math.max(muscles[index] ?? 0, random.whole(1, 2));
    }
  }
  return { ...sheet, vac: true };
}

/** Raises the weakest leg muscles to grade 3, as many as half of the muscles below the level need and sometimes more. */
function reachUsefulLegs(random: Random, sheet: ExamSheet): ExamSheet {
  for (const side of sides) {
    const { muscles } = sheet[side];
    for (let index = firstLegMuscle; index < muscles.length; index += 1) {
      if (random.chance(0.75)) muscles[index] = Math.max(muscles[index] ?? 0, 3);
    }
  }
  return { ...sheet, vac: true };
}

const conversions: Readonly<Partial<Record<AisGrade, (random: Random, sheet: ExamSheet) => ExamSheet>>> = {
  B: reachPerianal,
  C: reachLegs,
  D: reachUsefulLegs,
};

/** Makes the segment below the level normal. */
function gainLevel(sheet: ExamSheet, nli: number): void {
  for (const name of sides) {
    const side = sheet[name];
    side.touch[nli] = 2;
    side.prick[nli] = 2;
    muscleLevels.forEach((level, index) => {
      if (level <= nli) side.muscles[index] = 5;
      if (level === nli + 1) side.muscles[index] = Math.max(side.muscles[index] ?? 0, 3);
    });
  }
}

function raiseMuscles(random: Random, sheet: ExamSheet, points: number): void {
  const weak = sides.flatMap((side) =>
    sheet[side].muscles.flatMap((grade, index) => (grade > 0 && grade < 5 ? [{ muscles: sheet[side].muscles, index }] : [])),
  );
  for (let raised = 0; raised < points && weak.length > 0; raised += 1) {
    const { muscles, index } = random.pick(weak);
    muscles[index] = Math.min(5, (muscles[index] ?? 0) + 1);
  }
}

function recover(random: Random, { sheet, finding }: ShownSheet, { points, grade, levelGained }: Recovery): ExamSheet {
  const draft = copySheet(sheet);
  const converted = grade === finding.grade ? draft : (conversions[grade]?.(random, draft) ?? draft);
  if (levelGained) gainLevel(converted, levels.indexOf(finding.nli));
  raiseMuscles(random, converted, points);
  return converted;
}

/**
 * The exam after a recovery. What cannot be shown is given up: first points, then the gained level, then the new grade;
 * in the end the exam stays as it was.
 */
export function recoveredSheet(random: Random, before: ShownSheet, recovery: Recovery): ShownSheet {
  const { nli } = before.finding;
  const lower = levels[levels.indexOf(nli) + 1];
  const aims: Recovery[] = [
    recovery,
    { ...recovery, levelGained: false },
    { ...recovery, levelGained: false, grade: before.finding.grade },
  ];
  for (const aim of aims) {
    const finding: Finding = { nli: aim.levelGained && lower !== undefined && lower !== 'INT' ? lower : nli, grade: aim.grade };
    for (let tries = 0; tries < mostTries; tries += 1) {
      const points = Math.round(aim.points * (1 - tries / mostTries));
      const sheet = recover(random, before, { ...aim, points });
      if (shows(classifySheet(sheet), finding)) return { sheet, finding };
    }
  }
  return before;
}
