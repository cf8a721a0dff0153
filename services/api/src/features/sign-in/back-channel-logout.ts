/** OpenID Connect Back-Channel Logout 1.0: the provider says that a session of its has ended. */
import { jwtVerify } from 'jose';
import type pg from 'pg';
import type { Config } from '../../config.ts';
import { clockTolerance, type Provider } from './provider.ts';

const logoutEvent = 'http://schemas.openid.net/event/backchannel-logout';

export interface EndedSession {
  readonly issuer: string;
  readonly subject: string | null;
  readonly providerSession: string | null;
}

/** Section 2.6 of the specification: typed token, our audience, the logout event, no nonce, a subject or a session. Throws on anything else. */
export async function verifyLogoutToken(provider: Provider, config: Config, token: unknown): Promise<EndedSession> {
  if (typeof token !== 'string') throw new TypeError('A logout token is expected.');
  const { payload } = await jwtVerify(token, provider.keys, {
    issuer: provider.client.serverMetadata().issuer,
    audience: config.OIDC_CLIENT_ID,
    typ: 'logout+jwt',
    algorithms: ['RS256', 'PS256', 'ES256', 'EdDSA'],
    maxTokenAge: '10 minutes',
    clockTolerance,
    requiredClaims: ['iat', 'jti', 'events'],
  });
  const events = payload['events'];
  if (typeof events !== 'object' || events === null || !(logoutEvent in events)) throw new TypeError('The token is not about a logout.');
  if ('nonce' in payload) throw new TypeError('A logout token has no nonce.');
  const providerSession = typeof payload['sid'] === 'string' ? payload['sid'] : null;
  if (payload.sub === undefined && providerSession === null) throw new TypeError('The token names neither a person nor a session.');
  return { issuer: String(payload.iss), subject: payload.sub ?? null, providerSession };
}

export async function endSessionsFor(pool: pg.Pool, ended: EndedSession): Promise<void> {
  await pool.query(
    `delete from web_sessions where sess->>'issuer' = $1
       and case when $3::text is not null then sess->>'providerSession' = $3 else sess->>'subject' = $2 end`,
    [ended.issuer, ended.subject, ended.providerSession],
  );
}
