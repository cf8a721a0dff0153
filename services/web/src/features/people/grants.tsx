/** A person's roles with their days, each to be ended. */
import { formatDate } from '../../lib/format.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { useEndGrant } from './people.queries.ts';
import type { Person } from './people.queries.ts';

type Grant = Person['grants'][number];

export function Grants({ person, mayChange }: { readonly person: Person; readonly mayChange: boolean }) {
  if (person.grants.length === 0) {
    return (
      <EmptyState>
        {mayChange
          ? 'No role. The person can sign in and sees only whom to ask. Give a role below.'
          : 'No role. The person can sign in and sees only whom to ask.'}
      </EmptyState>
    );
  }
  return (
    <ul aria-label="Roles">
      {person.grants.map((grant) => (
        <li key={grant.id} className="flex flex-wrap items-center justify-between gap-x-6 border-t border-hairline py-2 last:border-b">
          <span>
            <span className="font-semibold">{roleWithin(grant.role, grant.site)}</span>
            <span className="block text-small text-quiet">{daysOf(grant)}</span>
          </span>
          {mayChange && <EndGrant person={person} grant={grant} />}
        </li>
      ))}
    </ul>
  );
}

const daysOf = ({ startsOn, endsOn }: Grant): string =>
  `from ${formatDate(startsOn)} ${endsOn === null ? 'until it is ended' : `to ${formatDate(endsOn)}`}`;

function EndGrant({ person, grant }: { readonly person: Person; readonly grant: Grant }) {
  const end = useEndGrant(person.id);
  const role = roleWithin(grant.role, grant.site);
  return (
    <ConfirmDialog
      trigger={
        <Button variant="quiet" aria-label={`End the role ${role}`}>
          End the role
        </Button>
      }
      title={`End the role of ${person.name} as ${role}?`}
      consequence={
        person.grants.length === 1
          ? 'It is the person’s only role: from the next request on they see only whom to ask.'
          : 'From the person’s next request on the role gives nothing more. Other roles stay.'
      }
      confirm="End the role"
      danger
      onConfirm={async () => {
        await end.mutateAsync(grant.id);
        announce(`The role ${role} of ${person.name} has ended.`);
      }}
    />
  );
}
