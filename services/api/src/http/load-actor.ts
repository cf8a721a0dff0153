/** Says who a request comes from. Grants, and what a system may submit for, are read from the registry each time, never from session or token. */
import type { RequestHandler } from 'express';
import { nobody, registry, type Actor } from '../authority/actor.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';
import { readAccount } from '../features/sign-in/accounts.repository.ts';
import type { Provider } from '../features/sign-in/provider.ts';
import { verifySystemToken } from '../features/site-systems/access-token.ts';
import { noteUse, readActiveSystem } from '../features/site-systems/site-systems.repository.ts';
import { bearerToken } from './bearer-token.ts';
import { TokenRefusal } from './refusal.ts';

declare module 'express-serve-static-core' {
  interface Request {
    actor: Actor;
  }
}

/** A site's system, by the access token in the request. It has no session, so nothing of it outlasts the request. */
async function systemOf({ config, database, clock }: Context, provider: () => Promise<Provider>, token: string): Promise<Actor> {
  const now = clock();
  const identity = await verifySystemToken(await provider(), config, token, now);
  const system = await asActor(database, registry, async (tx) => {
    const found = await readActiveSystem(tx, identity);
    if (found) await noteUse(tx, found.systemId, now);
    return found;
  });
  if (!system) {
    throw new TokenRefusal(
      'invalid_token',
      'token-refused',
      `This client is not registered as a system of a site, or is disabled. Ask ${config.CONTACT}.`,
    );
  }
  return system;
}

export function loadActor(context: Context, provider: () => Promise<Provider>): RequestHandler {
  const { config, database, clock } = context;
  const absoluteLimit = config.SESSION_ABSOLUTE_HOURS * 3_600_000;
  return async (request, _response, next) => {
    request.actor = nobody;
    const token = bearerToken(request);
    if (token !== null) {
      request.actor = await systemOf(context, provider, token);
      return next();
    }
    const { accountId, signedInAt } = request.session;
    if (!accountId) return next();
    const tooOld = signedInAt === undefined || clock().getTime() - signedInAt > absoluteLimit;
    const account = tooOld ? null : await asActor(database, registry, (tx) => readAccount(tx, accountId));
    if (!account || account.status !== 'active') {
      request.session.destroy(() => next());
      return;
    }
    request.actor = { kind: 'person', accountId, name: account.name, institution: account.institution, grants: account.grants };
    next();
  };
}
