/** A browser that signs in: keeps cookies, follows the redirect to the provider and comes back. */
import supertest from 'supertest';
import { expect } from 'vitest';
import { cloneDatabase } from './database.ts';
import { startTestServer, type TestServer } from './server.ts';
import { startTestProvider, type TestProvider } from './test-provider.ts';

export interface SignInTest {
  readonly provider: TestProvider;
  readonly server: TestServer;
  close(): Promise<void>;
}

export async function startSignInTest(settings: Readonly<Record<string, string>> = {}): Promise<SignInTest> {
  const provider = await startTestProvider();
  const server = await startTestServer(
    { OIDC_ISSUER: provider.issuer, OIDC_CLIENT_ID: provider.clientId, ...settings },
    await cloneDatabase(),
  );
  return {
    provider,
    server,
    close: async () => {
      await server.close();
      await server.database.close();
      await provider.close();
    },
  };
}

export class Browser {
  readonly agent: ReturnType<typeof supertest.agent>;

  constructor(private readonly test: SignInTest) {
    this.agent = supertest.agent(test.server.url);
  }

  /** Begins to sign in; the answer is the address at the provider. */
  async begin(returnTo = '/month'): Promise<URL> {
    const answer = await this.agent.get(`/api/sign-in?returnTo=${encodeURIComponent(returnTo)}`).expect(303);
    return new URL(answer.headers['location'] as string);
  }

  /** Comes back from the provider with these parameters. */
  callback(parameters: Readonly<Record<string, string | undefined>>): supertest.Test {
    const query = new URLSearchParams(Object.entries(parameters).flatMap(([key, value]) => (value === undefined ? [] : [[key, value]])));
    return this.agent.get(`/api/sign-in/callback?${query.toString()}`);
  }

  /** What an honest provider sends back after this authorization request. */
  honest(authorization: URL, subject?: string): { code: string; state: string; iss: string } {
    return {
      code: this.test.provider.expect(authorization, subject),
      state: authorization.searchParams.get('state') ?? '',
      iss: this.test.provider.issuer,
    };
  }

  async signIn(returnTo?: string, subject?: string): Promise<supertest.Response> {
    return this.callback(this.honest(await this.begin(returnTo), subject));
  }

  cookie(): string | undefined {
    return this.agent.jar.getCookie('cairnstep-session', { domain: '127.0.0.1', path: '/', secure: false, script: false })?.value;
  }

  async isSignedIn(): Promise<boolean> {
    return (await this.agent.get('/api/account').expect(200)).body.signedIn as boolean;
  }
}

/** Refused: a plain page with status 400, no session, and an audit entry. */
export async function expectRefused(test: SignInTest, browser: Browser, answer: supertest.Response): Promise<void> {
  expect(answer.status).toBe(400);
  expect(answer.headers['content-type']).toContain('text/html');
  expect(await browser.isSignedIn()).toBe(false);
  const { rows } = await test.server.database.owner.query(
    "select result from audit_entries where act = 'sign-in' order by seq desc limit 1",
  );
  expect(rows).toEqual([{ result: 'refused' }]);
  // The same browser signs in when all is as it should be.
  test.provider.behaviour = {};
  expect((await browser.signIn()).status).toBe(303);
  expect(await browser.isSignedIn()).toBe(true);
}
