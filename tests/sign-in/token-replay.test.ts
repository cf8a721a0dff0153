import { afterAll, beforeAll, describe, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 3: an ID token of another sign-in. ASVS v5.0.0-10.5.1.
describe('the nonce of an ID token', () => {
  it.each([
    ['wrong', () => 'another-nonce'],
    ['missing', () => undefined],
  ])('is refused when it is %s', async (_what, nonce) => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = {
      claims: ({ nonce: _nonce, ...claims }) => {
        const other = nonce();
        return other === undefined ? claims : { ...claims, nonce: other };
      },
    };
    await expectRefused(test, browser, await browser.callback(answer));
  });

  it('is refused when it is of an earlier sign-in of the same browser', async () => {
    const browser = new Browser(test);
    const first = (await browser.begin()).searchParams.get('nonce') ?? '';
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { claims: (claims) => ({ ...claims, nonce: first }) };
    await expectRefused(test, browser, await browser.callback(answer));
  });
});
