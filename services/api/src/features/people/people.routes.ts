/** People, grants and invitations. */
import { randomBytes, randomUUID } from 'node:crypto';
import type { InputOf, ResponseOf, Role } from '@cairnstep/contract';
import type { endGrant, giveGrant, invitePerson, revokeInvitation, setPersonStatus } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { route, type Route } from '../../http/route.ts';
import { queueMail } from '../../mail/queue-mail.ts';
import { hashToken } from '../account/invitations.repository.ts';
import {
  accountsWithAddress,
  holdsAlready,
  insertGrant,
  insertInvitation,
  listInvitations,
  listPeople,
  lockGrantsOf,
  markRevoked,
  readInvitation,
  readPerson,
  siteName,
  stopGrant,
  updateStatus,
} from './people.repository.ts';
import { listVisibleSites } from './sites.repository.ts';

const invitationDays = 7;
const siteRoles: readonly Role[] = ['therapist', 'coordinator'];

/** A site role names a site, any other role none. */
async function requireFittingSite(tx: Tx, role: Role, siteId: string | null): Promise<string | null> {
  const needed = siteRoles.includes(role);
  const pointer = '/body/siteId';
  if (needed && siteId === null)
    throw new Refusal('invalid-input', 'Nothing was kept.', [{ pointer, detail: 'Choose the site this person works at.' }]);
  if (!needed && siteId !== null)
    throw new Refusal('invalid-input', 'Nothing was kept.', [{ pointer, detail: 'This role belongs to no site.' }]);
  if (siteId === null) return null;
  const name = await siteName(tx, siteId);
  if (name === null) throw new Refusal('invalid-input', 'Nothing was kept.', [{ pointer, detail: 'Choose a site of the registry.' }]);
  return name;
}

function refuseOneself(actor: Actor, personId: string): void {
  if (requirePerson(actor).accountId === personId)
    throw new Refusal('grant-to-oneself', 'Ask another administrator to change your roles or your account.');
}

export function peopleRoutes({ config, database, clock }: Context): Route[] {
  const invite = (actor: Actor, input: InputOf<typeof invitePerson>, requestId: string): Promise<ResponseOf<typeof invitePerson>> =>
    asActor(database, actor, async (tx) => {
      const person = requirePerson(actor);
      const site = await requireFittingSite(tx, input.role, input.siteId);
      const token = randomBytes(32).toString('base64url');
      const id = randomUUID();
      const expiresAt = new Date(clock().getTime() + invitationDays * 86_400_000);
      await insertInvitation(tx, { id, ...input, tokenHash: hashToken(token), invitedBy: person.accountId, expiresAt });
      await queueMail(tx, {
        event: `invitation:${id}`,
        recipient: input.email,
        subject: 'An invitation to Cairnstep',
        body: [
          `${person.name} invites you to the Cairnstep registry as ${input.role}${site ? ` of ${site}` : ''}.`,
          '',
          'Open this address and sign in with your organisation’s account. It works once and for seven days:',
          `${config.PUBLIC_URL}/invitation/${token}`,
          '',
          `If you did not expect this, do nothing, or tell ${config.CONTACT}.`,
        ].join('\n'),
      });
      await recordAudit(tx, actor, {
        act: 'invitation.send',
        object: id,
        requestId,
        detail: { role: input.role },
        ...(input.siteId ? { site: input.siteId } : {}),
      });
      return { ...requireFound(await readInvitation(tx, id)), accountsWithAddress: await accountsWithAddress(tx, input.email) };
    });

  const revoke = (actor: Actor, { invitationId }: InputOf<typeof revokeInvitation>, requestId: string) =>
    asActor(database, actor, async (tx) => {
      const invitation = requireFound(await readInvitation(tx, invitationId));
      if (invitation.status !== 'sent') throw new Refusal('invitation-unusable', 'It was used, taken back or has expired already.');
      await markRevoked(tx, invitationId);
      await recordAudit(tx, actor, { act: 'invitation.revoke', object: invitationId, requestId });
      return requireFound(await readInvitation(tx, invitationId));
    });

  const give = (actor: Actor, input: InputOf<typeof giveGrant>, requestId: string) =>
    asActor(database, actor, async (tx) => {
      refuseOneself(actor, input.personId);
      requireFound(await readPerson(tx, input.personId));
      await requireFittingSite(tx, input.role, input.siteId);
      if (input.endsOn !== null && input.endsOn < input.startsOn) {
        throw new Refusal('invalid-input', 'Nothing was kept.', [
          { pointer: '/body/endsOn', detail: 'The last day lies before the first.' },
        ]);
      }
      await lockGrantsOf(tx, input.personId);
      if (await holdsAlready(tx, input)) {
        throw new Refusal(
          'already-held',
          'The person has this role on at least one of these days. Nothing was changed. For another last day, end the role and give it again.',
        );
      }
      await insertGrant(tx, { id: randomUUID(), ...input, givenBy: requirePerson(actor).accountId });
      await recordAudit(tx, actor, {
        act: 'grant.give',
        object: input.personId,
        requestId,
        detail: { role: input.role },
        ...(input.siteId ? { site: input.siteId } : {}),
      });
      return requireFound(await readPerson(tx, input.personId));
    });

  const end = (actor: Actor, { personId, grantId }: InputOf<typeof endGrant>, requestId: string) =>
    asActor(database, actor, async (tx) => {
      refuseOneself(actor, personId);
      requireFound(await readPerson(tx, personId));
      if (!(await stopGrant(tx, personId, grantId))) requireFound(null);
      await recordAudit(tx, actor, { act: 'grant.end', object: personId, requestId, detail: { grant: grantId } });
      return requireFound(await readPerson(tx, personId));
    });

  const setStatus = (actor: Actor, { personId, status }: InputOf<typeof setPersonStatus>, requestId: string) =>
    asActor(database, actor, async (tx) => {
      refuseOneself(actor, personId);
      requireFound(await readPerson(tx, personId));
      await updateStatus(tx, personId, status);
      await recordAudit(tx, actor, { act: status === 'disabled' ? 'account.disable' : 'account.enable', object: personId, requestId });
      return requireFound(await readPerson(tx, personId));
    });

  return [
    route('listPeople', (actor) =>
      asActor(database, actor, async (tx) => ({ people: await listPeople(tx), invitations: await listInvitations(tx) })),
    ),
    route('listSites', (actor) => asActor(database, actor, async (tx) => ({ sites: await listVisibleSites(tx) }))),
    route('invitePerson', (actor, input, { requestId }) => invite(actor, input, requestId)),
    route('revokeInvitation', (actor, input, { requestId }) => revoke(actor, input, requestId)),
    route('giveGrant', (actor, input, { requestId }) => give(actor, input, requestId)),
    route('endGrant', (actor, input, { requestId }) => end(actor, input, requestId)),
    route('setPersonStatus', (actor, input, { requestId }) => setStatus(actor, input, requestId)),
  ];
}
