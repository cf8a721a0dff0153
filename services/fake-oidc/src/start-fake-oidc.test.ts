import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createRemoteJWKSet, jwtVerify } from 'jose';
import type { JWTPayload } from 'jose';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { authenticationClass, demonstrationPeople, startFakeOidc } from './index.ts';
import type { FakeOidc, FakeOidcOptions } from './index.ts';

const redirectUri = 'http://127.0.0.1:1/callback';
const homeUri = 'http://127.0.0.1:1/';
const resource = 'http://127.0.0.1:1/api';
const secret = 'a-secret-for-tests-only';
const label = 'Stand-in.';

let logoutTokens: string[] = [];
const backchannel = createServer((request, response) => {
  let body = '';
  request.on('data', (chunk) => (body += String(chunk)));
  request.on('end', () => {
    logoutTokens.push(new URLSearchParams(body).get('logout_token') ?? '');
    response.end();
  });
});

let provider: FakeOidc;
let options: FakeOidcOptions;
let discovery: Record<string, unknown>;
let folder: string;

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'fake-oidc-test-'));
  await new Promise<void>((resolve) => backchannel.listen(0, '127.0.0.1', resolve));
  options = {
    port: 0,
    clientId: 'cairnstep',
    clientSecret: secret,
    redirectUris: [redirectUri],
    postLogoutRedirectUris: [homeUri],
    backchannelLogoutUri: `http://127.0.0.1:${(backchannel.address() as AddressInfo).port}/backchannel-logout`,
    people: demonstrationPeople,
    machineClients: [{ clientId: 'site-system', clientSecret: secret }],
    resource,
    keysFile: join(folder, 'keys.json'),
  };
  provider = await startFakeOidc(options);
  discovery = (await (await fetch(`${provider.issuer}/.well-known/openid-configuration`)).json()) as Record<string, unknown>;
});
afterAll(async () => {
  await provider.close();
  backchannel.close();
  rmSync(folder, { recursive: true, force: true });
});

/** A browser reduced to its cookies: follows redirects by hand, so that each can be looked at. */
function makeBrowser() {
  const jar = new Map<string, string>();
  return {
    jar,
    async visit(address: string, form?: Record<string, string>): Promise<Response> {
      const response = await fetch(new URL(address, provider.issuer), {
        redirect: 'manual',
        headers: { accept: 'text/html', cookie: [...jar].map(([name, value]) => `${name}=${value}`).join('; ') },
        ...(form === undefined ? {} : { method: 'POST', body: new URLSearchParams(form) }),
      });
      for (const cookie of response.headers.getSetCookie()) {
        const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(cookie) ?? [];
        if (value === '') jar.delete(name);
        else jar.set(name, value);
      }
      return response;
    },
  };
}
type Browser = ReturnType<typeof makeBrowser>;

const locationOf = (response: Response): string => response.headers.get('location') ?? '';

function authorizationUrl(extra: Record<string, string> = {}): { url: string; verifier: string } {
  const verifier = randomBytes(32).toString('base64url');
  const url = new URL(String(discovery['authorization_endpoint']));
  url.search = new URLSearchParams({
    client_id: 'cairnstep',
    response_type: 'code',
    redirect_uri: redirectUri,
    scope: 'openid profile email',
    state: 'the-state',
    nonce: 'the-nonce',
    code_challenge: createHash('sha256').update(verifier).digest('base64url'),
    code_challenge_method: 'S256',
    ...extra,
  }).toString();
  return { url: url.href, verifier };
}

