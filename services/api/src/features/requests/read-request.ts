import type { AccessRequest } from '@cairnstep/contract';
import type { z } from 'zod';
import type { Actor } from '../../authority/actor.ts';
import { requireFound } from '../../authority/require-may.ts';
import type { Tx } from '../../database/as-actor.ts';
import { presentRequest, type Standing } from './request.present.ts';
import { isTeamMember, readRequest, readVotes, type RequestRecord } from './requests.repository.ts';

export async function standingOf(tx: Tx, actor: Actor, request: RequestRecord): Promise<Standing> {
  const isLead = actor.kind === 'person' && actor.accountId === request.leadId;
  return { isLead, isMember: isLead || (await isTeamMember(tx, request.id)), votes: await readVotes(tx, request) };
}

export async function presentById(tx: Tx, actor: Actor, id: string): Promise<z.output<typeof AccessRequest>> {
  const request = requireFound(await readRequest(tx, id));
  return presentRequest(actor, request, await standingOf(tx, actor, request));
}
