import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest({ OIDC_ISSUER: 'http://127.0.0.1:9' });
});
afterAll(() => test.close());

describe('while the provider does not answer', () => {
  it('signing in shows a plain page that needs no script, and the public pages work', async () => {
    const browser = new Browser(test);
    const answer = await browser.agent.get('/api/sign-in');
    expect(answer.status).toBe(503);
    expect(answer.text).toContain('does not answer');
    expect(answer.text).not.toContain('<script');
    await browser.agent.get('/api/public/figures').expect(200);
    expect((await browser.agent.get('/api/account').expect(200)).body.signedIn).toBe(false);
  });
});
