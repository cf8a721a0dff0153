/** A steward's vote, bound to one version. The last vote needed decides. */
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { decideRequest as Decide } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry, statistics, type Actor } from '../../authority/actor.ts';
import { requireFound, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { queueMail } from '../../mail/queue-mail.ts';
import { readRelease } from '../explore/explore.repository.ts';
import { presentById, standingOf } from './read-request.ts';
import { sharesInstitution, whyNotVote } from './request.present.ts';
import {
  addressesOf,
  insertVote,
  lockRequest,
  markDecided,
  readVotes,
  requireVotes,
  setStatus,
  type RequestRecord,
  type VoteRecord,
} from './requests.repository.ts';

/** As many votes of one kind as are needed decide; until then the request stays under review, a split vote included. */
function outcomeOf(votes: readonly VoteRecord[], needed: number): 'approved' | 'declined' | null {
  const count = (kind: VoteRecord['vote']) => votes.filter((vote) => vote.vote === kind).length;
  if (count('approve') >= needed) return 'approved';
  if (count('decline') >= needed) return 'declined';
  return null;
}

const letter = (request: RequestRecord, decision: 'approved' | 'declined', votes: readonly VoteRecord[], address: string): string =>
  [
    `Request ${request.number}, “${request.form.title}”, was ${decision}.`,
    '',
    ...votes.map((vote) => `${vote.vote === 'approve' ? 'Approved' : 'Declined'}: ${vote.reason}`),
    '',
    decision === 'approved'
      ? `Build and download the export at ${address}. Re-identification of participants is forbidden; destroy the files when access ends.`
      : `You may write a new request. See ${address}.`,
  ].join('\n');

export async function decideRequest(
  { config, database }: Context,
  actor: Actor,
  { requestId: id, versionHash, vote, reason }: InputOf<typeof Decide>,
  requestId: string,
): Promise<ResponseOf<typeof Decide>> {
  const steward = requirePerson(actor);
  const release = await asActor(database, statistics, (tx) => readRelease(tx, undefined));
  return asActor(database, actor, async (tx) => {
    const request = requireFound(await lockRequest(tx, id));
    const standing = await standingOf(tx, actor, request);
    if (standing.isMember) throw new Refusal('conflict-of-interest', 'You belong to the team of this request.');
    if (standing.votes.some((one) => one.stewardId === steward.accountId))
      throw new Refusal('already-voted', 'Your first decision stands.');
    if (request.versionHash !== versionHash)
      throw new Refusal('request-not-in-state', 'The request has changed since you read it. Read it again; nothing was decided.');
    const why = whyNotVote(actor, request, standing);
    if (why !== null)
      throw new Refusal(
        request.status === 'submitted' || request.status === 'in_review' ? 'conflict-of-interest' : 'request-not-in-state',
        why,
      );
    let needed = request.votesNeeded;
    if (sharesInstitution(actor, request) && needed < 2) {
      needed = 2;
      await requireVotes(tx, id, needed, [...request.votesNeededBecause, 'The first steward shares the requester’s institution.']);
    }
    await insertVote(tx, request, steward.accountId, vote, reason);
    const votes = await readVotes(tx, request);
    const decision = outcomeOf(votes, needed);
    if (decision === null) await setStatus(tx, id, 'in_review');
    else {
      await markDecided(tx, id, decision, request.form.months ?? 1, release?.number ?? null);
      const recipients = await asActor(database, registry, (other) =>
        addressesOf(other, [request.leadId, ...votes.map((one) => one.stewardId)]),
      );
      for (const recipient of recipients) {
        await queueMail(tx, {
          event: `request-decided:${id}:${request.version}`,
          recipient,
          subject: `Cairnstep: request ${request.number} ${decision}`,
          body: letter(request, decision, votes, `${config.PUBLIC_URL}/requests/${id}`),
        });
      }
    }
    await recordAudit(tx, actor, {
      act: `request.${vote}`,
      object: id,
      requestId,
      detail: { version: request.version, hash: versionHash, decided: decision ?? 'open' },
    });
    return presentById(tx, actor, id);
  });
}
