/** Levels and grades of people as printed in papers, for tests of grouping. */
import type { AisGrade } from '../src/classification.ts';
import type { Level } from '../src/segments.ts';

/**
 * Edwards et al., Spinal Cord 2022;60:522-32 (PMC9209325), table 3, the first 15 rows: chronic injury, AIS C and D. The
 * four levels of each person as printed, left and right where they differ.
 */
export const edwards2022: readonly { readonly ais: AisGrade; readonly motor: readonly Level[]; readonly sensory: readonly Level[] }[] = [
  { ais: 'C', motor: ['T1', 'T2'], sensory: ['T2', 'C8'] },
  { ais: 'C', motor: ['L1'], sensory: ['T10', 'L4'] },
  { ais: 'C', motor: ['T11'], sensory: ['T11'] },
  { ais: 'D', motor: ['C3', 'C6'], sensory: ['C3', 'C4'] },
  { ais: 'D', motor: ['C6', 'T1'], sensory: ['C7', 'C4'] },
  { ais: 'D', motor: ['C6', 'C7'], sensory: ['C6', 'T8'] },
  { ais: 'C', motor: ['T1'], sensory: ['T1'] },
  { ais: 'D', motor: ['C5', 'C7'], sensory: ['C5', 'T10'] },
  { ais: 'D', motor: ['T1', 'C7'], sensory: ['C4'] },
  { ais: 'C', motor: ['C7'], sensory: ['T2'] },
  { ais: 'C', motor: ['T7', 'T6'], sensory: ['T7', 'T6'] },
  { ais: 'D', motor: ['C5', 'C3'], sensory: ['C5', 'C3'] },
  { ais: 'C', motor: ['L1', 'T10'], sensory: ['L1', 'T10'] },
  { ais: 'D', motor: ['T5', 'T7'], sensory: ['T5', 'T7'] },
  { ais: 'C', motor: ['L1'], sensory: ['C6', 'L1'] },
];

/** Khan et al., J Neuroeng Rehabil 2019 (doi 10.1186/s12984-019-0585-x), table 1: all 12 people. */
export const khan2019: readonly { readonly nli: Level; readonly ais: AisGrade }[] = [
  { nli: 'T3', ais: 'B' },
  { nli: 'C7', ais: 'C' },
  { nli: 'C6', ais: 'C' },
  { nli: 'T6', ais: 'A' },
  { nli: 'T4', ais: 'A' },
  { nli: 'T3', ais: 'A' },
  { nli: 'T7', ais: 'A' },
  { nli: 'T9', ais: 'A' },
  { nli: 'T10', ais: 'B' },
  { nli: 'T4', ais: 'C' },
  { nli: 'C6', ais: 'D' },
  { nli: 'T7', ais: 'A' },
];

/** Clin Neurophysiol 2012;123:558-68 (PMC3270316), table 1: all 7 people, complete injuries, with months since injury. */
export const completeInjuries2012: readonly { readonly nli: Level; readonly ais: AisGrade; readonly months: number }[] = [
  { nli: 'T8', ais: 'A', months: 38 },
  { nli: 'C6', ais: 'A', months: 15 },
  { nli: 'T10', ais: 'A', months: 21 },
  { nli: 'T7', ais: 'A', months: 3 },
  { nli: 'T4', ais: 'A', months: 18 },
  { nli: 'T6', ais: 'A', months: 49 },
  { nli: 'T10', ais: 'A', months: 25 },
];
