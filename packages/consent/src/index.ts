/** Matching an intended use against consent by the GA4GH Data Use Ontology. */
export { countriesOf } from './areas.ts';
export type { ConditionTree } from './condition-tree.ts';
export { conditionTree } from './condition-tree.ts';
export type { RowContext } from './consent-from-row.ts';
export { consentFromRow } from './consent-from-row.ts';
export type { ConsentModifier, ConsentPermission, ConsentRecord, ConsentStatus, LastDay, WithdrawalScope } from './consent-record.ts';
export { decideUse } from './decide-use.ts';
export type { Duty, UseDecision, Verdict } from './findings.ts';
export type { IntendedUse, OrganisationType, Purpose } from './intended-use.ts';
export { purposes } from './intended-use.ts';
export type { IsoDate } from './iso-date.ts';
export { accessEndOf } from './modifier-rules.ts';
export type { ConsentPolicy } from './policy.ts';
export { defaultPolicy } from './policy.ts';
export type { DutyCode, ReasonCode } from './reasons.ts';
export { duties, reasons } from './reasons.ts';
export type { LocalFlag, ModifierCode, PermissionCode, Term, TermCode } from './terms.ts';
export { dataUseOntology, termCodeOf, terms } from './terms.ts';
