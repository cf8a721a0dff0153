import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 9: tampering with the redirect address. ASVS v5.0.0-10.4.1, v5.0.0-4.1.3; RFC 9700.
describe('the redirect address', () => {
  it.each([
    ['a parameter', '?redirect_uri=https://evil.example/', {}],
    ['the Host header', '', { Host: 'evil.example' }],
    ['X-Forwarded-Host', '', { 'X-Forwarded-Host': 'evil.example', 'X-Forwarded-Proto': 'https' }],
  ])('does not follow %s', async (_what, query, headers) => {
    const browser = new Browser(test);
    const answer = await browser.agent.get(`/api/sign-in${query}`).set(headers).expect(303);
    expect(new URL(answer.headers['location'] as string).searchParams.get('redirect_uri')).toBe(`${test.server.url}/api/sign-in/callback`);
  });

  it('sent with the code is the same', async () => {
    const browser = new Browser(test);
    await browser.signIn();
    expect(test.provider.tokenRequests.at(-1)?.form.get('redirect_uri')).toBe(`${test.server.url}/api/sign-in/callback`);
  });
});
