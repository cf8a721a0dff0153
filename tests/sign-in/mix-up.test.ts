import { afterAll, beforeAll, describe, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 4: mix-up between two providers (RFC 9207). ASVS v5.0.0-10.2.2.
describe('the issuer of an authorization response', () => {
  it.each([
    ['another one', 'https://other-provider.example'],
    ['missing although the provider announces it', undefined],
  ])('is refused when it is %s', async (_what, iss) => {
    const browser = new Browser(test);
    await expectRefused(test, browser, await browser.callback({ ...browser.honest(await browser.begin()), iss }));
  });

  it('of the ID token is refused when it is another one', async () => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { claims: (claims) => ({ ...claims, iss: 'https://other-provider.example' }) };
    await expectRefused(test, browser, await browser.callback(answer));
  });
});
