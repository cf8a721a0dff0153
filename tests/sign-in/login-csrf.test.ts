import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 1: a victim finishes the attacker's flow. ASVS v5.0.0-10.2.1, v5.0.0-10.1.2.
describe('the state of a sign-in', () => {
  it("is refused when it belongs to another browser's flow", async () => {
    const attacker = new Browser(test);
    const victim = new Browser(test);
    const theirs = attacker.honest(await attacker.begin());
    await victim.begin();
    await expectRefused(test, victim, await victim.callback(theirs));
  });

  it('is refused when it is missing', async () => {
    const browser = new Browser(test);
    const { state: _state, ...rest } = browser.honest(await browser.begin());
    await expectRefused(test, browser, await browser.callback(rest));
  });

  it('is refused in a browser that has not begun to sign in', async () => {
    const starter = new Browser(test);
    const answer = starter.honest(await starter.begin());
    const other = new Browser(test);
    await expectRefused(test, other, await other.callback(answer));
  });

  it('is used up by its first use', async () => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    expect((await browser.callback(answer)).status).toBe(303);
    expect((await browser.callback(answer)).status).toBe(400);
    expect(await browser.isSignedIn()).toBe(true);
  });

  it('is used up by a refused attempt as well', async () => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    expect((await browser.callback({ ...answer, state: 'wrong' })).status).toBe(400);
    await expectRefused(test, browser, await browser.callback(answer));
  });
});
