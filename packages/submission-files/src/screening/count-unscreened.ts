import type { FindingLog } from '../finding-log.ts';

/** After these nobody has looked at all of the cells of a file. */
const unscreened = ['F03', 'F05', 'F40', 'F41', 'F42', 'F43', 'F48'] as const;

/** Grows with every file that was not read to its end or not in all its parts, so that nobody knows whether it identifies somebody. */
export const countUnscreened = (log: FindingLog): number => unscreened.reduce((sum, rule) => sum + log.count(rule), log.incomplete.size);
