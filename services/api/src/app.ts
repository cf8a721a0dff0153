/** The server as one ordered list: who asks, may they, what they ask for, how it is answered. */
import express, { type ErrorRequestHandler, type Express } from 'express';
import { rateLimit } from 'express-rate-limit';
import helmet from 'helmet';
import type pg from 'pg';
import type { Context } from './context.ts';
import { accountRoutes } from './features/account/account.routes.ts';
import { auditRoutes } from './features/audit/audit.routes.ts';
import { exploreRoutes } from './features/explore/explore.routes.ts';
import { exportRoutes } from './features/exports/exports.routes.ts';
import { healthRoutes } from './features/health/health.routes.ts';
import { monthRoutes } from './features/months/months.routes.ts';
import { participantCodeRoutes } from './features/participant-codes/participant-codes.routes.ts';
import { peopleRoutes } from './features/people/people.routes.ts';
import { requestRoutes } from './features/requests/requests.routes.ts';
import { makeProvider } from './features/sign-in/provider.ts';
import { signInRoutes } from './features/sign-in/sign-in.routes.ts';
import { systemScope } from './features/site-systems/access-token.ts';
import { siteSystemRoutes } from './features/site-systems/site-systems.routes.ts';
import { submissionRoutes } from './features/submissions/submissions.routes.ts';
import { bearerToken, challengeOf, refuseTwoIdentities } from './http/bearer-token.ts';
import { loadActor } from './http/load-actor.ts';
import { errorFacts, requestLog } from './http/log.ts';
import { openApiDocument } from './http/open-api.ts';
import { Refusal, TokenRefusal } from './http/refusal.ts';
import type { Route } from './http/route.ts';
import { sameOrigin } from './http/same-origin.ts';
import { serveWeb } from './http/serve-web.ts';
import { sessions } from './http/session.ts';
import { toProblem } from './http/to-problem.ts';

/** Nothing inline runs or styles, and nothing comes from elsewhere. */
const contentSecurityPolicy = (secure: boolean) => ({
  useDefaults: false,
  directives: {
    defaultSrc: ["'none'"],
    scriptSrc: ["'self'"],
    styleSrc: ["'self'"],
    imgSrc: ["'self'", 'data:'],
    fontSrc: ["'self'"],
    connectSrc: ["'self'"],
    workerSrc: ["'self'"],
    // The page that prepares a month's files.
    frameSrc: ["'self'"],
    manifestSrc: ["'self'"],
    formAction: ["'self'"],
    baseUri: ["'none'"],
    frameAncestors: ["'none'"],
    ...(secure ? { upgradeInsecureRequests: [] } : {}),
  },
});

export interface Pools {
  readonly sessionPool: pg.Pool;
}

export function allRoutes(context: Context): Route[] {
  const provider = makeProvider(context.config);
  return [
    ...healthRoutes(context),
    ...accountRoutes(context, provider),
    ...peopleRoutes(context),
    ...siteSystemRoutes(context),
    ...monthRoutes(context),
    ...participantCodeRoutes(context),
    ...submissionRoutes(context),
    ...exploreRoutes(context),
    ...requestRoutes(context),
    ...exportRoutes(context),
    ...auditRoutes(context),
  ];
}

export function makeApp(context: Context, { sessionPool }: Pools): Express {
  const { config, log } = context;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.TRUST_PROXY);
  app.set('query parser', 'simple');

  app.use(requestLog(log));
  app.use(
    helmet({
      contentSecurityPolicy: contentSecurityPolicy(config.secure),
      strictTransportSecurity: config.secure,
      crossOriginOpenerPolicy: { policy: 'same-origin' },
      referrerPolicy: { policy: 'no-referrer' },
    }),
  );
  app.use('/api', (_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store');
    next();
  });

  const refuseFlood = () => {
    throw new Refusal('too-many-requests', 'Wait a minute, then go on. Nothing was changed.');
  };
  app.use(
    '/api/sign-in',
    rateLimit({
      windowMs: 60_000,
      limit: config.SIGN_IN_LIMIT_PER_MINUTE,
      standardHeaders: true,
      legacyHeaders: false,
      handler: refuseFlood,
    }),
  );
  app.use(
    '/api',
    rateLimit({
      windowMs: 60_000,
      limit: config.WRITE_LIMIT_PER_MINUTE,
      standardHeaders: true,
      legacyHeaders: false,
      handler: refuseFlood,
      skip: (request) => request.method === 'GET' || request.method === 'HEAD',
    }),
  );
  app.use(
    '/api',
    rateLimit({
      windowMs: 60_000,
      limit: config.SYSTEM_LIMIT_PER_MINUTE,
      standardHeaders: true,
      legacyHeaders: false,
      handler: refuseFlood,
      skip: (request) => bearerToken(request) === null,
    }),
  );
  app.use('/api', refuseTwoIdentities(config.secure));
  app.use('/api', sameOrigin(config.PUBLIC_URL, ['/sign-in/back-channel-logout']));

  const document = openApiDocument(config);
  app.get('/api/openapi.json', (_request, response) => void response.json(document));

  // Pages and health answer without a session, so they do when the table of sessions does not.
  const session = sessions(config, sessionPool);
  const provider = makeProvider(config);
  app.use('/api/sign-in', session);
  app.use(signInRoutes(context, provider, sessionPool));

  const withoutSession = new Set(['/health/live', '/health/ready', '/public/figures']);
  const actor = loadActor(context, provider);
  app.use('/api', (request, response, next) => {
    if (!withoutSession.has(request.path) && bearerToken(request) === null) return session(request, response, next);
    next();
  });
  app.use('/api', (request, response, next) => {
    if (withoutSession.has(request.path)) {
      request.actor = { kind: 'nobody' };
      return next();
    }
    return actor(request, response, next);
  });

  const json = express.json({ limit: '200kb', strict: true });
  for (const { endpoint, handler } of allRoutes(context)) {
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'delete';
    if (endpoint.upload) app[method](endpoint.path, handler);
    else
      app[method](
        endpoint.path,
        endpoint.largestBody === undefined ? json : express.json({ limit: endpoint.largestBody, strict: true }),
        handler,
      );
  }
  app.use('/api', () => {
    throw new Refusal('not-found', 'There is nothing at this address, or it is not yours to see.');
  });

  serveWeb(app, { folder: config.WEB_DIST, demonstration: config.DEMONSTRATION });
  app.use(((error, request, response, _next) => {
    const problem = toProblem(error, String(request.id));
    if (problem.status >= 500) log.error({ ...errorFacts(error), request: request.id }, 'request failed');
    if (response.headersSent) return void response.destroy();
    if (problem.status === 401 || error instanceof TokenRefusal) response.setHeader('WWW-Authenticate', challengeOf(error, systemScope));
    // A body still arriving has nobody to read it.
    if (!request.complete) response.setHeader('Connection', 'close');
    response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  }) satisfies ErrorRequestHandler);
  return app;
}
