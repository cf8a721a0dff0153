import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 12: session fixation. ASVS v5.0.0-7.2.4.
describe('the session', () => {
  it('has another cookie after signing in, and the one from before is dead', async () => {
    const browser = new Browser(test);
    const authorization = await browser.begin();
    const before = browser.cookie();
    expect(before).toBeDefined();
    await browser.callback(browser.honest(authorization)).expect(303);
    expect(browser.cookie()).not.toBe(before);
    const old = new Browser(test);
    const account = await old.agent.get('/api/account').set('Cookie', `cairnstep-session=${before}`);
    expect(account.body.signedIn).toBe(false);
  });

  it('has another cookie after signing in again', async () => {
    const browser = new Browser(test);
    await browser.signIn();
    const first = browser.cookie();
    await browser.signIn();
    expect(browser.cookie()).not.toBe(first);
    const old = await new Browser(test).agent.get('/api/account').set('Cookie', `cairnstep-session=${first}`);
    expect(old.body.signedIn).toBe(false);
  });
});
