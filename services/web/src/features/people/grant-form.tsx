/** Gives a role to someone who has an account already. */
import { useState } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { useGiveGrant } from './people.queries.ts';
import type { Person } from './people.queries.ts';
import { emptyRole, fieldIdsOf, problemsOfRole, roleOf } from './role-draft.ts';
import { RoleFields } from './role-fields.tsx';

const ids = fieldIdsOf('give');
const refusable = { '/body/role': ids.role, '/body/siteId': ids.site, '/body/endsOn': ids.endsOn };
const today = () => new Date().toISOString().slice(0, 10);

export function GrantForm({ person }: { readonly person: Person }) {
  const give = useGiveGrant(person.id);
  const [draft, setDraft] = useState(emptyRole);
  const [attempt, setAttempt] = useState(0);
  const found = attempt === 0 ? [] : problemsOfRole(draft, ids, today(), person.grants);
  const problems = found.length > 0 ? found : problemsOf(give.error, refusable);

  function send(): void {
    setAttempt(attempt + 1);
    if (problemsOfRole(draft, ids, today(), person.grants).length > 0) return;
    give.mutate(
      { ...roleOf(draft), startsOn: today() },
      {
        onSuccess: ({ grants }) => {
          const given = grants.at(-1);
          announce(given === undefined ? 'The role was given.' : `${person.name} is now ${roleWithin(given.role, given.site)}.`);
          setDraft(emptyRole);
          setAttempt(0);
        },
      },
    );
  }

  return (
    <Form onSubmit={send} attempt={attempt} problems={problems}>
      <RoleFields ids={ids} draft={draft} problems={problems} onChange={setDraft} />
      {give.isError && problems.length === 0 && <ErrorNotice error={give.error} />}
      <div>
        <Button type="submit" variant="primary" isPending={give.isPending}>
          Give the role from today
        </Button>
      </div>
    </Form>
  );
}
