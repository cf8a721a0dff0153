/** Browser sessions in PostgreSQL: hardened cookie, idle and absolute limits. */
import connectPgSimple from 'connect-pg-simple';
import session from 'express-session';
import type { RequestHandler } from 'express';
import pg from 'pg';
import type { Logger } from 'pino';
import type { Config } from '../config.ts';

export interface SignInFlow {
  readonly state: string;
  readonly nonce: string;
  readonly verifier: string;
  readonly returnTo: string;
  readonly startedAt: number;
}

declare module 'express-session' {
  interface SessionData {
    /** A sign-in under way. */
    flow: SignInFlow;
    accountId: string;
    issuer: string;
    subject: string;
    /** The provider's session, for back-channel logout. */
    providerSession: string | null;
    idToken: string;
    signedInAt: number;
  }
}

export const cookieName = (secure: boolean): string => (secure ? '__Host-cairnstep' : 'cairnstep-session');

/** The session role may touch the table of sessions and nothing else. */
export function makeSessionPool(config: Config, log: Logger): pg.Pool {
  const pool = new pg.Pool({ connectionString: config.DATABASE_APP_URL, max: 4, connectionTimeoutMillis: 5_000, statement_timeout: 5_000, options: '-c role=cairnstep_session' });
  // A dropped idle connection is replaced at the next request; without a listener it would end the process.
  pool.on('error', () => log.warn('a session connection was lost'));
  return pool;
}

export function sessions(config: Config, pool: pg.Pool): RequestHandler {
  const Store = connectPgSimple(session);
  return session({
    name: cookieName(config.secure),
    secret: config.SESSION_SECRET,
    store: new Store({ pool, tableName: 'web_sessions', pruneSessionInterval: false, ttl: Math.ceil(config.SESSION_IDLE_MINUTES * 60) }),
    resave: false,
    rolling: true,
    saveUninitialized: false,
    cookie: { path: '/', httpOnly: true, sameSite: 'lax', secure: config.secure, maxAge: config.SESSION_IDLE_MINUTES * 60_000 },
  });
}
