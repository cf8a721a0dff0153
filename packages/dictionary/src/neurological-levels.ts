/** Levels, dermatomes and key muscles of the neurological exam, from head to foot. */

const numbered = (region: string, count: number): string[] => Array.from({ length: count }, (_, index) => `${region}${index + 1}`);

/** Every level a result can name, C1 to S3. */
export const spinalLevels: readonly string[] = [...numbered('C', 8), ...numbered('T', 12), ...numbered('L', 5), ...numbered('S', 3)];

/** The 28 dermatomes tested on each side: C2 to S3, then S4-5. */
export const dermatomes: readonly string[] = [...spinalLevels.slice(1), 'S4-5'];

/** The ten key muscles tested on each side, by segment, with the movement tested. */
export const keyMuscles: readonly { readonly segment: string; readonly movement: string }[] = [
  { segment: 'C5', movement: 'elbow flexors' },
  { segment: 'C6', movement: 'wrist extensors' },
  { segment: 'C7', movement: 'elbow extensors' },
  { segment: 'C8', movement: 'finger flexors' },
  { segment: 'T1', movement: 'little-finger abductor' },
  { segment: 'L2', movement: 'hip flexors' },
  { segment: 'L3', movement: 'knee extensors' },
  { segment: 'L4', movement: 'ankle dorsiflexors' },
  { segment: 'L5', movement: 'long toe extensors' },
  { segment: 'S1', movement: 'ankle plantar flexors' },
];

/** A segment as part of a column key: `S4-5` becomes `s4_5`. */
export function segmentKey(segment: string): string {
  return segment.toLowerCase().replace('-', '_');
}
