import type { Account } from '@cairnstep/contract';
import type { Person } from './people.queries.ts';

/** Whether a person of the list is the one signed in: a grant belongs to one account alone. */
export function isOneself(person: Person, account: Account | undefined): boolean {
  const own = new Set(account?.grants.map(({ id }) => id));
  return person.grants.some(({ id }) => own.has(id));
}
