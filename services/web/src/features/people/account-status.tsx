/** Whether the account may sign in, and the way to close or reopen it. */
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { useSetStatus } from './people.queries.ts';
import type { Person } from './people.queries.ts';

export function AccountStatus({ person: { id, name, status }, mayChange }: { readonly person: Person; readonly mayChange: boolean }) {
  const set = useSetStatus(id);
  const isActive = status === 'active';
  return (
    <div className="grid justify-items-start gap-3">
      <p>{isActive ? 'The account is active.' : <strong className="font-semibold text-oxide">The account is disabled.</strong>}</p>
      {mayChange && (
        <ConfirmDialog
          trigger={
            <Button variant={isActive ? 'danger' : 'secondary'}>{isActive ? 'Disable the account' : 'Enable the account again'}</Button>
          }
          title={isActive ? `Disable the account of ${name}?` : `Enable the account of ${name} again?`}
          consequence={
            isActive
              ? 'The person is signed out at the next request and cannot sign in again. Roles stay with the account; it can be enabled again.'
              : 'The person can sign in again and has the roles that have not ended.'
          }
          confirm={isActive ? 'Disable the account' : 'Enable the account'}
          danger={isActive}
          onConfirm={async () => {
            await set.mutateAsync(isActive ? 'disabled' : 'active');
            announce(`The account of ${name} is ${isActive ? 'disabled' : 'active again'}.`);
          }}
        />
      )}
    </div>
  );
}
