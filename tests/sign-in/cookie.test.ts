import { afterEach, describe, expect, it } from 'vitest';
import supertest from 'supertest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

// Threat 13: a weak cookie. ASVS v5.0.0-3.3.1, v5.0.0-3.3.3, v5.0.0-3.3.4, v5.0.0-7.2.3.
let test: SignInTest;
afterEach(() => test.close());

describe('the session cookie', () => {
  it('behind TLS carries the host prefix, Secure, HttpOnly and SameSite=Lax, and no domain', async () => {
    test = await startSignInTest({ PUBLIC_URL: 'https://cairnstep.example', TRUST_PROXY: '1' });
    const answer = await supertest(test.server.url).get('/api/sign-in').set('X-Forwarded-Proto', 'https').expect(303);
    const cookie = String(answer.headers['set-cookie']);
    expect(cookie).toMatch(/^__Host-cairnstep=/);
    for (const attribute of ['Path=/', 'Secure', 'HttpOnly', 'SameSite=Lax']) expect(cookie).toContain(attribute);
    expect(cookie).not.toContain('Domain');
    expect(new URL(answer.headers['location'] as string).searchParams.get('redirect_uri')).toBe(
      'https://cairnstep.example/api/sign-in/callback',
    );
    expect(answer.headers['strict-transport-security']).toBeDefined();
  });

  it('is random of at least 128 bits and says nothing of the person', async () => {
    test = await startSignInTest();
    const ids = new Set<string>();
    for (let i = 0; i < 20; i += 1) {
      const browser = new Browser(test);
      await browser.begin();
      // `s:` + id + `.` + signature; the id is base64url.
      const id = /^s%3A([A-Za-z0-9_-]+)\./.exec(browser.cookie() ?? '')?.[1] ?? '';
      expect(id.length * 6).toBeGreaterThanOrEqual(128);
      ids.add(id);
    }
    expect(ids.size).toBe(20);
  });

  it('is refused when its signature is not ours', async () => {
    test = await startSignInTest();
    const browser = new Browser(test);
    await browser.signIn();
    const forged = `${(browser.cookie() ?? '').slice(0, -4)}AAAA`;
    const account = await new Browser(test).agent.get('/api/account').set('Cookie', `cairnstep-session=${forged}`);
    expect(account.body.signedIn).toBe(false);
  });
});
