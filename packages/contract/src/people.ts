/** People, their grants and invitations: the administrator's desk. Stewards see it. */
import { z } from 'zod';
import { Grant } from './account.ts';
import { endpoint } from './endpoint.ts';
import { CalendarDate, Id, Instant, Role, Site } from './vocabulary.ts';

export const Person = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string().nullable(),
  institution: z.string().nullable(),
  status: z.enum(['active', 'disabled']),
  lastSignInAt: Instant.nullable(),
  grants: z.array(Grant),
});

export const Invitation = z.strictObject({
  id: Id,
  email: z.string(),
  role: Role,
  site: Site.nullable(),
  status: z.enum(['sent', 'accepted', 'expired', 'revoked']),
  expiresAt: Instant,
});

/** The answer to sending one. E-mail recognises nobody, so the invitation is sent all the same. */
export const SentInvitation = Invitation.extend({
  /** Accounts that have this address already: their people can be given the role without an invitation. */
  accountsWithAddress: z.array(z.strictObject({ id: Id, name: z.string() })),
});

export const listPeople = endpoint({
  method: 'GET',
  path: '/api/people',
  summary: 'Everyone with an account, and open invitations',
  response: z.strictObject({ people: z.array(Person), invitations: z.array(Invitation) }),
  problems: [],
});

export const invitePerson = endpoint({
  method: 'POST',
  path: '/api/invitations',
  summary: 'Invite someone by e-mail to take a role',
  body: z.strictObject({
    email: z.email('Write an address such as name@clinic.example').max(254),
    role: Role,
    /** Required for therapist and coordinator, absent for the others. */
    siteId: Id.nullable(),
    grantEndsOn: CalendarDate.nullable(),
  }),
  response: SentInvitation,
  status: 201,
  problems: [],
});

export const revokeInvitation = endpoint({
  method: 'DELETE',
  path: '/api/invitations/:invitationId',
  summary: 'Make an invitation unusable',
  params: z.strictObject({ invitationId: Id }),
  response: Invitation,
  problems: ['not-found', 'invitation-unusable'],
});

export const giveGrant = endpoint({
  method: 'POST',
  path: '/api/people/:personId/grants',
  summary: 'Give a role to someone who already has an account',
  params: z.strictObject({ personId: Id }),
  body: z.strictObject({ role: Role, siteId: Id.nullable(), startsOn: CalendarDate, endsOn: CalendarDate.nullable() }),
  response: Person,
  status: 201,
  problems: ['not-found', 'grant-to-oneself', 'already-held'],
});

export const endGrant = endpoint({
  method: 'POST',
  path: '/api/people/:personId/grants/:grantId/end',
  summary: 'End a grant today',
  params: z.strictObject({ personId: Id, grantId: Id }),
  body: z.strictObject({}),
  response: Person,
  problems: ['not-found', 'grant-to-oneself'],
});

export const setPersonStatus = endpoint({
  method: 'PUT',
  path: '/api/people/:personId/status',
  summary: 'Disable an account, or enable it again. Accounts are never deleted',
  params: z.strictObject({ personId: Id }),
  body: z.strictObject({ status: z.enum(['active', 'disabled']) }),
  response: Person,
  problems: ['not-found', 'grant-to-oneself'],
});

export const listSites = endpoint({
  method: 'GET',
  path: '/api/sites',
  summary: 'The sites of the registry',
  response: z.strictObject({ sites: z.array(Site) }),
  problems: [],
});
