import type { AccessRequest } from '@cairnstep/contract';
import type { z } from 'zod';
import { hasRole, type Actor } from '../../authority/actor.ts';
import type { RequestRecord, VoteRecord } from './requests.repository.ts';

type RequestOut = z.output<typeof AccessRequest>;

export interface Standing {
  readonly isLead: boolean;
  readonly isMember: boolean;
  readonly votes: readonly VoteRecord[];
}

const underReview = (status: RequestRecord['status']): boolean => status === 'submitted' || status === 'in_review';

/** Null when this steward may give a vote now. */
export function whyNotVote(actor: Actor, request: RequestRecord, { isMember, votes }: Standing): string | null {
  if (actor.kind !== 'person' || !hasRole(actor, 'steward')) return 'Stewards decide requests.';
  if (isMember) return 'You belong to the team of this request.';
  if (!underReview(request.status)) return 'The request is not under review.';
  if (votes.some((vote) => vote.stewardId === actor.accountId)) return 'You have given your decision.';
  if (sharesInstitution(actor, request) && request.votesNeeded > 1 && votes.length > 0) {
    return 'The second decision has to come from another institution than the first or the requester’s.';
  }
  return null;
}

export const sharesInstitution = (actor: Actor, request: RequestRecord): boolean =>
  actor.kind === 'person' && actor.institution !== null && actor.institution === request.institution;

/** A vote stays unseen by other stewards until they have given theirs, and by the requester until all is decided. */
function visibleVotes(actor: Actor, request: RequestRecord, { votes }: Standing): readonly VoteRecord[] {
  if (!underReview(request.status)) return votes;
  const own = actor.kind === 'person' && votes.some((vote) => vote.stewardId === actor.accountId);
  return own ? votes : [];
}

export function presentRequest(actor: Actor, request: RequestRecord, standing: Standing): RequestOut {
  const { isLead, isMember } = standing;
  const actions: RequestOut['actions'] = [];
  if (isLead && request.status === 'draft') actions.push('edit', 'submit', 'delete');
  if (isLead && underReview(request.status)) actions.push('withdraw');
  const mayNotVoteBecause = hasRole(actor, 'steward') ? whyNotVote(actor, request, standing) : null;
  if (hasRole(actor, 'steward') && mayNotVoteBecause === null) actions.push('vote');
  if (isMember && request.status === 'approved') actions.push('build-export');
  return {
    id: request.id,
    number: request.number,
    status: request.status,
    version: request.version,
    versionHash: request.versionHash,
    lead: request.lead,
    institution: request.institution,
    form: request.form,
    createdAt: request.createdAt.toISOString(),
    submittedAt: request.submittedAt?.toISOString() ?? null,
    decidedAt: request.decidedAt?.toISOString() ?? null,
    accessEndsOn: request.accessEndsOn,
    votesNeeded: request.votesNeeded,
    votesNeededBecause: [...request.votesNeededBecause],
    votes: visibleVotes(actor, request, standing).map(({ steward, vote, reason, votedAt }) => ({
      steward,
      vote,
      reason,
      at: votedAt.toISOString(),
    })),
    actions,
    mayNotVoteBecause,
  };
}
