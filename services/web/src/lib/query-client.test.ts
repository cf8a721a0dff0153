import { expect, it } from 'vitest';
import { fakeApi, nobody, refusal, signedInAs, site } from '../testing/fake-api.ts';
import { accountQuery } from './account.ts';
import { getPublicFigures } from '@cairnstep/contract';
import { call } from './call.ts';
import { makeQueryClient } from './query-client.ts';

const figuresQuery = { queryKey: ['figures'], queryFn: () => call(getPublicFigures, {}) };

it('asks again who is signed in once a refusal says that nobody is', async () => {
  const client = makeQueryClient();
  client.setQueryData(accountQuery().queryKey, signedInAs({ role: 'coordinator', site }));
  fakeApi({ 'GET /api/account': nobody, 'GET /api/public/figures': () => refusal('not-signed-in') });
  await expect(client.fetchQuery(figuresQuery)).rejects.toThrow();
  expect(await client.fetchQuery(accountQuery())).toEqual(nobody);
});

it('keeps to the account it knows after any other refusal', async () => {
  const client = makeQueryClient();
  const known = signedInAs({ role: 'coordinator', site });
  client.setQueryData(accountQuery().queryKey, known);
  fakeApi({ 'GET /api/account': nobody, 'GET /api/public/figures': () => refusal('not-found') });
  await expect(client.fetchQuery(figuresQuery)).rejects.toThrow();
  expect(await client.fetchQuery(accountQuery())).toEqual(known);
});
