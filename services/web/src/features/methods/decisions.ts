/** What the registry decides itself, in the order of the index. */
import { baselineAndEnd } from './decisions/baseline-and-end.tsx';
import { classification } from './decisions/classification.tsx';
import { consentMatching } from './decisions/consent-matching.tsx';
import { disclosure } from './decisions/disclosure.tsx';
import { exportProtection } from './decisions/export-protection.tsx';
import { groupsAndBands } from './decisions/groups-and-bands.tsx';
import type { Decision } from './decision.ts';

export const decisions: readonly Decision[] = [
  classification,
  groupsAndBands,
  baselineAndEnd,
  disclosure,
  exportProtection,
  consentMatching,
];
