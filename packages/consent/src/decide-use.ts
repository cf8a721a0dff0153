/**
 * Whether one participant's consent allows an intended use.
 *
 * The answer is advice to the steward and a filter on rows, never a release by itself: the ontology says in prose what a term means,
 * not formally what it permits, and has not been validated against any law. Work per participant, never per site.
 *
 * Order: state of the record, shape of the consent, purpose against permission, each modifier on its own; a refusal wins over an open
 * question, an open question over a permission. The order of codes on a record does not matter. Dates are inclusive.
 */
import { applyPurpose } from './purpose-rules.ts';
import type { ConsentRecord, LastDay } from './consent-record.ts';
import type { Findings, UseDecision } from './findings.ts';
import { decisionFrom } from './findings.ts';
import type { IntendedUse } from './intended-use.ts';
import { requireIsoDate } from './iso-date.ts';
import { accessEndOf, modifierRules } from './modifier-rules.ts';
import type { ConsentPolicy } from './policy.ts';
import { defaultPolicy } from './policy.ts';
import type { LocalFlag, ModifierCode, PermissionCode } from './terms.ts';
import { termCodeOf, terms } from './terms.ts';

/**
 * @param consent the participant's newest consent, or `undefined` when there is none
 * @throws RangeError for a malformed date, months that are no whole number from 1, or a broken condition tree
 */
export function decideUse(consent: ConsentRecord | undefined, use: IntendedUse, policy: ConsentPolicy = defaultPolicy): UseDecision {
  requireIsoDate(use.decisionDate);
  if (!Number.isSafeInteger(use.months) || use.months < 1) throw new RangeError('Access is asked for whole months from 1.');
  if (consent === undefined) return decisionFrom(({ refuse }) => refuse('no_consent_record'));
  const state = decisionFrom((findings) => applyState(consent, use, policy, findings));
  if (state.verdict === 'not_permitted') return state;
  return decisionFrom((findings) => {
    applyState(consent, use, policy, findings);
    applyTerms(consent, use, policy, findings);
  });
}

function applyState(consent: ConsentRecord, use: IntendedUse, policy: ConsentPolicy, findings: Findings): void {
  const staysUsable = policy.heldDataAfterWithdrawal === 'as_consented' && consent.withdrawalScope === 'no_new_data';
  if (consent.status === 'withdrawn' && !staysUsable) findings.refuse('consent_withdrawn');
  if (consent.status === 'superseded') findings.refuse('consent_superseded');
  if (consent.status === 'expired') findings.refuse('consent_expired');
  if (consent.lastDay === 'unknown') findings.ask('consent_end_uncertain');
  else if (consent.lastDay !== undefined) applyLastDay(consent.lastDay, use, findings);
}

function applyLastDay({ earliest, latest }: LastDay, use: IntendedUse, { refuse, ask, owe }: Findings): void {
  if (requireIsoDate(latest) < use.decisionDate) refuse('consent_expired');
  else if (requireIsoDate(earliest) < use.decisionDate) ask('consent_end_uncertain');
  else if (earliest < accessEndOf(use)) owe('stop_at_consent_end', earliest);
}

function applyTerms(consent: ConsentRecord, use: IntendedUse, policy: ConsentPolicy, findings: Findings): void {
  const permissions = consent.permissions.map((permission) => ({ ...permission, known: permissionOf(permission.code) }));
  const modifiers = consent.modifiers.map((modifier) => ({ ...modifier, known: modifierOf(modifier.code) }));
  if ([...permissions, ...modifiers].some(({ known }) => known === undefined)) findings.ask('unknown_code');
  if (permissions.length === 0) findings.refuse('no_permission_term');

  const [permission, ...others] = new Set(permissions.flatMap(({ known }) => known ?? []));
  if (others.length > 0) findings.ask('several_permissions');
  else if (permission !== undefined) {
    const conditions = permissions.flatMap(({ conditions: named = [] }) => named);
    const carries = (code: string) => modifiers.some(({ known }) => known === code);
    applyPurpose({ permission, conditions, carries, use, policy }, findings);
  }
  for (const modifier of modifiers) if (modifier.known !== undefined) modifierRules[modifier.known](modifier, use, findings);
}

function permissionOf(text: string): PermissionCode | undefined {
  const code = termCodeOf(text);
  return code !== undefined && terms[code].kind === 'permission' ? (code as PermissionCode) : undefined;
}

function modifierOf(text: string): ModifierCode | LocalFlag | undefined {
  const code = termCodeOf(text);
  return code !== undefined && terms[code].kind !== 'permission' ? (code as ModifierCode | LocalFlag) : undefined;
}
