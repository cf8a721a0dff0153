import { cellKey } from './cell-key.ts';
import type { AisGrade } from './classification.ts';
import type { CellKey } from './exam.ts';
import type { Reason, Sheet } from './explain-sheet.ts';
import { listed, muscleInWords, perianalCells } from './explain-sheet.ts';
import { caudalTo, countBits, farBelow, keyMuscleBits, place } from './level-bits.ts';
import { perianalBit } from './read-side.ts';
import type { KeyMuscle, Level, Side } from './segments.ts';
import { keyMuscles, sides } from './segments.ts';
import { canReachThree, keyMusclesBelow, mustReachThree } from './strength.ts';

/** What each grade would take, for exams that leave several open. */
export const gradeConditions: Readonly<Record<AisGrade, string>> = {
  A: 'A if nothing is preserved at S4-5',
  B: 'B if sensation is preserved at S4-5, but neither contraction nor movement more than three levels below a motor level',
  C: 'C if motor function is preserved and fewer than half of the key muscles below the level of injury reach grade 3',
  D: 'D if motor function is preserved and at least half of them reach grade 3',
  E: 'E if everything is normal',
  none: 'no grade if everything is normal, since no earlier deficit is on record',
};

/** What is surely preserved at S4-5, in words and cells. */
export function preservedAtS45(sheet: Sheet): Reason {
  const words: string[] = [];
  const cells: CellKey[] = [];
  if (sheet.exam.vac === 'Yes') {
    words.push('voluntary anal contraction');
    cells.push('vac');
  }
  if (sheet.exam.dap === 'Yes') {
    words.push('deep anal pressure');
    cells.push('dap');
  }
  for (const side of sides) {
    if (!(sheet.findings[side].mustBeFelt & perianalBit)) continue;
    const { lightTouch, pinPrick } = sheet.exam[side];
    words.push(`${side} sensation (light touch ${lightTouch.S4_5}, pin prick ${pinPrick.S4_5})`);
    cells.push(cellKey(side, 'lightTouch', 'S4_5'), cellKey(side, 'pinPrick', 'S4_5'));
  }
  return { because: `Preserved at S4-5: ${listed(words)}.`, cells };
}

/** Complete or incomplete, where only one is possible. */
export function completenessReason(sheet: Sheet): Reason {
  if (sheet.found.completeness.values[0] === 'C') {
    return {
      because: 'Voluntary anal contraction and deep anal pressure are absent and all four scores at S4-5 are 0.',
      cells: ['vac', 'dap', ...perianalCells],
    };
  }
  return preservedAtS45(sheet);
}

/** Movement that surely lies more than three levels below a side's motor level; no words when there is none. */
function movementFarBelow(sheet: Sheet, side: Side): Reason {
  const motor = sheet.found.motorLevel[side].values;
  const lowest = place[motor.at(-1)!];
  const moving = keyMuscles.filter((muscle) => ~sheet.findings[side].canBeStill & farBelow(lowest) & (1 << place[muscle]));
  const words = moving.map((muscle) => muscleInWords(sheet, side, muscle));
  const nonKey = sheet.exam[side].nonKey;
  if (nonKey !== undefined && place[nonKey] - lowest > 3) words.push(`a non-key muscle at ${nonKey}`);
  return {
    because:
      words.length === 0
        ? ''
        : `On the ${side}, movement more than three levels below the motor level ${motor.join(' or ')}: ${listed(words)}.`,
    cells: moving.map((muscle) => cellKey(side, 'motor', muscle)),
  };
}

function motorIncompleteReason(sheet: Sheet): Reason {
  if (sheet.exam.vac === 'Yes') {
    return { because: 'Voluntary anal contraction is present, so the injury is motor incomplete.', cells: ['vac'] };
  }
  const reasons = [preservedAtS45(sheet), ...sides.map((side) => movementFarBelow(sheet, side))].filter(({ because }) => because !== '');
  return {
    because: `${reasons.map(({ because }) => because).join(' ')} So the injury is motor incomplete, not B.`,
    cells: reasons.flatMap(({ cells }) => cells),
  };
}

/** The count that decides between C and D. */
function strengthReason(sheet: Sheet, grade: AisGrade): Reason {
  const possible = sheet.found.nli.values;
  const side = grade === 'C' ? 'fewer than half' : 'at least half';
  if (possible.length > 1) {
    return { because: `At every level of injury the exam allows, ${side} of the key muscles below it reach grade 3: ${grade}.`, cells: [] };
  }
  const level: Level = possible[0]!;
  const total = keyMusclesBelow(place[level]);
  if (total === 0)
    return { because: `No key muscle lies below the level of injury ${level}, so none is under grade 3 and the grade is D.`, cells: [] };
  const below = keyMuscleBits & caudalTo(place[level]);
  const count = (reaching: (side: Side) => number) => sides.reduce((sum, which) => sum + countBits(reaching(which) & below), 0);
  const fewest = count((which) => mustReachThree(sheet.findings[which]));
  const most = count((which) => canReachThree(sheet.findings[which]));
  const counted: KeyMuscle[] = keyMuscles.filter((muscle) => below & (1 << place[muscle]));
  return {
    because: `${fewest === most ? fewest : `${fewest} to ${most}`} of the ${total} key muscles below the level of injury ${level} reach grade 3; half would be ${total / 2}, so ${side} do and the grade is ${grade}.`,
    cells: sides.flatMap((which) => counted.map((muscle) => cellKey(which, 'motor', muscle))),
  };
}

function motorCompleteReason(sheet: Sheet): Reason {
  const preserved = preservedAtS45(sheet);
  const nothing = sides.map((side) => `below the ${side} motor level ${sheet.found.motorLevel[side].values.join(' or ')}`);
  const far = sides.flatMap((side) => {
    const highest = place[sheet.found.motorLevel[side].values[0]!];
    return keyMuscles.filter((muscle) => farBelow(highest) & (1 << place[muscle])).map((muscle) => cellKey(side, 'motor', muscle));
  });
  return {
    because: `${preserved.because} Voluntary anal contraction is absent and nothing moves more than three levels ${listed(nothing)}, so the injury is motor complete: B.`,
    cells: ['vac', ...preserved.cells, ...far],
  };
}

/** Why the one possible grade came out. */
export function gradeReason(sheet: Sheet): Reason {
  const grade = sheet.found.ais.values[0]!;
  switch (grade) {
    case 'A':
      return completenessReason(sheet);
    case 'B':
      return motorCompleteReason(sheet);
    case 'C':
    case 'D': {
      const incomplete = motorIncompleteReason(sheet);
      const strength = strengthReason(sheet, grade);
      return { because: `${incomplete.because} ${strength.because}`, cells: [...incomplete.cells, ...strength.cells] };
    }
    case 'E':
      return {
        because: 'All sensation and strength are normal, contraction is present, and an earlier deficit is on record.',
        cells: ['vac'],
      };
    case 'none':
      return {
        because:
          'All sensation and strength are normal and contraction is present; without an earlier deficit on record no grade is given.',
        cells: ['vac'],
      };
  }
}
