/**
 * The purpose of a use against the permission of a consent.
 *
 * | purpose              | NRES   | GRU     | HMB               | DS                                          | POA |
 * | -------------------- | ------ | ------- | ----------------- | ------------------------------------------- | --- |
 * | condition research   | yes    | yes     | yes               | if every requested condition is covered     | no  |
 * | biomedical research  | yes    | yes     | yes               | no, unless it names conditions, as above    | no  |
 * | methods development  | yes    | yes     | yes               | yes (policy); with NMDS if covered          | no  |
 * | control set          | yes    | yes     | yes               | if covered                                  | no  |
 * | ancestry             | yes    | yes     | no                | no                                          | yes |
 * | social science       | yes    | yes     | no; review if a health link is claimed | no                     | no  |
 * | clinical care        | yes    | with CC | with CC           | with CC, if covered                         | no  |
 * | not research         | review | no      | no                | no                                          | no  |
 *
 * Source: definitions, comments and matching tables of the Data Use Ontology's repository (see `terms.ts`); where they leave a point
 * open it goes to a person. Permissions widen from DS over HMB to GRU; NPU and NCU below NPUNCU are no such order.
 */
import { coverageOf } from './condition-coverage.ts';
import type { Findings } from './findings.ts';
import type { IntendedUse } from './intended-use.ts';
import type { ConsentPolicy } from './policy.ts';
import type { ReasonCode } from './reasons.ts';
import type { PermissionCode, TermCode } from './terms.ts';

export interface PurposeQuestion {
  readonly permission: PermissionCode;
  /** With DS. */
  readonly conditions: readonly string[];
  /** Modifiers and flags that bear on the purpose. */
  readonly carries: (code: TermCode) => boolean;
  readonly use: IntendedUse;
  readonly policy: ConsentPolicy;
}

export function applyPurpose(question: PurposeQuestion, findings: Findings): void {
  if (question.permission === 'DS' && question.conditions.length === 0) findings.ask('ds_without_condition');
  rules[question.use.purpose](question, findings);
}

type Rule = (question: PurposeQuestion, findings: Findings) => void;

const rules: Readonly<Record<IntendedUse['purpose'], Rule>> = {
  condition_research: biomedical,
  biomedical_research: biomedical,
  methods_development: methodsDevelopment,
  control_set: controlSet,
  ancestry,
  social_science: socialScience,
  clinical_care: clinicalCare,
  not_research: ({ permission }, { ask, refuse }) => {
    if (permission === 'NRES') ask('non_research_use');
    else refuse('not_research');
  },
};

function biomedical(question: PurposeQuestion, findings: Findings): void {
  if (question.permission === 'POA') findings.refuse('purpose_outside_permission');
  else if (question.permission === 'DS') requireCoverage(question, findings, 'condition_not_covered');
}

function methodsDevelopment(question: PurposeQuestion, findings: Findings): void {
  const { permission, use, policy } = question;
  if (permission === 'POA') findings.refuse('purpose_outside_permission');
  else if (!question.carries('NMDS')) {
    const isOpen = permission === 'DS' && policy.methodsUnderConditionConsent === 'manual_review';
    if (isOpen && !staysWithinConditions(question)) findings.ask('methods_outside_condition');
  } else if (use.conditions.length === 0) findings.refuse('methods_research_forbidden');
  else if (permission === 'DS') requireCoverage(question, findings, 'condition_not_covered');
  else if (use.conditions.length === 1) findings.ask('methods_within_condition');
  else findings.refuse('methods_research_forbidden');
}

function controlSet(question: PurposeQuestion, findings: Findings): void {
  if (question.permission === 'POA') findings.refuse('purpose_outside_permission');
  else if (question.permission === 'DS') requireCoverage(question, findings, 'control_set_other_condition');
  else if (question.carries('NCTRL')) findings.refuse('control_use_forbidden');
}

function ancestry({ permission, carries }: PurposeQuestion, { refuse }: Findings): void {
  if (permission === 'HMB' || permission === 'DS') refuse('ancestry_outside_hmb');
  if (carries('NPOA')) refuse('ancestry_forbidden');
}

function socialScience({ permission, use }: PurposeQuestion, { ask, refuse }: Findings): void {
  if (permission === 'NRES' || permission === 'GRU') return;
  if (permission === 'HMB' && use.hasHealthLink === true) ask('health_link_unclear');
  else refuse('purpose_outside_permission');
}

function clinicalCare(question: PurposeQuestion, findings: Findings): void {
  if (question.permission === 'NRES') return;
  if (question.permission === 'POA') findings.refuse('purpose_outside_permission');
  else if (!question.carries('CC')) findings.refuse('clinical_care_not_consented');
  else if (question.permission === 'DS') requireCoverage(question, findings, 'condition_not_covered');
}

function requireCoverage({ conditions, use, policy }: PurposeQuestion, findings: Findings, outside: ReasonCode): void {
  if (use.conditions.length === 0) {
    findings.refuse('no_condition_stated');
    return;
  }
  if (conditions.length === 0) return;
  const coverage = coverageOf(conditions, use.conditions, policy.conditionTree, use.claimsRelatedCondition === true);
  if (coverage.isOutside) findings.refuse(outside);
  for (const code of coverage.open) findings.ask(code);
}

function staysWithinConditions({ conditions, use, policy }: PurposeQuestion): boolean {
  return use.conditions.length > 0 && coverageOf(conditions, use.conditions, policy.conditionTree, false).isCovered;
}
