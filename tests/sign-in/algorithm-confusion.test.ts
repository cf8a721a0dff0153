import { createHmac } from 'node:crypto';
import { exportSPKI, generateKeyPair, importJWK, SignJWT, type CryptoKey, type JWTPayload } from 'jose';
import { afterAll, beforeAll, describe, it } from 'vitest';
import { Browser, expectRefused, startSignInTest, type SignInTest } from '../support/sign-in.ts';

// Threat 7: algorithm confusion. ASVS v5.0.0-9.1.1 to v5.0.0-9.1.3.
let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

const part = (value: unknown): string => Buffer.from(JSON.stringify(value)).toString('base64url');
const unsigned = (claims: JWTPayload): Promise<string> => Promise.resolve(`${part({ alg: 'none', typ: 'JWT' })}.${part(claims)}.`);

async function signedWithPublicKey(claims: JWTPayload): Promise<string> {
  const key = (await importJWK(test.provider.keys.publicJwk, 'RS256', { extractable: true })) as CryptoKey;
  const text = `${part({ alg: 'HS256', typ: 'JWT', kid: 'key-1' })}.${part(claims)}`;
  return `${text}.${createHmac('sha256', await exportSPKI(key))
    .update(text)
    .digest('base64url')}`;
}

async function signedByStranger(claims: JWTPayload, header: Record<string, unknown>): Promise<string> {
  const { privateKey } = await generateKeyPair('RS256');
  return new SignJWT(claims).setProtectedHeader({ alg: 'RS256', ...header }).sign(privateKey);
}

describe('the signature of an ID token', () => {
  it.each([
    ['absent (alg none)', unsigned],
    ['an HMAC made with the public key', signedWithPublicKey],
    ['of an unknown key', (claims: JWTPayload) => signedByStranger(claims, { kid: 'unknown' })],
    ['of a stranger under a known key id', (claims: JWTPayload) => signedByStranger(claims, { kid: 'key-1' })],
    [
      'of a key that the header says where to find',
      (claims: JWTPayload) => signedByStranger(claims, { kid: 'key-1', jku: 'https://attacker.example/keys' }),
    ],
    [
      'over other claims',
      async (claims: JWTPayload) => {
        const [header, , signature] = (await test.provider.sign(claims)).split('.');
        return `${header}.${part({ ...claims, sub: 'somebody-else' })}.${signature}`;
      },
    ],
  ] as const)('is refused when it is %s', async (_what, idToken) => {
    const browser = new Browser(test);
    const answer = browser.honest(await browser.begin());
    test.provider.behaviour = { idToken };
    await expectRefused(test, browser, await browser.callback(answer));
  });
});