/** Goes to the sign-in page, chooses, and returns what the registry would be called back with. */
async function choose(browser: Browser, subject: string, extra: Record<string, string> = {}): Promise<{ callback: URL; verifier: string }> {
  const { url, verifier } = authorizationUrl(extra);
  const interaction = locationOf(await browser.visit(url));
  expect(interaction).toMatch(/^\/interaction\//);
  const resume = locationOf(await browser.visit(`${interaction}/sign-in`, { subject }));
  return { callback: new URL(locationOf(await browser.visit(resume))), verifier };
}

const basic = (client: string): string => `Basic ${Buffer.from(`${client}:${secret}`).toString('base64')}`;

function askToken(form: Record<string, string>, client = 'cairnstep'): Promise<Response> {
  return fetch(String(discovery['token_endpoint']), {
    method: 'POST',
    headers: { authorization: basic(client) },
    body: new URLSearchParams(form),
  });
}

const redeem = (code: string, verifier: string): Promise<Response> =>
  askToken({ grant_type: 'authorization_code', code, redirect_uri: redirectUri, code_verifier: verifier });

async function idTokenOf(response: Response): Promise<{ token: string; claims: JWTPayload }> {
  const { id_token: token } = (await response.json()) as { id_token: string };
  const keys = createRemoteJWKSet(new URL(String(discovery['jwks_uri'])));
  const { payload } = await jwtVerify(token, keys, { issuer: provider.issuer, audience: 'cairnstep' });
  return { token, claims: payload };
}

describe('discovery', () => {
  it('announces the code flow with S256 only, the issuer in responses, and back-channel logout', () => {
    expect(discovery).toMatchObject({
      issuer: provider.issuer,
      response_types_supported: ['code'],
      code_challenge_methods_supported: ['S256'],
      authorization_response_iss_parameter_supported: true,
      backchannel_logout_supported: true,
      backchannel_logout_session_supported: true,
      token_endpoint_auth_methods_supported: ['client_secret_basic'],
    });
    expect(discovery['end_session_endpoint']).toBeDefined();
  });
});

describe('a sign-in', () => {
  it('lists every person and answers with state and issuer, then tokens that say who and when', async () => {
    const browser = makeBrowser();
    const { url } = authorizationUrl();
    const page = await (await browser.visit(locationOf(await browser.visit(url)))).text();
    for (const { name, label: work } of demonstrationPeople) expect(page).toContain(`<strong>${name}</strong><span>${work}</span>`);

    const before = Math.floor(Date.now() / 1000);
    const { callback, verifier } = await choose(makeBrowser(), 'demo-researcher');
    expect(callback.origin + callback.pathname).toBe(redirectUri);
    expect(Object.fromEntries(callback.searchParams)).toMatchObject({ state: 'the-state', iss: provider.issuer });
    const answer = await redeem(callback.searchParams.get('code') ?? '', verifier);
    const { claims } = await idTokenOf(answer);
    expect(claims).toMatchObject({
      sub: 'demo-researcher',
      nonce: 'the-nonce',
      name: 'Anneke Visser',
      email: 'anneke.visser@gait-institute.example',
      acr: authenticationClass,
    });
    expect(claims['auth_time']).toBeGreaterThanOrEqual(before);
    expect(claims['sid']).toEqual(expect.any(String));
  });

  it('redeems a code once, and only with its own verifier', async () => {
    const { callback } = await choose(makeBrowser(), 'demo-steward');
    expect((await redeem(callback.searchParams.get('code') ?? '', 'x'.repeat(43))).status).toBe(400);
    const other = await choose(makeBrowser(), 'demo-steward');
    const code = other.callback.searchParams.get('code') ?? '';
    expect((await redeem(code, other.verifier)).status).toBe(200);
    expect((await redeem(code, other.verifier)).status).toBe(400);
  });

  it.each([
    ['no challenge', { code_challenge: '', code_challenge_method: '' }],
    ['a plain challenge', { code_challenge_method: 'plain' }],
  ])('refuses %s', async (_case, extra) => {
    const callback = new URL(locationOf(await makeBrowser().visit(authorizationUrl(extra).url)));
    expect(callback.searchParams.get('error')).toBe('invalid_request');
  });

  it('goes through without a page while the sign-in is fresh, and asks again for prompt=login and max_age', async () => {
    const browser = makeBrowser();
    await choose(browser, 'demo-steward');
    const quiet = await browser.visit(authorizationUrl().url);
    expect(new URL(locationOf(quiet)).searchParams.get('code')).not.toBeNull();
    for (const extra of [{ prompt: 'login' }, { max_age: '0' }]) {
      const interaction = locationOf(await browser.visit(authorizationUrl(extra).url));
      expect(interaction).toMatch(/^\/interaction\//);
      expect(await (await browser.visit(interaction)).text()).toContain('You are signed in as <strong>Tomas Hale</strong>');
    }
    const { callback } = await choose(browser, 'demo-steward', { prompt: 'login', max_age: '0' });
    expect(callback.searchParams.get('code')).not.toBeNull();
  });

  it('goes back with access_denied when the person chooses nobody', async () => {
    const browser = makeBrowser();
    const interaction = locationOf(await browser.visit(authorizationUrl().url));
    const resume = locationOf(await browser.visit(`${interaction}/cancel`, {}));
    const callback = new URL(locationOf(await browser.visit(resume)));
    expect(callback.searchParams.get('error')).toBe('access_denied');
  });

  it('signs in nobody who is not listed, and nobody without the browser the sign-in began in', async () => {
    const browser = makeBrowser();
    const interaction = locationOf(await browser.visit(authorizationUrl().url));
    expect((await browser.visit(`${interaction}/sign-in`, { subject: 'somebody-else' })).status).toBe(400);
    const stranger = await makeBrowser().visit(`${interaction}/sign-in`, { subject: 'demo-steward' });
    expect(stranger.status).toBe(400);
    expect(await stranger.text()).toContain(label);
  });
});

describe('signing out', () => {
  it('asks, tells the registry through the back channel, and returns to the registry', async () => {
    logoutTokens = [];
    const browser = makeBrowser();
    const { callback, verifier } = await choose(browser, 'demo-administrator');
    const { token, claims } = await idTokenOf(await redeem(callback.searchParams.get('code') ?? '', verifier));
    const ask = new URL(String(discovery['end_session_endpoint']));
    ask.search = new URLSearchParams({ id_token_hint: token, post_logout_redirect_uri: homeUri }).toString();
    const page = await (await browser.visit(ask.href)).text();
    expect(page).toContain(label);
    const [, action = ''] = /action="([^"]+)"/.exec(page) ?? [];
    const [, xsrf = ''] = /name="xsrf" value="([^"]+)"/.exec(page) ?? [];
    const done = await browser.visit(action, { xsrf, logout: 'yes' });
    expect(locationOf(done)).toBe(homeUri);
    expect(logoutTokens).toHaveLength(1);
    const keys = createRemoteJWKSet(new URL(String(discovery['jwks_uri'])));
    const { payload } = await jwtVerify(logoutTokens[0] ?? '', keys, { issuer: provider.issuer, audience: 'cairnstep', typ: 'logout+jwt' });
    expect(payload).toMatchObject({ sub: 'demo-administrator', sid: claims['sid'] });
    expect(payload['nonce']).toBeUndefined();
    expect(locationOf(await browser.visit(authorizationUrl().url))).toMatch(/^\/interaction\//);
  });

  it('shows a labelled page without script to someone who is not signed in', async () => {
    const page = await (await makeBrowser().visit(String(discovery['end_session_endpoint']))).text();
    expect(page).toContain(label);
    expect(page).not.toContain('<script');
  });
});

