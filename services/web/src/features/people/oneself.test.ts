import { expect, it } from 'vitest';
import { signedInAs } from '../../testing/fake-api.ts';
import { isOneself } from './oneself.ts';
import type { Person } from './people.queries.ts';

const account = signedInAs({ role: 'administrator', site: null });
const person = (grants: Person['grants']): Person => ({
  id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a99',
  name: 'Mara Lind',
  email: null,
  institution: null,
  status: 'active',
  lastSignInAt: null,
  grants,
});

it('knows the signed-in person by a grant, not by a name others may share', () => {
  expect(isOneself(person(account.grants), account)).toBe(true);
  expect(isOneself(person([]), account)).toBe(false);
  expect(isOneself(person(account.grants), undefined)).toBe(false);
});
