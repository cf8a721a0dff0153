import { afterEach, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

// Threat 5: metadata of another issuer. ASVS v5.0.0-10.5.3. Discovery happens at the first sign-in, so that is what fails; public pages go on.
let test: SignInTest;
afterEach(() => test.close());

describe('a discovery document', () => {
  it.each([
    ['differs by a trailing slash', (issuer: string) => `${issuer}/`],
    ['differs by case', (issuer: string) => issuer.replace('http', 'HTTP')],
    ['is of another host', () => 'https://other-provider.example'],
  ])('whose issuer %s is not accepted, and nobody can sign in by it', async (_what, change) => {
    test = await startSignInTest();
    test.provider.behaviour = { metadata: (document) => ({ ...document, issuer: change(test.provider.issuer) }) };
    const browser = new Browser(test);
    const answer = await browser.agent.get('/api/sign-in');
    expect(answer.status).toBe(503);
    await browser.agent.get('/api/public/figures').expect(200);
    test.provider.behaviour = {};
    expect((await browser.signIn()).status).toBe(303);
  });
});
