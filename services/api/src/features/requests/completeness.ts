/** What a request must state before stewards see it. Every gap at once, placed where the form can show it. */
import type { LocatedIssue } from '../../http/refusal.ts';
import type { Form } from './requests.repository.ts';

export function missingParts(form: Form, today: string): LocatedIssue[] {
  const issues: LocatedIssue[] = [];
  const ask = (missing: boolean, field: string, detail: string) => {
    if (missing) issues.push({ pointer: `/form/${field}`, detail });
  };
  ask(form.title.length < 5, 'title', 'Give the request a title of at least 5 characters.');
  ask(form.question.length < 20, 'question', 'State the research question in a sentence or two.');
  ask(form.laySummary.length < 50, 'laySummary', 'Describe the project in words a participant can follow.');
  ask(form.purpose === null, 'purpose', 'Choose the purpose; consent is matched against it.');
  ask(form.ethicsCommittee.length < 3, 'ethicsCommittee', 'Name the ethics committee.');
  ask(form.ethicsReference.length < 2, 'ethicsReference', 'Give the reference of the ethics approval.');
  ask(form.ethicsExpiresOn === null, 'ethicsExpiresOn', 'Give the last day of the ethics approval.');
  ask(form.ethicsExpiresOn !== null && form.ethicsExpiresOn < today, 'ethicsExpiresOn', 'The ethics approval has run out.');
  ask(form.organisationType === null, 'organisationType', 'Say whether your organisation works for profit.');
  ask(form.country === null, 'country', 'Choose the country where the team and the files are.');
  ask(form.commercialInterest === null, 'commercialInterest', 'Say whether anyone has a commercial interest.');
  ask(form.storage.length < 10, 'storage', 'Say where the files will be kept and who can reach them.');
  ask(form.tables.length === 0, 'tables', 'Choose at least one table.');
  form.tables.forEach((one, index) => ask(one.justification.length < 10, `tables/${index}/justification`, 'Say why this table is needed.'));
  ask(new Set(form.tables.map((one) => one.table)).size < form.tables.length, 'tables', 'A table is asked for once.');
  ask(form.months === null, 'months', 'Say for how many months access is needed.');
  for (const field of ['agreesToPublish', 'agreesToCollaborate', 'agreesToReturn'] as const) ask(form[field] === null, field, 'Answer yes or no: some participants consented on this condition only.');
  ask(!form.termsAccepted, 'termsAccepted', 'Accept the terms: no re-identification, no passing on, destroy at the end.');
  return issues;
}
