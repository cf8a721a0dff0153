import { afterAll, beforeAll, describe, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 6: a token meant for others. ASVS v5.0.0-10.5.4, v5.0.0-9.2.2, v5.0.0-9.2.3.
describe('an ID token', () => {
  it.each([
    ['for another audience', { aud: 'another-client' }],
    ['for several audiences without an authorized party', { aud: ['cairnstep', 'another-client'] }],
    ['for several audiences with another authorized party', { aud: ['cairnstep', 'another-client'], azp: 'another-client' }],
    ['without audience', { aud: undefined }],
    ['without subject', { sub: undefined }],
  ])('%s is refused', async (_what, change) => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { claims: (claims) => JSON.parse(JSON.stringify({ ...claims, ...change })) };
    await expectRefused(test, browser, await browser.callback(answer));
  });

  it('that is really an access token is refused', async () => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = {
      idToken: ({ nonce: _nonce, ...claims }) =>
        test.provider.sign({ ...claims, aud: 'https://api.example', scope: 'openid' }, { typ: 'at+jwt' }),
    };
    await expectRefused(test, browser, await browser.callback(answer));
  });
});
