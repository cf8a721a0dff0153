/** Whether one person's consent, as stored, permits the use a request describes. */
import { consentFromRow, decideUse, type IntendedUse, type UseDecision } from '@cairnstep/consent';
import type { Form } from './requests.repository.ts';

type StoredConsent = Readonly<Record<string, string | number | null>>;

const answer = (field: 'yes' | 'no' | null): boolean | undefined => (field === null ? undefined : field === 'yes');
const given = <K extends string, T>(key: K, value: T | undefined): Partial<Record<K, T>> =>
  value === undefined ? {} : ({ [key]: value } as Record<K, T>);

/** The registry holds people with one condition, so that is what a request for research on a condition studies. */
function intendedUse(form: Form, today: string): IntendedUse {
  const purpose = form.purpose ?? 'not_research';
  return {
    purpose,
    conditions: purpose === 'biomedical_research' ? [] : ['spinal_cord_injury'],
    genetics: 'none',
    organisations: [form.organisationType ?? 'unknown'],
    hasCommercialPurpose: form.commercialInterest === null ? 'unclear' : form.commercialInterest === 'yes',
    countries: form.country === null ? [] : [form.country],
    decisionDate: today,
    months: form.months ?? 1,
    ...given('ethicsApproval', form.ethicsExpiresOn === null ? undefined : { lastDay: form.ethicsExpiresOn }),
    ...given('agreesToPublish', answer(form.agreesToPublish)),
    ...given('agreesToCollaborate', answer(form.agreesToCollaborate)),
    ...given('agreesToReturn', answer(form.agreesToReturn)),
  };
}

/**
 * A stored row that cannot be read as a consent permits nothing: the matching is then told that there is none.
 *
 * Two things the matching could use are not given, because the registry does not hold them: the country of a site, and the
 * calendar day of anybody's first training day (days of people are counted from it, so that it need not be known). Consent to use in
 * the clinic's own country and consent that ends on a day are therefore left to a person, and rows leave only on a consent that permits.
 */
function readConsent(row: StoredConsent): ReturnType<typeof consentFromRow> | undefined {
  const cells = Object.fromEntries(Object.entries(row).filter((entry): entry is [string, string | number] => entry[1] !== null));
  try {
    return consentFromRow(cells);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

export const verdictOn = (row: StoredConsent | undefined, form: Form, today: string): UseDecision =>
  decideUse(row === undefined ? undefined : readConsent(row), intendedUse(form, today));
