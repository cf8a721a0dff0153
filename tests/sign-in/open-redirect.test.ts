import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 10: being sent elsewhere after signing in. ASVS v5.0.0-3.7.2, v5.0.0-1.2.2.
describe('the page after signing in', () => {
  it.each([
    '//evil.example',
    '/\\evil.example',
    'https:evil.example',
    'https://evil.example',
    '%2f%2fevil.example',
    '/%2f/evil.example',
    '/%5Cevil.example',
    'javascript:alert(1)',
    '/\tevil',
    '',
    '/api/account',
  ])('is home instead of %j', async (returnTo) => {
    expect((await new Browser(test).signIn(returnTo)).headers['location']).toBe('/');
  });

  it.each(['/month', '/explore?outcome=tmwt_ss&inDevice=no', '/desk/0b1f3c9e-1111-4222-8333-444455556666#votes'])(
    'is %s when it is one of ours',
    async (returnTo) => {
      expect((await new Browser(test).signIn(returnTo)).headers['location']).toBe(returnTo);
    },
  );
});