describe('a site’s system', () => {
  it('gets an access token for the registry that names the system', async () => {
    const answer = await askToken({ grant_type: 'client_credentials', scope: 'submissions', resource }, 'site-system');
    const { access_token: token } = (await answer.json()) as { access_token: string };
    const keys = createRemoteJWKSet(new URL(String(discovery['jwks_uri'])));
    const { payload } = await jwtVerify(token, keys, { issuer: provider.issuer, audience: resource, typ: 'at+jwt' });
    expect(payload).toMatchObject({ sub: 'site-system', client_id: 'site-system', scope: 'submissions' });
  });

  it('gets none for another address, and the registry’s own client gets none this way', async () => {
    const elsewhere = await askToken({ grant_type: 'client_credentials', resource: 'http://127.0.0.1:1/other' }, 'site-system');
    expect(await elsewhere.json()).toMatchObject({ error: 'invalid_target' });
    const person = await askToken({ grant_type: 'client_credentials', resource });
    expect(await person.json()).toMatchObject({ error_description: 'requested grant type is not allowed for this client' });
  });
});

describe('every page', () => {
  it.each(['/', '/no-such-page', '/session/end/success', '/auth?client_id=unknown', '/interaction/none'])(
    'is labelled and loads nothing foreign: %s',
    async (path) => {
      const response = await makeBrowser().visit(path);
      const page = await response.text();
      expect(page).toContain(label);
      expect(response.headers.get('content-security-policy')).toContain("default-src 'none'");
      expect(
        [...page.matchAll(/(?:src|href)="([^"]*)"/g)]
          .map(([, address]) => address)
          .filter((address) => /^(https?:)?\/\//.test(address ?? '')),
      ).toEqual(path === '/' ? [homeUri] : []);
    },
  );

  it('sets cookies under names of its own', async () => {
    const browser = makeBrowser();
    await choose(browser, 'demo-steward');
    expect([...browser.jar.keys()].every((name) => name.startsWith('fake_oidc_'))).toBe(true);
    expect(browser.jar.has('fake_oidc_session')).toBe(true);
  });
});

describe('keys', () => {
  it('are kept in a file that only its owner reads, so that a restart signs with the same', async () => {
    expect(statSync(options.keysFile ?? '').mode & 0o777).toBe(0o600);
    const kidsOf = async (issuer: string): Promise<unknown> =>
      ((await (await fetch(`${issuer}/jwks`)).json()) as { keys: { kid: string }[] }).keys.map(({ kid }) => kid);
    const again = await startFakeOidc(options);
    expect(await kidsOf(again.issuer)).toEqual(await kidsOf(provider.issuer));
    await again.close();
  });
});
