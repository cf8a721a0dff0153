/** Serves the provider and its pages. */
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import express from 'express';
import type { Express } from 'express';
import type Provider from 'oidc-provider';
import { providerKeys } from './keys.ts';
import type { FakeOidc, FakeOidcOptions } from './options.ts';
import { errorPage } from './pages/error-page.ts';
import { homePage } from './pages/home-page.ts';
import { signInPage } from './pages/sign-in-page.ts';
import { standInHeaders } from './pages/stand-in-headers.ts';
import { stylesheet, stylesheetPath } from './pages/stylesheet.ts';
import { authenticationClass, makeProvider } from './provider.ts';

const originsOf = (addresses: readonly string[]): string[] => [...new Set(addresses.map((address) => new URL(address).origin))];

function makePages(provider: Provider, options: FakeOidcOptions): Express {
  const registryOrigins = originsOf([...options.redirectUris, ...options.postLogoutRedirectUris]);
  const app = express();
  app.disable('x-powered-by');
  // A form here ends in a redirect to the registry, and browsers apply the list of form targets to redirects as well.
  app.use(standInHeaders(registryOrigins));
  app.get(stylesheetPath, (_request, response) => void response.type('css').send(stylesheet));
  app.get('/', (_request, response) => void response.send(homePage(options.people, registryOrigins)));

  app.get('/interaction/:uid', async (request, response) => {
    const { uid, prompt, session } = await provider.interactionDetails(request, response);
    // Any other prompt is a consent, which the only client has already.
    if (prompt.name !== 'login') return provider.interactionFinished(request, response, { consent: {} }, { mergeWithLastSubmission: true });
    const signedInAs = options.people.find(({ subject }) => subject === session?.accountId);
    response.set('cache-control', 'no-store').send(signInPage({ people: options.people, interaction: `/interaction/${uid}`, signedInAs }));
  });

  app.post('/interaction/:uid/sign-in', express.urlencoded({ extended: false, limit: '1kb' }), async (request, response) => {
    const subject: unknown = (request.body as { subject?: unknown } | undefined)?.subject;
    const person = options.people.find((candidate) => candidate.subject === subject);
    if (person === undefined) {
      response.status(400).send(errorPage('invalid_request', 'No such person signs in here.'));
      return;
    }
    await provider.interactionFinished(
      request,
      response,
      { login: { accountId: person.subject, acr: authenticationClass, remember: true } },
      { mergeWithLastSubmission: false },
    );
  });

  app.post('/interaction/:uid/cancel', (request, response) =>
    provider.interactionFinished(
      request,
      response,
      { error: 'access_denied', error_description: 'The person went back without signing in.' },
      { mergeWithLastSubmission: false },
    ),
  );

  app.use('/interaction', (error: Error, _request: express.Request, response: express.Response, next: express.NextFunction) => {
    // The library calls a sign-in that is over, or was begun in another browser, SessionNotFound.
    if (error.name !== 'SessionNotFound') return next(error);
    response.status(400).send(errorPage('invalid_request', 'This sign-in is over, or was begun in another browser.'));
  });

  app.use(provider.callback());
  return app;
}

/** Starts the provider and resolves once it answers. */
export async function startFakeOidc(options: FakeOidcOptions): Promise<FakeOidc> {
  const host = options.host ?? '127.0.0.1';
  const server = createServer();
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, host, resolve);
  });
  const issuer = options.issuer ?? `http://${host}:${(server.address() as AddressInfo).port}`;
  const provider = makeProvider(issuer, options, await providerKeys(options.keysFile));
  server.on('request', makePages(provider, options));
  const close = (): Promise<void> =>
    new Promise((resolve, reject) => {
      server.close((error) => (error ? reject(error) : resolve()));
      server.closeAllConnections();
    });
  return { issuer, close };
}
