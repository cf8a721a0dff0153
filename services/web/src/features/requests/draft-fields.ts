/** Fields of the draft that are typed freely before they are values: dates and lists of addresses. And where a refusal is shown. */
import { missingParts } from '@cairnstep/contract';
import type { RequestForm } from '@cairnstep/contract';
import { placed } from '../../lib/field-problems.ts';
import type { PlacedProblem } from '../../lib/field-problems.ts';

const isoDate = /^\d{4}-\d{2}-\d{2}$/;

/** Null while it is not a day of the calendar. */
export function readDate(text: string): string | null {
  const written = text.trim();
  if (!isoDate.test(written)) return null;
  const day = new Date(`${written}T00:00:00Z`);
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(written) ? written : null;
}

const address = /^[^\s@]+@[^\s@]+\.[^\s@]+$/;

/** One e-mail address in each line, or separated by commas. */
export function readTeam(text: string): { readonly team: string[]; readonly unreadable: string[] } {
  const written = text.split(/[\s,;]+/).filter((part) => part !== '');
  return { team: written.filter((part) => address.test(part)), unreadable: written.filter((part) => !address.test(part)) };
}

export const justificationId = (table: string): string => `justification-${table}`;

/** Ids of the fields by the pointers of a refusal; the deeper pointers first, so that they find their own field. */
export function fieldIdsOf({ tables }: Pick<RequestForm, 'tables'>): Record<string, string> {
  return {
    ...Object.fromEntries(tables.map(({ table }, index) => [`/form/tables/${index}/justification`, justificationId(table)])),
    '/form/title': 'title',
    '/form/question': 'question',
    '/form/laySummary': 'lay-summary',
    '/form/purpose': 'purpose',
    '/form/ethicsCommittee': 'ethics-committee',
    '/form/ethicsReference': 'ethics-reference',
    '/form/ethicsExpiresOn': 'ethics-expires-on',
    '/form/organisationType': 'organisation-type',
    '/form/country': 'country',
    '/form/commercialInterest': 'commercial-interest',
    '/form/funding': 'funding',
    '/form/storage': 'storage',
    '/form/tables': 'tables',
    '/form/team': 'team',
    '/form/months': 'months',
    '/form/agreesToPublish': 'agrees-to-publish',
    '/form/agreesToCollaborate': 'agrees-to-collaborate',
    '/form/agreesToReturn': 'agrees-to-return',
    '/form/termsAccepted': 'terms-accepted',
  };
}

interface Typed {
  readonly ethicsExpiresOn: string;
  readonly team: string;
}

/** All that the page itself can tell is wrong or missing before anything is sent; each field once. `today` as 2026-12-31. */
export function draftProblems(form: RequestForm, typed: Typed, today: string): PlacedProblem[] {
  const unreadable = typedProblems(typed);
  const missing = placed(missingParts(form, today), fieldIdsOf(form));
  return [...unreadable, ...missing.filter(({ fieldId }) => !unreadable.some((one) => one.fieldId === fieldId))];
}

function typedProblems(typed: Typed): PlacedProblem[] {
  const problems: PlacedProblem[] = [];
  if (typed.ethicsExpiresOn.trim() !== '' && readDate(typed.ethicsExpiresOn) === null)
    problems.push({ fieldId: 'ethics-expires-on', message: 'Write the day as year, month and day, for example 2027-06-30.' });
  const { unreadable } = readTeam(typed.team);
  if (unreadable.length > 0)
    problems.push({ fieldId: 'team', message: `Write whole e-mail addresses, one a line. Not one: ${unreadable.join(', ')}.` });
  return problems;
}
