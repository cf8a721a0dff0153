/** Who is signed in and what the screens may offer. */
import type { Account } from '@cairnstep/contract';
import * as oidc from 'openid-client';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry, type Actor } from '../../authority/actor.ts';
import { mayAtAll } from '../../authority/require-may.ts';
import { authority, type Action } from '../../authority/table.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { route, type RequestFacts, type Route } from '../../http/route.ts';
import type { Provider } from '../sign-in/provider.ts';
import { acceptInvitation } from './accept-invitation.ts';
import { readOffer } from './invitations.repository.ts';
import { readGrants } from './grants.repository.ts';

export async function presentAccount(context: Context, tx: Tx, actor: Actor): Promise<Account> {
  const { DEMONSTRATION: demonstration, CONTACT: contact } = context.config;
  if (actor.kind !== 'person') return { signedIn: false, name: null, institution: null, grants: [], may: [], demonstration, contact };
  return {
    signedIn: true,
    name: actor.name,
    institution: actor.institution,
    grants: await readGrants(tx, actor.accountId),
    may: (Object.keys(authority) as Action[]).filter((action) => mayAtAll(actor, action)),
    demonstration,
    contact,
  };
}

export function accountRoutes(context: Context, provider: () => Promise<Provider>): Route[] {
  const { config, database } = context;

  async function signOut(actor: Actor, facts: RequestFacts): Promise<{ continueAt: string }> {
    const { idToken } = facts.session;
    if (actor.kind === 'person') {
      await asActor(database, registry, (tx) => recordAudit(tx, actor, { act: 'sign-out', requestId: facts.requestId }));
    }
    await new Promise<void>((resolve) => facts.session.destroy(() => resolve()));
    const home = `${config.PUBLIC_URL}/`;
    if (!idToken) return { continueAt: '/' };
    try {
      const { client } = await provider();
      if (client.serverMetadata().end_session_endpoint === undefined) return { continueAt: '/' };
      return { continueAt: oidc.buildEndSessionUrl(client, { id_token_hint: idToken, post_logout_redirect_uri: home }).href };
    } catch {
      // The session here has ended in any case.
      return { continueAt: '/' };
    }
  }

  return [
    route('getAccount', (actor) => asActor(database, registry, (tx) => presentAccount(context, tx, actor))),
    route('signOut', (actor, _input, facts) => signOut(actor, facts)),
    route('getInvitation', (_actor, { token }) => asActor(database, registry, (tx) => readOffer(tx, token))),
    route('acceptInvitation', (actor, { token }, { requestId }) => acceptInvitation(context, actor, token, requestId)),
  ];
}
