import { sources } from '../sources.ts';
import type { VariableDraft } from '../define-table.ts';

/** Study days may lie ten years before the first training day and fifty after it. */
export const studyDayRange = { min: -3_650, max: 18_250 } as const;

/** The column that every table starts with. */
export const participantVariable: VariableDraft = {
  key: 'participant',
  name: 'Participant code',
  definition:
    'Code that the site made for the participant. It begins with S and cannot be turned back into a person without the key that only the site holds.',
  type: 'pseudonym',
  required: { when: 'always' },
  exposure: 'identifier',
  aliases: ['participant_code', 'pseudonym'],
  source: sources.registry,
};
