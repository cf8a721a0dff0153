import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 2: a stolen code is put into another flow. ASVS v5.0.0-10.2.1, v5.0.0-10.4.6.
describe('the code of a sign-in', () => {
  it('is asked for with PKCE by SHA-256 and redeemed with the verifier', async () => {
    const browser = new Browser(test);
    const authorization = await browser.begin();
    expect(authorization.searchParams.get('code_challenge_method')).toBe('S256');
    expect(authorization.searchParams.get('code_challenge')).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect(authorization.searchParams.get('response_type')).toBe('code');
    expect((await browser.callback(browser.honest(authorization))).status).toBe(303);
    expect(test.provider.tokenRequests.at(-1)?.form.get('code_verifier')).toMatch(/^[A-Za-z0-9_-]{43,128}$/);
    expect(test.provider.tokenRequests.at(-1)?.authorization).toMatch(/^Basic /);
  });

  it('of another flow is refused, for its verifier is missing here', async () => {
    const attacker = new Browser(test);
    const stolen = attacker.honest(await attacker.begin());
    const browser = new Browser(test);
    const own = browser.honest(await browser.begin());
    await expectRefused(test, browser, await browser.callback({ ...own, code: stolen.code }));
  });
});
