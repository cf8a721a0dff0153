import type { NotDeterminable } from './assign-by-set.ts';
import { assignBySet, notDeterminable } from './assign-by-set.ts';
import type { AisGrade } from './classification.ts';
import { place } from './level-bits.ts';
import type { Level } from './segments.ts';

/** The reporting groups of the International SCI Data Sets (DeVivo et al., Spinal Cord 2011;49:596-9). */
export const reportingGroups = {
  id: 'reporting-1',
  groups: [
    { id: 'ventilator', label: 'Ventilator-dependent, any level and grade' },
    { id: 'c1_c4_abc', label: 'C1–C4, AIS A–C' },
    { id: 'c5_c8_abc', label: 'C5–C8, AIS A–C' },
    { id: 't1_s3_abc', label: 'T1–S3, AIS A–C' },
    { id: 'ais_d', label: 'AIS D, any level' },
  ],
  /** Counted beside the groups, never folded into them. */
  outside: [
    { id: 'ais_e', label: 'AIS E' },
    { id: 'no_grade', label: 'Normal, no earlier deficit on record' },
    { id: 'unknown', label: 'Level, grade or ventilator use not recorded' },
  ],
} as const;
export type ReportingGroupId = (typeof reportingGroups)['groups'][number]['id'] | (typeof reportingGroups)['outside'][number]['id'];

export interface ReportingFacts {
  /** Undefined when not recorded. */
  readonly ventilator: boolean | undefined;
  /** Every level it can be; undefined when not recorded. */
  readonly nli: readonly Level[] | undefined;
  /** Every grade it can be; undefined when not recorded. */
  readonly ais: readonly AisGrade[] | undefined;
}

function groupWithoutLevel(grade: AisGrade): ReportingGroupId | undefined {
  if (grade === 'E') return 'ais_e';
  if (grade === 'none') return 'no_grade';
  return grade === 'D' ? 'ais_d' : undefined;
}

function groupOf(level: Level, grade: AisGrade): ReportingGroupId {
  const group = groupWithoutLevel(grade);
  if (group !== undefined) return group;
  if (place[level] <= place.C4) return 'c1_c4_abc';
  return place[level] <= place.C8 ? 'c5_c8_abc' : 't1_s3_abc';
}

/** An intact level and a normal grade only ever occur together. */
function canOccur(level: Level, grade: AisGrade): boolean {
  return (level === 'INT') === (grade === 'E' || grade === 'none');
}

/**
 * The reporting group of one person. Ventilator dependence goes before level and grade; D and E need no level. Not
 * determinable when the values that level and grade can have fall in different groups, or contradict each other.
 */
export function reportingGroup({ ventilator, nli, ais }: ReportingFacts): ReportingGroupId | NotDeterminable {
  if (ventilator === true) return 'ventilator';
  if (ventilator === undefined || ais === undefined) return 'unknown';
  if (ais.every((grade) => groupWithoutLevel(grade) !== undefined)) return assignBySet(ais, (grade) => groupOf('INT', grade));
  if (nli === undefined) return 'unknown';
  const pairs = nli.flatMap((level) => ais.filter((grade) => canOccur(level, grade)).map((grade) => ({ level, grade })));
  return pairs.length === 0 ? notDeterminable : assignBySet(pairs, ({ level, grade }) => groupOf(level, grade));
}
