/** What the registry decides where the published sources leave a choice. Change one only with the reason written down. */
import type { ConditionTree } from './condition-tree.ts';
import { conditionTree } from './condition-tree.ts';

export interface ConsentPolicy {
  readonly conditionTree: ConditionTree;
  /**
   * Methods development under a consent for a condition without NMDS, when the request does not stay within the condition. The matching
   * table in the ontology's repository lets it through; read against the definition of DS that is generous, hence the choice.
   */
  readonly methodsUnderConditionConsent: 'permitted' | 'manual_review';
  /** Data held already, after a withdrawal that asks for no new data only: left out, or used as consented before. */
  readonly heldDataAfterWithdrawal: 'left_out' | 'as_consented';
}

export const defaultPolicy: ConsentPolicy = {
  conditionTree,
  methodsUnderConditionConsent: 'permitted',
  heldDataAfterWithdrawal: 'left_out',
};
