/** Signing in with OpenID Connect: authorization code with PKCE, state, nonce. These routes are pages a browser visits, not calls of the contract. */
import { problems } from '@cairnstep/contract';
import { Router, urlencoded, type Request, type Response } from 'express';
import * as oidc from 'openid-client';
import type pg from 'pg';
import { recordAudit } from '../../audit/record-audit.ts';
import { nobody, registry } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { errorFacts } from '../../http/log.ts';
import { accountOf, type Identity } from './accounts.repository.ts';
import { endSessionsFor, verifyLogoutToken } from './back-channel-logout.ts';
import { plainStyles, sendPlainPage } from './plain-page.ts';
import type { Provider } from './provider.ts';
import { safeReturnTo } from './return-to.ts';

/** How long a person may take at the provider, and how old a fresh ID token may be. */
const flowMinutes = 15;
const tokenMaximumAge = 10 * 60;

const regenerate = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => request.session.regenerate((error: unknown) => (error ? reject(error as Error) : resolve())));
const save = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => request.session.save((error: unknown) => (error ? reject(error as Error) : resolve())));

function identityOf(claims: oidc.IDToken): Identity {
  const text = (value: unknown): string | null => (typeof value === 'string' && value.trim() !== '' ? value.trim().slice(0, 200) : null);
  return { issuer: claims.iss, subject: claims.sub, name: text(claims['name']) ?? 'Unnamed person', email: text(claims['email']) };
}

export function signInRoutes(context: Context, provider: () => Promise<Provider>, sessionPool: pg.Pool): Router {
  const { config, database, log } = context;
  const redirectUri = `${config.PUBLIC_URL}/api/sign-in/callback`;

  async function start(request: Request, response: Response): Promise<void> {
    const { client } = await provider();
    const flow = {
      state: oidc.randomState(),
      nonce: oidc.randomNonce(),
      verifier: oidc.randomPKCECodeVerifier(),
      returnTo: safeReturnTo(request.query['returnTo']),
      startedAt: context.clock().getTime(),
    };
    request.session.flow = flow;
    await save(request);
    const address = oidc.buildAuthorizationUrl(client, {
      redirect_uri: redirectUri,
      scope: 'openid profile email',
      state: flow.state,
      nonce: flow.nonce,
      code_challenge: await oidc.calculatePKCECodeChallenge(flow.verifier),
      code_challenge_method: 'S256',
    });
    response.redirect(303, address.href);
  }

  async function finish(request: Request, response: Response): Promise<void> {
    const flow = request.session.flow;
    if (!flow) throw new Refusal('sign-in-failed', 'This browser has not begun to sign in, or has done so already. Nothing was changed.');
    // One try per flow: a used or refused state is gone.
    delete request.session.flow;
    await save(request);
    if (context.clock().getTime() - flow.startedAt > flowMinutes * 60_000) throw new Refusal('sign-in-failed', 'Signing in took too long. Begin again.');
    const { client } = await provider();
    // The address is ours whatever Host or X-Forwarded-Host say.
    const here = new URL(request.originalUrl, config.PUBLIC_URL);
    const tokens = await oidc.authorizationCodeGrant(client, new URL(`${redirectUri}${here.search}`), {
      pkceCodeVerifier: flow.verifier,
      expectedState: flow.state,
      expectedNonce: flow.nonce,
      idTokenExpected: true,
    });
    const claims = tokens.claims();
    if (!claims || !tokens.id_token) throw new Refusal('sign-in-failed', 'The provider did not say who you are.');
    if (Math.abs(context.clock().getTime() / 1000 - claims.iat) > tokenMaximumAge) throw new Refusal('sign-in-failed', 'What the provider said is out of date.');
    const accountId = await asActor(database, registry, async (tx) => {
      const id = await accountOf(tx, identityOf(claims));
      await recordAudit(tx, registry, { act: 'sign-in', result: id ? 'ok' : 'refused', ...(id ? { object: id } : { reason: 'account-disabled' }), requestId: String(request.id) });
      return id;
    });
    if (!accountId) throw new Refusal('sign-in-failed', `This account is disabled. Ask ${config.CONTACT}.`);
    await regenerate(request);
    Object.assign(request.session, {
      accountId,
      issuer: claims.iss,
      subject: claims.sub,
      providerSession: typeof claims['sid'] === 'string' ? claims['sid'] : null,
      idToken: tokens.id_token,
      signedInAt: context.clock().getTime(),
    });
    await save(request);
    response.redirect(303, flow.returnTo);
  }

  /** Whatever went wrong between the provider and us reads the same; the class of fault is in log and audit. */
  function withPlainPage(step: (request: Request, response: Response) => Promise<void>) {
    return async (request: Request, response: Response): Promise<void> => {
      try {
        await step(request, response);
      } catch (error) {
        const refusal = error instanceof Refusal ? error : new Refusal('sign-in-failed', 'The answer of the sign-in service could not be accepted. Nothing was changed.');
        log.warn({ ...errorFacts(error), request: request.id }, 'sign-in refused');
        if (refusal.code === 'sign-in-failed') {
          await asActor(database, registry, (tx) =>
            recordAudit(tx, nobody, { act: 'sign-in', result: 'refused', reason: errorFacts(error).code ?? 'not-accepted', requestId: String(request.id) }),
          ).catch(() => undefined);
        }
        const { status, title } = problems[refusal.code];
        sendPlainPage(response, status, title, refusal.detail, String(request.id));
      }
    };
  }

  const router = Router();
  router.get('/api/sign-in', withPlainPage(start));
  router.get('/api/sign-in/callback', withPlainPage(finish));
  router.get('/api/sign-in/plain.css', (_request, response) => void response.type('css').send(plainStyles));
  router.post('/api/sign-in/back-channel-logout', urlencoded({ extended: false, limit: '20kb' }), async (request, response) => {
    const token = (request.body as { logout_token?: unknown } | undefined)?.logout_token;
    try {
      const ended = await verifyLogoutToken(await provider(), config, token);
      await endSessionsFor(sessionPool, ended);
      response.status(200).end();
    } catch (error) {
      log.warn({ ...errorFacts(error), request: request.id }, 'back-channel logout refused');
      response.status(400).json({ error: 'invalid_request' });
    }
  });
  return router;
}
