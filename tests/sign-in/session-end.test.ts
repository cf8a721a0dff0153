import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { JWTPayload } from 'jose';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

// Threat 14: a session outlives the person. ASVS v5.0.0-7.4.2, v5.0.0-7.3.1, v5.0.0-7.3.2, v5.0.0-7.6.1, v5.0.0-10.5.5.
let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest({ SESSION_IDLE_MINUTES: '10', SESSION_ABSOLUTE_HOURS: '8' });
});
afterAll(() => test.close());

const logoutEvent = { 'http://schemas.openid.net/event/backchannel-logout': {} };
const logoutToken = (change: JWTPayload = {}, header: Record<string, unknown> = {}): Promise<string> => {
  const now = Math.floor(Date.now() / 1000);
  const claims = {
    iss: test.provider.issuer,
    aud: test.provider.clientId,
    iat: now,
    exp: now + 60,
    jti: `jti-${Math.random()}`,
    sid: 'provider-session-1',
    events: logoutEvent,
    ...change,
  };
  return test.provider.sign(JSON.parse(JSON.stringify(claims)), { typ: 'logout+jwt', ...header });
};
const tell = (token: string) => new Browser(test).agent.post('/api/sign-in/back-channel-logout').type('form').send({ logout_token: token });

describe('a session', () => {
  it('ends at once when the account is disabled', async () => {
    const browser = new Browser(test);
    await browser.signIn('/', 'to-be-disabled');
    expect(await browser.isSignedIn()).toBe(true);
    await test.server.database.owner.query("update accounts set status = 'disabled' where subject = 'to-be-disabled'");
    expect((await browser.agent.get('/api/releases')).status).toBe(401);
  });

  it('ends after its idle limit', async () => {
    const browser = new Browser(test);
    await browser.signIn();
    const { rows } = await test.server.database.owner.query(
      "select extract(epoch from max(expire) - now() at time zone current_setting('TimeZone'))::int as left from web_sessions",
    );
    expect(rows[0].left).toBeGreaterThan(590);
    // The table of sessions holds whole seconds, rounded up.
    expect(rows[0].left).toBeLessThanOrEqual(601);
    await test.server.database.owner.query("update web_sessions set expire = expire - interval '11 minutes'");
    expect(await browser.isSignedIn()).toBe(false);
  });

  it('ends after its absolute limit however busy it was', async () => {
    const browser = new Browser(test);
    await browser.signIn();
    test.server.setClock(new Date(Date.now() + 8 * 3_600_000 + 1000));
    expect(await browser.isSignedIn()).toBe(false);
    test.server.setClock(null);
    expect(await browser.isSignedIn()).toBe(false);
  });

  it("ends with the person's sign-out, here and at the provider", async () => {
    const browser = new Browser(test);
    await browser.signIn();
    const cookie = browser.cookie();
    const answer = await browser.agent.post('/api/sign-out').set('X-Cairnstep-Request', '1').send({}).expect(200);
    const address = new URL(answer.body.continueAt as string);
    expect(`${address.origin}${address.pathname}`).toBe(`${test.provider.issuer}/end`);
    expect(address.searchParams.get('post_logout_redirect_uri')).toBe(`${test.server.url}/`);
    expect(address.searchParams.get('id_token_hint')).toMatch(/^ey/);
    const old = await new Browser(test).agent.get('/api/account').set('Cookie', `cairnstep-session=${cookie}`);
    expect(old.body.signedIn).toBe(false);
  });

  it('ends when the provider says so over the back channel, by session or by person', async () => {
    for (const change of [{}, { sid: undefined, sub: 'person-1' }]) {
      const browser = new Browser(test);
      await browser.signIn();
      await tell(await logoutToken(change)).expect(200);
      expect(await browser.isSignedIn()).toBe(false);
    }
  });

  it.each([
    ['of another type', {}, { typ: 'JWT' }],
    ['with a nonce', { nonce: 'n' }, {}],
    ['without the event', { events: {} }, {}],
    ['for another audience', { aud: 'another-client' }, {}],
    ['of another issuer', { iss: 'https://other.example' }, {}],
    ['an hour old', { iat: Math.floor(Date.now() / 1000) - 3600 }, {}],
    ['that names nobody', { sid: undefined }, {}],
  ])('does not end by a logout token %s', async (_what, change, header) => {
    const browser = new Browser(test);
    await browser.signIn();
    await tell(await logoutToken(change, header)).expect(400);
    expect(await browser.isSignedIn()).toBe(true);
  });
});
