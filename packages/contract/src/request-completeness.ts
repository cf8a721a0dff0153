/** What a request must state before stewards see it. Every gap at once, placed where the form can show it. */
import { consentQuestions } from './requests.ts';
import type { ConsentQuestion, RequestForm } from './requests.ts';

export interface MissingPart {
  /** Into the body of saving a request: `/form/title`. */
  readonly pointer: string;
  readonly detail: string;
}

/** `today` as 2026-12-31: an ethics approval may have run out. Whether the registry knows the team, it alone can tell. */
export function missingParts(form: RequestForm, today: string): MissingPart[] {
  const issues: MissingPart[] = [];
  const ask = (missing: boolean, field: string, detail: string) => {
    if (missing) issues.push({ pointer: `/form/${field}`, detail });
  };
  const isShort = (text: string, least: number) => text.trim().length < least;
  ask(isShort(form.title, 5), 'title', 'Give the request a title of at least 5 characters.');
  ask(isShort(form.question, 20), 'question', 'State the research question in a sentence or two.');
  ask(isShort(form.laySummary, 50), 'laySummary', 'Describe the project in words a participant can follow.');
  ask(form.purpose === null, 'purpose', 'Choose the purpose; consent is matched against it.');
  ask(form.commercialInterest === null, 'commercialInterest', 'Say whether anyone has a commercial interest.');
  ask(isShort(form.ethicsCommittee, 3), 'ethicsCommittee', 'Name the ethics committee.');
  ask(isShort(form.ethicsReference, 2), 'ethicsReference', 'Give the reference of the ethics approval.');
  ask(form.ethicsExpiresOn === null, 'ethicsExpiresOn', 'Give the last day of the ethics approval.');
  ask(form.ethicsExpiresOn !== null && form.ethicsExpiresOn < today, 'ethicsExpiresOn', 'The ethics approval has run out.');
  ask(form.organisationType === null, 'organisationType', 'Say whether your organisation works for profit.');
  ask(form.country === null, 'country', 'Choose the country where the team and the files are.');
  ask(isShort(form.storage, 10), 'storage', 'Say where the files will be kept and who can reach them.');
  ask(form.tables.length === 0, 'tables', 'Choose at least one table.');
  form.tables.forEach((one, index) =>
    ask(isShort(one.justification, 10), `tables/${index}/justification`, 'Say why this table is needed.'),
  );
  ask(new Set(form.tables.map((one) => one.table)).size < form.tables.length, 'tables', 'A table is asked for once.');
  ask(form.months === null, 'months', 'Say for how many months access is needed.');
  for (const field of ['agreesToPublish', 'agreesToCollaborate', 'agreesToReturn'] as const)
    ask(form[field] === null, field, 'Answer yes or no: some participants consented on this condition only.');
  ask(!form.termsAccepted, 'termsAccepted', 'Accept the terms: no re-identification, no passing on, destroy at the end.');
  return issues;
}

/** The questions a person's consent may turn on that are not answered yet. */
export const openConsentQuestions = (form: RequestForm): ConsentQuestion[] => consentQuestions.filter((field) => form[field] === null);
