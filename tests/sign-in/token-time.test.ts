import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 8: expired and early tokens, clock skew. ASVS v5.0.0-9.2.1.
const now = () => Math.floor(Date.now() / 1000);

describe('the times of an ID token', () => {
  it.each([
    ['expired beyond the tolerance', () => ({ exp: now() - 7 })],
    ['not valid yet', () => ({ nbf: now() + 120 })],
    ['issued a day ago', () => ({ iat: now() - 86_400 })],
    ['issued tomorrow', () => ({ iat: now() + 86_400 })],
    ['without an end', () => ({ exp: undefined })],
  ])('are refused when it is %s', async (_what, times) => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { claims: (claims) => JSON.parse(JSON.stringify({ ...claims, ...times() })) };
    await expectRefused(test, browser, await browser.callback(answer));
  });

  it('are accepted within the tolerance of a clock that is a little off', async () => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { claims: (claims) => ({ ...claims, iat: now() + 3, nbf: now() + 3 }) };
    expect((await browser.callback(answer)).status).toBe(303);
  });
});
