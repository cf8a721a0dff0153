/** The organisation's identity provider, found when first needed: the public pages work while it does not answer. */
import { createRemoteJWKSet, type JWTVerifyGetKey } from 'jose';
import * as oidc from 'openid-client';
import type { Config } from '../../config.ts';
import { Refusal } from '../../http/refusal.ts';

export interface Provider {
  readonly client: oidc.Configuration;
  readonly keys: JWTVerifyGetKey;
}

/** Seconds the provider's clock may differ from ours. */
export const clockTolerance = 5;

export function makeProvider(config: Config): () => Promise<Provider> {
  let found: Promise<Provider> | undefined;
  const discover = async (): Promise<Provider> => {
    const client = await oidc.discovery(
      new URL(config.OIDC_ISSUER),
      config.OIDC_CLIENT_ID,
      { [oidc.clockTolerance]: clockTolerance },
      oidc.ClientSecretBasic(config.OIDC_CLIENT_SECRET),
      // The signature of an ID token is checked even though it came straight from the token endpoint.
      { timeout: 5, execute: [oidc.enableNonRepudiationChecks, ...(config.OIDC_ALLOW_HTTP ? [oidc.allowInsecureRequests] : [])] },
    );
    const metadata = client.serverMetadata();
    // Exact comparison: a difference in case or a trailing slash is another issuer.
    if (metadata.issuer !== config.OIDC_ISSUER) throw new Error('The provider calls itself by another issuer than the setting OIDC_ISSUER.');
    if (metadata.jwks_uri === undefined) throw new Error('The provider publishes no keys.');
    return { client, keys: createRemoteJWKSet(new URL(metadata.jwks_uri), { timeoutDuration: 5_000 }) };
  };
  return async () => {
    found ??= discover();
    try {
      return await found;
    } catch {
      found = undefined;
      throw new Refusal('provider-unavailable', 'The public pages still work. Try signing in again in a few minutes.');
    }
  };
}
