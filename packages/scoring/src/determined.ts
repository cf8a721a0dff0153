/** Bit sets made readable: the values in printed order, and whether tags changed them. */
import type { AisGrade, Completeness, Determined, Zone } from './classification.ts';
import { aisGrades, completenessValues } from './classification.ts';
import { notApplicable } from './level-bits.ts';
import type { Level, SegmentLevel } from './segments.ts';
import { levels } from './segments.ts';

/** Turns sets of bits into values; sets of one value, by far the most common, are made once and shared. */
function reader<T>(names: readonly T[]): (bits: number, tagged: boolean) => Determined<T> {
  const single = (tagged: boolean) => names.map((name) => Object.freeze({ values: Object.freeze([name]), tagged }));
  const plain = single(false);
  const tagged = single(true);
  return (bits, isTagged) => {
    if ((bits & (bits - 1)) === 0) return (isTagged ? tagged : plain)[31 - Math.clz32(bits)]!;
    return { values: names.filter((_, index) => (bits >>> index) & 1), tagged: isTagged };
  };
}

export const determinedLevel = reader<Level>(levels);
export const determinedGrade = reader<AisGrade>(aisGrades);
export const determinedCompleteness = reader<Completeness>(completenessValues);

/** Zones are printed with `NA` first, so its bit moves in front of the levels. */
const readZone = reader<Zone>(['NA', ...levels.filter((level): level is SegmentLevel => level !== 'INT')]);

export function determinedZone(bits: number, tagged: boolean): Determined<Zone> {
  return readZone(((bits & ~notApplicable) << 1) | (bits & notApplicable ? 1 : 0), tagged);
}
