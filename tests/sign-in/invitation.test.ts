import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Browser, startSignInTest, type SignInTest } from '../support/sign-in.ts';

let test: SignInTest;
beforeAll(async () => {
  test = await startSignInTest();
});
afterAll(() => test.close());

describe('an invitation', () => {
  const invite = async (expires = "now() + interval '1 day'"): Promise<string> => {
    const token = Buffer.from(Array.from({ length: 32 }, () => Math.floor(Math.random() * 256))).toString('base64url');
    await test.server.database.owner.query(
      `insert into invitations (id, email, role, token_hash, invited_by, expires_at) values (gen_random_uuid(), 'guest@test.example', 'researcher', encode(sha256($1::bytea), 'hex'), gen_random_uuid(), ${expires})`,
      [token],
    );
    return token;
  };
  const accept = (browser: Browser, token: string) =>
    browser.agent.post(`/api/invitations/${token}/accept`).set('X-Cairnstep-Request', '1').send({});

  it('binds to whoever signs in with it, whatever their address, once', async () => {
    const token = await invite();
    const guest = new Browser(test);
    await guest.agent.get(`/api/invitations/${token}`).expect(200);
    expect((await accept(guest, token)).status).toBe(401);
    await guest.signIn(`/invitation/${token}`, 'guest-1');
    const account = await accept(guest, token).expect(200);
    expect(account.body.grants).toEqual([expect.objectContaining({ role: 'researcher' })]);
    const late = new Browser(test);
    await late.signIn('/', 'guest-2');
    expect((await accept(late, token)).body.type).toBe('/problems/invitation-unusable');
    expect((await late.agent.get('/api/account')).body.grants).toEqual([]);
  });

  it('goes to one of two people who use it at the same moment', async () => {
    const token = await invite();
    const [one, two] = [new Browser(test), new Browser(test)];
    await one.signIn('/', 'racer-1');
    await two.signIn('/', 'racer-2');
    const answers = await Promise.all([accept(one, token), accept(two, token)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 410]);
  });

  it('expires', async () => {
    const token = await invite("now() - interval '1 second'");
    const guest = new Browser(test);
    expect((await guest.agent.get(`/api/invitations/${token}`)).status).toBe(410);
    await guest.signIn('/', 'guest-3');
    expect((await accept(guest, token)).status).toBe(410);
  });
});
