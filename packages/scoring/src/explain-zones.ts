import { cellKey } from './cell-key.ts';
import type { Reason, Sheet } from './explain-sheet.ts';
import { dermatomeCells, dermatomeInWords, muscleInWords } from './explain-sheet.ts';
import { place } from './level-bits.ts';
import { perianalBit } from './read-side.ts';
import type { SensorySegment, Side } from './segments.ts';
import { keyMuscles } from './segments.ts';

/** Why the one possible sensory zone of a side came out. */
export function sensoryZoneReason(sheet: Sheet, side: Side): Reason {
  const zone = sheet.found.zppSensory[side].values[0]!;
  if (zone === 'NA') {
    const felt = sheet.findings[side].mustBeFelt & perianalBit;
    return felt
      ? {
          because: `Not applicable: on the ${side}, ${dermatomeInWords(sheet, side, 'S4_5')} is felt.`,
          cells: dermatomeCells(side, 'S4_5'),
        }
      : { because: 'Not applicable: deep anal pressure is felt.', cells: ['dap'] };
  }
  const sacral = ['dap' as const, ...dermatomeCells(side, 'S4_5')];
  const absent = `On the ${side} nothing is felt at S4-5 and deep anal pressure is absent.`;
  if (zone === 'C1') return { because: `${absent} No dermatome has any sensation, so the zone ends at C1.`, cells: sacral };
  const segment: SensorySegment = zone;
  return {
    because: `${absent} ${dermatomeInWords(sheet, side, segment)} is the lowest dermatome with any sensation.`,
    cells: [...sacral, ...dermatomeCells(side, segment)],
  };
}

/** Why the one possible motor zone of a side came out. */
export function motorZoneReason(sheet: Sheet, side: Side): Reason {
  const zone = sheet.found.zppMotor[side].values[0]!;
  if (zone === 'NA') return { because: 'Not applicable: voluntary anal contraction is present.', cells: ['vac'] };
  const motorLevel = sheet.found.motorLevel[side].values;
  const muscle = keyMuscles.find((name) => name === zone);
  const findings = sheet.findings[side];
  const moves = muscle !== undefined && (~findings.canBeStill & (1 << place[muscle])) !== 0;
  if (muscle !== undefined && moves && !(motorLevel as readonly string[]).includes(zone)) {
    return {
      because: `Voluntary anal contraction is absent. ${muscleInWords(sheet, side, muscle)} is the lowest key muscle that moves.`,
      cells: ['vac', cellKey(side, 'motor', muscle)],
    };
  }
  if (sheet.exam[side].nonKey === zone && !(motorLevel as readonly string[]).includes(zone)) {
    return {
      because: `Voluntary anal contraction is absent. The grade is C, and the non-key muscle at ${zone} moves more than three levels below the motor level ${motorLevel.join(' or ')}.`,
      cells: ['vac'],
    };
  }
  return {
    because: `Voluntary anal contraction is absent and no key muscle below the motor level moves, so the zone ends at the motor level ${zone}.`,
    cells: ['vac'],
  };
}
