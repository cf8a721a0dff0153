/** The signed-in person, what they may do, and how they come in. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { CalendarDate, Id, Instant, Role, Site } from './vocabulary.ts';

export const Grant = z.strictObject({
  id: Id,
  role: Role,
  site: Site.nullable(),
  startsOn: CalendarDate,
  endsOn: CalendarDate.nullable(),
});

/** `may` names the actions of the authority table this person has at all; the server still decides each request. */
export const Account = z.strictObject({
  signedIn: z.boolean(),
  name: z.string().nullable(),
  institution: z.string().nullable(),
  grants: z.array(Grant),
  may: z.array(z.string()),
  demonstration: z.boolean(),
  /** Who to ask for a role. */
  contact: z.string(),
});
export type Account = z.output<typeof Account>;

export const getAccount = endpoint({
  method: 'GET',
  path: '/api/account',
  summary: 'Who is signed in, with which grants',
  response: Account,
  problems: [],
});

export const signOut = endpoint({
  method: 'POST',
  path: '/api/sign-out',
  summary: 'End the session here and tell where to end it at the identity provider',
  body: z.strictObject({}),
  response: z.strictObject({ continueAt: z.string() }),
  problems: [],
});

export const Token = z.string().regex(/^[A-Za-z0-9_-]{43}$/);

export const getInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token',
  summary: 'What an invitation link offers',
  params: z.strictObject({ token: Token }),
  response: z.strictObject({ role: Role, site: Site.nullable(), expiresAt: Instant }),
  problems: ['invitation-unusable'],
});

export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token/accept',
  summary: 'Bind an invitation to the signed-in identity',
  params: z.strictObject({ token: Token }),
  body: z.strictObject({}),
  response: Account,
  problems: ['invitation-unusable'],
});
