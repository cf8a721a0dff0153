/** Cells that could not be tested, and cells that another condition affects. */
import { cellKey, keyMuscles, levels, sensorySegments, sides } from '@cairnstep/scoring';
import type { CellKey } from '@cairnstep/scoring';
import type { Random } from '../random.ts';
import { classifySheet, firstLegMuscle, perianal, shows } from './exam-sheet.ts';
import type { ExamSheet, Marks } from './exam-sheet.ts';
import type { ShownSheet } from './recovered-sheet.ts';

export interface UnclearCells {
  readonly marks: Marks;
  readonly ntReason?: string;
  readonly tagCause?: string;
  /** Which result the marks leave open on purpose. */
  readonly open?: 'nli' | 'ais';
}

const clear: UnclearCells = { marks: {} };
const mostTries = 12;

function marked(keys: readonly CellKey[], written: string): Marks {
  return Object.fromEntries(keys.map((key) => [key, written]));
}

const feels = (sheet: ExamSheet): boolean =>
  sides.every((side) => (sheet[side].touch[perianal] ?? 0) > 0 || (sheet[side].prick[perianal] ?? 0) > 0);

/** The pressure test may be left out when touch or prick is felt at S4-5. */
function pressureSkipped({ sheet, finding }: ShownSheet): UnclearCells {
  const marks: Marks = { dap: 'NT' };
  return feels(sheet) && shows(classifySheet(sheet, marks), finding) ? { marks, ntReason: 'sacral_sparing_felt' } : clear;
}

const legSegments = ['L2', 'L3', 'L4', 'L5', 'S1'] as const;

/** Part of a leg that a cast, a dressing or pain kept from being tested, without changing level or grade. */
function partUntested(random: Random, { sheet, finding }: ShownSheet): UnclearCells {
  for (let tries = 0; tries < mostTries; tries += 1) {
    const side = random.pick(sides);
    const segments = legSegments.slice(random.whole(0, 4)).slice(0, random.whole(1, 2));
    const keys = segments.flatMap((segment) => [
      cellKey(side, 'motor', segment),
      ...(random.chance(0.5) ? [cellKey(side, 'lightTouch', segment), cellKey(side, 'pinPrick', segment)] : []),
    ]);
    const marks = marked(keys, 'NT');
    const ntReason = random.weighted({ cast_or_dressing: 4, pain: 3, contracture: 2, declined: 1 });
    if (shows(classifySheet(sheet, marks), finding)) return { marks, ntReason };
  }
  return clear;
}

/** Cells untested just where level or grade is decided. */
function resultOpen(random: Random, { sheet, finding }: ShownSheet): UnclearCells {
  const nli = levels.indexOf(finding.nli);
  const segment = sensorySegments[nli];
  for (let tries = 0; tries < mostTries; tries += 1) {
    const open = segment !== undefined && random.chance(0.5) ? 'nli' : 'ais';
    const keys: CellKey[] =
      open === 'nli' && segment !== undefined
        ? sides.flatMap((side) => [cellKey(side, 'lightTouch', segment), cellKey(side, 'pinPrick', segment)])
        : sides.flatMap((side) =>
            keyMuscles.slice(firstLegMuscle).flatMap((muscle) => (random.chance(0.5) ? [cellKey(side, 'motor', muscle)] : [])),
          );
    const marks = marked(keys, 'NT');
    const found = classifySheet(sheet, marks);
    const isOpen = found[open].values.length > 1;
    const other = open === 'nli' ? found.ais : found.nli;
    if (isOpen && other.values.length === 1) return { marks, ntReason: random.pick(['cooperation', 'medical', 'pain']), open };
  }
  return clear;
}

/** A muscle that another condition weakens: of an arm above the level, treated as normal, or of a leg below it. */
function starred(random: Random, { sheet, finding }: ShownSheet): UnclearCells {
  const aboveLevel = levels.indexOf(finding.nli) > levels.indexOf('T1');
  for (let tries = 0; tries < mostTries; tries += 1) {
    const side = random.pick(sides);
    const muscle = aboveLevel ? random.pick(['C8', 'T1'] as const) : random.pick(['L4', 'L5', 'S1'] as const);
    const index = keyMuscles.indexOf(muscle);
    const score = sheet[side].muscles[index] ?? 0;
    const written = aboveLevel ? `${random.whole(3, 4)}**` : `${Math.min(score, 4)}*`;
    const marks = marked([cellKey(side, 'motor', muscle)], written);
    const tagCause = aboveLevel
      ? random.weighted({ peripheral_nerve: 5, brachial_plexus: 2, fracture_or_cast: 1 })
      : random.weighted({ fracture_or_cast: 3, pain: 2, contracture: 2, peripheral_nerve: 1 });
    if (score < 5 === !aboveLevel && shows(classifySheet(sheet, marks), finding)) return { marks, tagCause };
  }
  return clear;
}

/** Most exams are clear; the others get one kind of unclear cells. Grade E is left alone. */
export function unclearCells(random: Random, shown: ShownSheet): UnclearCells {
  if (shown.finding.grade === 'E') return clear;
  switch (random.weighted({ clear: 80, pressure: 9, part: 5.5, star: 3.5, open: 2.5 })) {
    case 'pressure':
      return pressureSkipped(shown);
    case 'part':
      return partUntested(random, shown);
    case 'star':
      return starred(random, shown);
    case 'open':
      return resultOpen(random, shown);
    case 'clear':
      return clear;
  }
}
