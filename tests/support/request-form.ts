/** Access requests as a researcher fills them in. */
import { emptyRequestForm, type RequestForm } from '../../packages/contract/src/index.ts';

export const emptyForm: RequestForm = emptyRequestForm({ outcome: 'tmwt_ss', inDevice: false, cells: [] });

export const completeForm: RequestForm = {
  ...emptyForm,
  title: 'Walking speed after a course of supported training',
  question: 'How does self-selected walking speed change over one course, by level and grade of injury?',
  laySummary:
    'We want to describe how fast people walk before and after a course of training, so that clinics can tell people what others like them reached.',
  purpose: 'condition_research',
  ethicsCommittee: 'Committee of Lakeside University',
  ethicsReference: 'LU-2026-118',
  ethicsExpiresOn: '2099-12-31',
  organisationType: 'not_for_profit',
  country: 'NL',
  commercialInterest: 'no',
  storage: 'Encrypted share of the university, reached by the named team only.',
  tables: [
    { table: 'participants', justification: 'Level and grade define the groups.' },
    { table: 'outcomes', justification: 'The walking speeds are the outcome.' },
  ],
  months: 12,
  agreesToPublish: 'yes',
  agreesToCollaborate: 'yes',
  agreesToReturn: 'yes',
  termsAccepted: true,
};
