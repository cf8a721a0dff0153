/** JWT access tokens of sites' systems (RFC 9068), given by the same provider that signs people in, by the client credentials grant (RFC 6749, 4.4). */
import { errors, jwtVerify } from 'jose';
import type { Config } from '../../config.ts';
import { Refusal, TokenRefusal } from '../../http/refusal.ts';
import { clockTolerance, type Provider } from '../sign-in/provider.ts';

/** The one scope a system may ask for. */
export const systemScope = 'submissions';

/** Whom such a token is for: this registry's interface. A token for something else, an ID token too, is not for us. */
export const systemAudience = (config: Pick<Config, 'PUBLIC_URL'>): string => `${config.PUBLIC_URL}/api`;

export interface SystemIdentity {
  readonly issuer: string;
  readonly subject: string;
}

const notAccepted = () =>
  new TokenRefusal(
    'invalid_token',
    'token-refused',
    'It has expired, was not given by the provider of this registry, or was given for something else. Ask the provider for a new one.',
  );

/** Faults of the token itself. Any other fault means that the provider's keys could not be had. */
const tokenFaults: ReadonlySet<string> = new Set([
  errors.JWTExpired.code,
  errors.JWTClaimValidationFailed.code,
  errors.JWTInvalid.code,
  errors.JWSInvalid.code,
  errors.JWSSignatureVerificationFailed.code,
  errors.JWKSNoMatchingKey.code,
  errors.JOSEAlgNotAllowed.code,
  errors.JOSENotSupported.code,
]);

/**
 * Signature, algorithm, type, issuer, audience, times, and that the token is the client's own: a token that a person's sign-in gave to the same
 * client names the person as its subject.
 * @throws Refusal
 */
export async function verifySystemToken(provider: Provider, config: Config, token: string, now: Date): Promise<SystemIdentity> {
  const issuer = provider.client.serverMetadata().issuer;
  const verified = await jwtVerify(token, provider.keys, {
    issuer,
    audience: systemAudience(config),
    typ: 'at+jwt',
    algorithms: ['RS256', 'PS256', 'ES256', 'EdDSA'],
    maxTokenAge: '1 day',
    clockTolerance,
    currentDate: now,
    requiredClaims: ['exp', 'iat', 'sub', 'client_id'],
  }).catch((error: unknown) => {
    if (error instanceof errors.JOSEError && tokenFaults.has(error.code)) throw notAccepted();
    throw new Refusal(
      'provider-unavailable',
      'The keys that access tokens are checked with cannot be had just now. Try again in a few minutes.',
    );
  });
  const { sub, client_id: client, scope } = verified.payload;
  if (sub === undefined || client !== sub) throw notAccepted();
  if (typeof scope !== 'string' || !scope.split(' ').includes(systemScope)) {
    throw new TokenRefusal(
      'insufficient_scope',
      'token-without-scope',
      `Ask the provider for a token with the scope “${systemScope}”. Nothing was changed.`,
    );
  }
  return { issuer, subject: sub };
}
