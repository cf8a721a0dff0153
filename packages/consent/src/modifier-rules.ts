/** Each modifier of a consent on its own, against a use. CC, NMDS, NPOA and NCTRL bear on the purpose: `purpose-rules.ts`. */
import type { ConsentModifier } from './consent-record.ts';
import type { Findings } from './findings.ts';
import type { IntendedUse } from './intended-use.ts';
import { addDays, addMonths, requireIsoDate } from './iso-date.ts';
import type { DutyCode, ReasonCode } from './reasons.ts';
import type { LocalFlag, ModifierCode } from './terms.ts';

type Rule = (modifier: ConsentModifier, use: IntendedUse, findings: Findings) => void;

const nothing: Rule = () => undefined;

export const modifierRules: Readonly<Record<ModifierCode | LocalFlag, Rule>> = {
  CC: nothing,
  NMDS: nothing,
  NPOA: nothing,
  NCTRL: nothing,
  NAGR: (_, use, { refuse }) => {
    if (use.isGeneralAggregate === true) refuse('aggregate_use_forbidden');
  },
  GSO: (_, use, { refuse }) => {
    if (use.genetics === 'none') refuse('not_a_genetic_study');
  },
  RS: researchType,
  NPU: (_, use, findings) => requireNotForProfitUsers(use, findings),
  NCU: (_, use, findings) => requireNonCommercialPurpose(use, findings),
  NPUNCU: (_, use, findings) => {
    requireNotForProfitUsers(use, findings);
    requireNonCommercialPurpose(use, findings);
  },
  GS: area,
  TS: timeLimit,
  MOR: moratorium,
  US: approvedOnly((use) => use.users, 'user_not_approved'),
  PS: approvedOnly((use) => use.projects, 'project_not_approved'),
  IS: approvedOnly((use) => use.institutions, 'institution_not_approved'),
  IRB: ethics,
  PUB: accepted((use) => use.agreesToPublish, 'publication_refused', 'publish_results'),
  COL: accepted((use) => use.agreesToCollaborate, 'collaboration_refused', 'collaborate'),
  RTN: accepted((use) => use.agreesToReturn, 'return_refused', 'return_results'),
};

/** First day of access: the day access is granted, which the ontology leaves open. */
export function accessStartOf(use: IntendedUse): string {
  return requireIsoDate(use.accessStart ?? use.decisionDate);
}

/** Last day of access, that day included. */
export function accessEndOf(use: IntendedUse): string {
  return lastDayAfter(use, use.months);
}

function lastDayAfter(use: IntendedUse, months: number): string {
  return addDays(addMonths(accessStartOf(use), months), -1);
}

function isWholeMonths(months: number | undefined): months is number {
  return months !== undefined && Number.isSafeInteger(months) && months >= 1;
}

function researchType({ researchType: allowed }: ConsentModifier, use: IntendedUse, { ask, refuse }: Findings): void {
  const asked = use.researchTypes ?? [];
  if (allowed === undefined || !allowed.coded || asked.length === 0) ask('research_type_needs_reading');
  else if (!asked.includes(allowed.value)) refuse('research_type_not_covered');
  else if (asked.some((type) => type !== allowed.value)) ask('research_type_needs_reading');
}

function requireNotForProfitUsers({ organisations }: IntendedUse, { ask, refuse }: Findings): void {
  if (organisations.includes('for_profit')) refuse('for_profit_organisation');
  if (organisations.length === 0 || organisations.includes('unknown')) ask('organisation_type_unknown');
}

function requireNonCommercialPurpose({ hasCommercialPurpose }: IntendedUse, { ask, refuse }: Findings): void {
  if (hasCommercialPurpose === true) refuse('commercial_purpose');
  if (hasCommercialPurpose === 'unclear') ask('commercial_purpose_unclear');
}

function area({ countries: allowed = [] }: ConsentModifier, { countries }: IntendedUse, { ask, refuse }: Findings): void {
  if (allowed.length === 0) ask('area_value_missing');
  else if (countries.some((country) => !allowed.includes(country))) refuse('outside_area');
  else if (countries.length === 0) ask('location_unknown');
}

function timeLimit({ months }: ConsentModifier, use: IntendedUse, { ask, refuse, owe }: Findings): void {
  if (!isWholeMonths(months)) ask('months_value_missing');
  else if (use.months > months) refuse('longer_than_time_limit');
  else owe('stop_at_time_limit', lastDayAfter(use, months));
}

function moratorium({ until, months }: ConsentModifier, use: IntendedUse, { ask, refuse, owe }: Findings): void {
  const firstDay = until ?? (isWholeMonths(months) ? addMonths(accessStartOf(use), months) : undefined);
  if (firstDay === undefined) ask('moratorium_date_missing');
  else if (use.plannedPublication !== undefined && requireIsoDate(use.plannedPublication) < requireIsoDate(firstDay)) {
    refuse('publication_before_moratorium');
  } else owe('no_publication_before_date', requireIsoDate(firstDay));
}

/** A restriction to a list: everybody (everything) on the request must be on it, and the request must say who (what). */
function approvedOnly(named: (use: IntendedUse) => readonly string[] | undefined, notApproved: ReasonCode): Rule {
  return ({ approved = [] }, use, { ask, refuse }) => {
    const asked = named(use) ?? [];
    if (approved.length === 0) ask('approved_list_missing');
    else if (asked.length === 0 || asked.some((one) => !approved.includes(one))) refuse(notApproved);
  };
}

function ethics(_: ConsentModifier, use: IntendedUse, { refuse, owe }: Findings): void {
  if (use.ethicsApproval === undefined) {
    refuse('ethics_document_missing');
    return;
  }
  const lastDay = requireIsoDate(use.ethicsApproval.lastDay);
  if (lastDay < use.decisionDate) refuse('ethics_document_expired');
  else if (lastDay < accessEndOf(use)) owe('renew_ethics', lastDay);
}

/** A duty the requester accepts, declines, or leaves unanswered. */
function accepted(answer: (use: IntendedUse) => boolean | undefined, declined: ReasonCode, duty: DutyCode): Rule {
  return (_, use, { ask, refuse, owe }) => {
    const given = answer(use);
    if (given === undefined) ask('duty_not_answered');
    else if (given) owe(duty);
    else refuse(declined);
  };
}
