/** What a request wants to do with the data: the answers that the matching needs. */
import type { IsoDate } from './iso-date.ts';

export const purposes = {
  condition_research: 'research on a condition',
  biomedical_research: 'biomedical research on no condition in particular',
  methods_development: 'developing methods, software or algorithms',
  control_set: 'comparison group for research on a condition',
  ancestry: 'research on population origins or ancestry',
  social_science: 'social science',
  clinical_care: 'care of patients',
  not_research: 'something other than research or care',
} as const;
export type Purpose = keyof typeof purposes;

export type OrganisationType = 'not_for_profit' | 'for_profit' | 'unknown';

export interface IntendedUse {
  readonly purpose: Purpose;
  /** Conditions studied, codes of the condition tree. Always the most specific ones. */
  readonly conditions: readonly string[];
  /** The requester claims that a condition is related to the consented one although the tree does not show it. */
  readonly claimsRelatedCondition?: boolean;
  /** Social science with a stated bearing on health. */
  readonly hasHealthLink?: boolean;
  /** Kinds of research, as codes. */
  readonly researchTypes?: readonly string[];
  readonly genetics: 'none' | 'genotype' | 'genotype_and_phenotype';
  /** Only aggregate figures for general use leave, no rows. */
  readonly isGeneralAggregate?: boolean;
  /** Type of every organisation on the request. */
  readonly organisations: readonly OrganisationType[];
  readonly hasCommercialPurpose: boolean | 'unclear';
  /** Where the organisations, the people and the computers are: ISO 3166-1 two-letter codes. */
  readonly countries: readonly string[];
  readonly users?: readonly string[];
  readonly projects?: readonly string[];
  readonly institutions?: readonly string[];
  readonly ethicsApproval?: { readonly lastDay: IsoDate };
  /** Duties accepted or declined; left out = not answered. */
  readonly agreesToPublish?: boolean;
  readonly agreesToCollaborate?: boolean;
  readonly agreesToReturn?: boolean;
  readonly plannedPublication?: IsoDate;
  /** The day on which the decision is made, or made again before a download. */
  readonly decisionDate: IsoDate;
  /** First day of access; without it, the decision date. */
  readonly accessStart?: IsoDate;
  /** Whole months of access asked for, from 1. */
  readonly months: number;
}
