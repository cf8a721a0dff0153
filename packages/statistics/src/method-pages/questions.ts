/** What people come with; the Methods page groups the methods by it. */
export const questions = {
  describe: 'What does a group look like?',
  change: 'Have the same people changed?',
  'two-groups': 'Do two groups differ?',
  'several-groups': 'Do three or more groups differ?',
  shares: 'How many, and what share?',
  grades: 'How have grades moved?',
  tables: 'Do two classifications go together?',
  association: 'Do two measures go together?',
  models: 'What goes with the outcome, allowing for other things?',
  time: 'How long until it happens?',
  sites: 'Do sites differ?',
  measurement: 'How good is the measurement?',
  'every-figure': 'What stands behind every figure?',
} as const;
export type QuestionKey = keyof typeof questions;
