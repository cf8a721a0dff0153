/** The provider itself: what it grants to whom. State is kept in memory, so a restart ends every sign-in here. */
import Provider, { errors } from 'oidc-provider';
import type { ClientMetadata, Configuration, KoaContextWithOIDC } from 'oidc-provider';
import type { ProviderKeys } from './keys.ts';
import type { FakeOidcOptions } from './options.ts';
import { errorPage } from './pages/error-page.ts';
import { nothingToSignOutPage, signedOutPage, signOutPage } from './pages/sign-out-pages.ts';

/** How a person was recognised: by a click. Honest, and nothing a registry should ever accept elsewhere. */
export const authenticationClass = 'urn:cairnstep:stand-in:one-click';

/** What a site's system may ask for. */
export const machineScope = 'submissions';

const hour = 3600;

function clients(options: FakeOidcOptions): ClientMetadata[] {
  const registry: ClientMetadata = {
    client_id: options.clientId,
    client_secret: options.clientSecret,
    client_name: 'Cairnstep',
    token_endpoint_auth_method: 'client_secret_basic',
    grant_types: ['authorization_code'],
    response_types: ['code'],
    redirect_uris: [...options.redirectUris],
    post_logout_redirect_uris: [...options.postLogoutRedirectUris],
    default_acr_values: [authenticationClass],
    require_auth_time: true,
    ...(options.backchannelLogoutUri === undefined
      ? {}
      : { backchannel_logout_uri: options.backchannelLogoutUri, backchannel_logout_session_required: true }),
  };
  const machines = (options.machineClients ?? []).map(({ clientId, clientSecret }): ClientMetadata => ({
    client_id: clientId,
    client_secret: clientSecret,
    token_endpoint_auth_method: 'client_secret_basic',
    grant_types: ['client_credentials'],
    response_types: [],
    redirect_uris: [],
  }));
  return [registry, ...machines];
}

const isMachine = (client: { grantTypeAllowed(type: string): boolean }): boolean => client.grantTypeAllowed('client_credentials');

function configuration(options: FakeOidcOptions, keys: ProviderKeys): Configuration {
  return {
    clients: clients(options),
    jwks: keys.jwks as NonNullable<Configuration['jwks']>,
    // Cookies ignore ports: the registry on the same host must never meet these names.
    cookies: {
      keys: keys.cookieKeys,
      names: { session: 'fake_oidc_session', interaction: 'fake_oidc_interaction', resume: 'fake_oidc_resume' },
    },
    acrValues: [authenticationClass],
    claims: { openid: ['sub'], profile: ['name'], email: ['email', 'email_verified'], acr: null, auth_time: null, iss: null, sid: null },
    // The registry reads name and e-mail from the ID token.
    conformIdTokenClaims: false,
    clientAuthMethods: ['client_secret_basic'],
    responseTypes: ['code'],
    pkce: { required: () => true },
    ttl: {
      AuthorizationCode: 60,
      AccessToken: hour,
      IdToken: hour,
      ClientCredentials: hour,
      Interaction: hour,
      Session: 12 * hour,
      Grant: 12 * hour,
    },
    interactions: { url: (_ctx, interaction) => `/interaction/${interaction.uid}` },
    findAccount: (_ctx, subject) => {
      const person = options.people.find((candidate) => candidate.subject === subject);
      if (person === undefined) return undefined;
      const { name, email } = person;
      return { accountId: subject, claims: () => ({ sub: subject, name, email, email_verified: true }) };
    },
    // The one client is the registry, so there is no consent to ask for.
    loadExistingGrant: async (ctx) => {
      const clientId = ctx.oidc.client?.clientId;
      const accountId = ctx.oidc.session?.accountId;
      if (clientId === undefined || accountId === undefined) return undefined;
      const grant = new ctx.oidc.provider.Grant({ clientId, accountId });
      grant.addOIDCScope('openid profile email');
      await grant.save();
      return grant;
    },
    // The library's own fetch refuses loopback addresses; this one reaches the registry's address and no other.
    fetch: (url, init) => {
      if (String(url) !== options.backchannelLogoutUri)
        throw new Error('The stand-in sends requests to the registry’s back-channel address only.');
      const { dispatcher: _guard, ...request } = (init ?? {}) as RequestInit & { dispatcher?: unknown };
      return fetch(url, request);
    },
    features: {
      devInteractions: { enabled: false },
      backchannelLogout: { enabled: true },
      clientCredentials: { enabled: true },
      rpInitiatedLogout: {
        enabled: true,
        logoutSource: (ctx, form) => void (ctx.body = signOutPage(form)),
        postLogoutSuccessSource: (ctx) => void (ctx.body = signedOutPage()),
      },
      resourceIndicators: {
        enabled: true,
        defaultResource: (_ctx, client) =>
          client !== undefined && isMachine(client) && options.resource !== undefined ? options.resource : [],
        getResourceServerInfo: (_ctx, resource, client) => {
          if (!isMachine(client) || resource !== options.resource) throw new errors.InvalidTarget();
          return {
            audience: resource,
            scope: machineScope,
            accessTokenFormat: 'jwt',
            accessTokenTTL: hour,
            jwt: { sign: { alg: 'RS256' } },
          };
        },
      },
    },
    renderError: (ctx, out) => {
      ctx.type = 'html';
      ctx.body = errorPage(out.error, out.error_description);
    },
  };
}

/** Replaces the library's pages that carry no label: the self-submitting one, with its script, and the bare "Not Found". */
async function labelBarePages(ctx: KoaContextWithOIDC, next: () => Promise<void>): Promise<void> {
  await next();
  if (ctx.status === 404 && ctx.body === undefined) {
    ctx.type = 'html';
    ctx.body = errorPage('not_found', 'There is no such page.');
    ctx.status = 404;
    return;
  }
  if (ctx.oidc?.route !== 'end_session' || ctx.status !== 200 || ctx.oidc.session?.accountId !== undefined) return;
  const secret = (ctx.oidc.session?.state as { secret: string } | undefined)?.secret;
  if (secret !== undefined) ctx.body = nothingToSignOutPage(ctx.oidc.urlFor('end_session_confirm'), secret);
}

export function makeProvider(issuer: string, options: FakeOidcOptions, keys: ProviderKeys): Provider {
  const provider = new Provider(issuer, configuration(options, keys));
  provider.use(labelBarePages);
  return provider;
}
