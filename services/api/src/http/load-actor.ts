/** Says who a request comes from. Grants are read from the registry each time, never from the session. */
import type { RequestHandler } from 'express';
import { nobody, registry, type Actor } from '../authority/actor.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';
import { readAccount } from '../features/sign-in/accounts.repository.ts';

declare module 'express-serve-static-core' {
  interface Request {
    actor: Actor;
  }
}

export function loadActor({ config, database, clock }: Context): RequestHandler {
  const absoluteLimit = config.SESSION_ABSOLUTE_HOURS * 3_600_000;
  return async (request, _response, next) => {
    request.actor = nobody;
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
