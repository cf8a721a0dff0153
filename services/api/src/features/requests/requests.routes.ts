import type { ResponseOf } from '@cairnstep/contract';
import type { listRequests as ListRequests } from '@cairnstep/contract';
import { hasRole, type Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { route, type Route } from '../../http/route.ts';
import { decideRequest } from './decide-request.ts';
import { createRequest, deleteDraft, saveRequest, submitRequest, withdrawRequest } from './edit-request.ts';
import { getReach } from './reach.ts';
import { presentById, standingOf } from './read-request.ts';
import { whyNotVote } from './request.present.ts';
import { listRequests as readRequests } from './requests.repository.ts';

const listRequests = ({ database }: Context, actor: Actor): Promise<ResponseOf<typeof ListRequests>> =>
  asActor(database, actor, async (tx) => {
    const requests: ResponseOf<typeof ListRequests>['requests'] = [];
    for (const request of await readRequests(tx)) {
      const waitsForYou = hasRole(actor, 'steward') && whyNotVote(actor, request, await standingOf(tx, actor, request)) === null;
      requests.push({
        id: request.id,
        number: request.number,
        title: request.form.title,
        status: request.status,
        lead: request.lead,
        submittedAt: request.submittedAt?.toISOString() ?? null,
        updatedAt: request.updatedAt.toISOString(),
        waitsForYou,
      });
    }
    return { requests };
  });

export const requestRoutes = (context: Context): Route[] => [
  route('listRequests', (actor) => listRequests(context, actor)),
  route('getRequest', (actor, { requestId }) => asActor(context.database, actor, (tx) => presentById(tx, actor, requestId))),
  route('createRequest', (actor, input, { requestId }) => createRequest(context, actor, input, requestId)),
  route('saveRequest', (actor, input) => saveRequest(context, actor, input)),
  route('submitRequest', (actor, input, { requestId }) => submitRequest(context, actor, input, requestId)),
  route('withdrawRequest', (actor, input, { requestId }) => withdrawRequest(context, actor, input, requestId)),
  route('deleteDraft', (actor, input, { requestId }) => deleteDraft(context, actor, input, requestId)),
  route('getReach', (actor, input) => getReach(context, actor, input)),
  route('decideRequest', (actor, input, { requestId }) => decideRequest(context, actor, input, requestId)),
];
