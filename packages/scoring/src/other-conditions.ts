import type { Classification } from './classification.ts';

/**
 * Whether conditions other than the spinal cord injury (tagged cells) change the level of injury, the grade, both or
 * neither: the one summary the International SCI Core Data Set 3.0 asks for (Spinal Cord 2023;61:65-68).
 */
export function affectedByOtherConditions({ nli, ais }: Classification): 'none' | 'nli' | 'ais' | 'both' {
  if (nli.tagged && ais.tagged) return 'both';
  if (nli.tagged) return 'nli';
  return ais.tagged ? 'ais' : 'none';
}
