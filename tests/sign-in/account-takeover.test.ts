import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

// Threat 11: an account taken over by its e-mail address. ASVS v5.0.0-10.5.2, v5.0.0-10.3.3.
describe('an identity', () => {
  it('is issuer and subject: the same e-mail under another subject is somebody new, without a role', async () => {
    const owner = new Browser(test);
    await owner.signIn('/month', 'subject-of-a-steward');
    const { rows } = await test.server.database.owner.query("select id from accounts where subject = 'subject-of-a-steward'");
    await test.server.database.owner.query(
      "insert into grants (id, account_id, role, starts_on) values (gen_random_uuid(), $1, 'steward', current_date - 1)",
      [rows[0].id],
    );
    expect((await owner.agent.get('/api/account')).body.grants).toHaveLength(1);

    const other = new Browser(test);
    await other.signIn('/month', 'subject-of-somebody-else');
    const account = (await other.agent.get('/api/account')).body;
    expect(account).toMatchObject({ signedIn: true, grants: [], may: [] });
    expect((await other.agent.get('/api/releases')).body.type).toBe('/problems/no-grant');
    const accounts = await test.server.database.owner.query("select count(*)::int as n from accounts where email = 'person@test.example'");
    expect(accounts.rows[0].n).toBe(2);
  });

  it('gets no role from a claim of the provider', async () => {
    const browser = new Browser(test);
    const authorization = await browser.begin();
    const code = test.provider.expect(authorization, 'subject-with-claims', {
      groups: ['steward'],
      roles: ['administrator'],
      role: 'steward',
    });
    await browser.callback({ ...browser.honest(authorization), code }).expect(303);
    expect((await browser.agent.get('/api/account')).body.grants).toEqual([]);
  });

  it('of a disabled account is not let in', async () => {
    const browser = new Browser(test);
    await browser.signIn('/month', 'subject-to-disable');
    await test.server.database.owner.query("update accounts set status = 'disabled' where subject = 'subject-to-disable'");
    expect(await browser.isSignedIn()).toBe(false);
    expect((await browser.signIn('/month', 'subject-to-disable')).status).toBe(400);
    expect(await browser.isSignedIn()).toBe(false);
  });
});
