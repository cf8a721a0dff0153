import type { RequestForm } from './requests.ts';

/** A draft of which nothing but the cohort is known. */
export const emptyRequestForm = (cohort: RequestForm['cohort']): RequestForm => ({
  title: '',
  question: '',
  laySummary: '',
  purpose: null,
  ethicsCommittee: '',
  ethicsReference: '',
  ethicsExpiresOn: null,
  organisationType: null,
  country: null,
  commercialInterest: null,
  funding: '',
  storage: '',
  tables: [],
  team: [],
  months: null,
  agreesToPublish: null,
  agreesToCollaborate: null,
  agreesToReturn: null,
  termsAccepted: false,
  cohort,
});
