/** A requester's own acts: begin, keep, delete, hand in, take back. */
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import { missingParts } from '@cairnstep/contract';
import type {
  createRequest as Create,
  deleteDraft as Delete,
  getRequest as Get,
  saveRequest as Save,
  submitRequest as Submit,
  withdrawRequest as Withdraw,
} from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry, type Actor } from '../../authority/actor.ts';
import { requireFound, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { queueMail } from '../../mail/queue-mail.ts';
import { presentById } from './read-request.ts';
import {
  addressesOfRole,
  deleteRequest,
  insertRequest,
  lockRequest,
  markSubmitted,
  replaceMembers,
  researchersByAddress,
  setStatus,
  updateForm,
  type RequestRecord,
  type Status,
} from './requests.repository.ts';

type RequestOut = ResponseOf<typeof Get>;

async function lockOwn(tx: Tx, actor: Actor, id: string, states: readonly Status[]): Promise<RequestRecord> {
  const request = requireFound(await lockRequest(tx, id));
  // A team member sees the request; only its lead changes it.
  if (request.leadId !== requirePerson(actor).accountId) requireFound(null);
  if (!states.includes(request.status))
    throw new Refusal('request-not-in-state', 'Open it again to see where it stands. Nothing was changed.');
  return request;
}

export const createRequest = (
  { database, clock }: Context,
  actor: Actor,
  { form }: InputOf<typeof Create>,
  requestId: string,
): Promise<RequestOut> =>
  asActor(database, actor, async (tx) => {
    const id = await insertRequest(tx, requirePerson(actor).accountId, form, clock().getUTCFullYear());
    await recordAudit(tx, actor, { act: 'request.begin', object: id, requestId });
    return presentById(tx, actor, id);
  });

export const saveRequest = ({ database }: Context, actor: Actor, { requestId: id, form }: InputOf<typeof Save>): Promise<RequestOut> =>
  asActor(database, actor, async (tx) => {
    await updateForm(tx, await lockOwn(tx, actor, id, ['draft']), form);
    return presentById(tx, actor, id);
  });

export async function submitRequest(
  { config, database, clock }: Context,
  actor: Actor,
  { requestId: id }: InputOf<typeof Submit>,
  requestId: string,
): Promise<RequestOut> {
  const person = requirePerson(actor);
  const draft = await asActor(database, actor, (tx) => lockOwn(tx, actor, id, ['draft']));
  const { team, stewards } = await asActor(database, registry, async (tx) => ({
    team: await researchersByAddress(tx, draft.form.team),
    stewards: await addressesOfRole(tx, 'steward'),
  }));
  return asActor(database, actor, async (tx) => {
    const request = await lockOwn(tx, actor, id, ['draft']);
    const { form } = request;
    const issues = missingParts(form, clock().toISOString().slice(0, 10));
    form.team.forEach((address, index) => {
      if (!team.has(address.toLowerCase()))
        issues.push({
          pointer: `/form/team/${index}`,
          detail: 'No researcher of the registry has this address. Ask the registry office to invite the person first.',
        });
    });
    if (issues.length > 0) throw new Refusal('request-incomplete', 'The draft is kept. Fill in what is listed, then submit.', issues);
    await replaceMembers(tx, id, [...new Set([person.accountId, ...team.values()])]);
    const because = form.commercialInterest === 'yes' ? ['Somebody has a commercial interest.'] : [];
    await markSubmitted(tx, id, because.length > 0 ? 2 : 1, because);
    for (const recipient of stewards) {
      await queueMail(tx, {
        event: `request-submitted:${id}:${request.version}`,
        recipient,
        subject: `Cairnstep: request ${request.number} waits for a decision`,
        body: [`${request.number}: ${form.title}`, `From ${person.name}.`, '', `Review it at ${config.PUBLIC_URL}/desk/${id}`].join('\n'),
      });
    }
    await recordAudit(tx, actor, {
      act: 'request.submit',
      object: id,
      requestId,
      detail: { version: request.version, hash: request.versionHash },
    });
    return presentById(tx, actor, id);
  });
}

export const withdrawRequest = (
  { database }: Context,
  actor: Actor,
  { requestId: id }: InputOf<typeof Withdraw>,
  requestId: string,
): Promise<RequestOut> =>
  asActor(database, actor, async (tx) => {
    await lockOwn(tx, actor, id, ['submitted', 'in_review']);
    await setStatus(tx, id, 'withdrawn');
    await recordAudit(tx, actor, { act: 'request.withdraw', object: id, requestId });
    return presentById(tx, actor, id);
  });

export const deleteDraft = (
  { database }: Context,
  actor: Actor,
  { requestId: id }: InputOf<typeof Delete>,
  requestId: string,
): Promise<ResponseOf<typeof Delete>> =>
  asActor(database, actor, async (tx) => {
    await lockOwn(tx, actor, id, ['draft']);
    await deleteRequest(tx, id);
    await recordAudit(tx, actor, { act: 'request.delete', object: id, requestId });
    return {};
  });
