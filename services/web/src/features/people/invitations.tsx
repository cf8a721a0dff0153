/** Invitations, newest first; one that was not used yet can be taken back. */
import { formatInstant } from '../../lib/format.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { useRevokeInvitation } from './people.queries.ts';
import type { Invitation } from './people.queries.ts';

const states: Readonly<Record<Invitation['status'], string>> = {
  sent: 'sent, not used yet',
  accepted: 'accepted',
  expired: 'expired',
  revoked: 'taken back',
};

const columns: readonly Column<Invitation>[] = [
  { key: 'email', header: 'E-mail', value: ({ email }) => email, isRowHeader: true },
  { key: 'role', header: 'Role', value: ({ role, site }) => roleWithin(role, site) },
  { key: 'state', header: 'State', value: ({ status }) => states[status] },
  { key: 'until', header: 'Valid until', value: ({ expiresAt }) => expiresAt, cell: ({ expiresAt }) => formatInstant(expiresAt) },
];
const act: Column<Invitation> = {
  key: 'next',
  header: 'Next',
  value: () => null,
  isAct: true,
  cell: (invitation) => invitation.status === 'sent' && <TakeBack invitation={invitation} />,
};

export function Invitations({ invitations, mayRevoke }: { readonly invitations: readonly Invitation[]; readonly mayRevoke: boolean }) {
  return (
    <Table
      id="invitations"
      caption="Invitations, newest first"
      columns={mayRevoke ? [...columns, act] : columns}
      rows={invitations}
      rowKey={({ id }) => id}
      empty={mayRevoke ? 'Nobody has been invited yet. Send the first invitation above.' : 'Nobody has been invited yet.'}
      fileName="invitations"
    />
  );
}

function TakeBack({ invitation: { id, email } }: { readonly invitation: Invitation }) {
  const revoke = useRevokeInvitation();
  return (
    <ConfirmDialog
      trigger={
        <Button variant="quiet" aria-label={`Take back the invitation of ${email}`}>
          Take back
        </Button>
      }
      title={`Take back the invitation of ${email}?`}
      consequence="The link in the e-mail stops working. You can invite the person again."
      confirm="Take it back"
      danger
      onConfirm={async () => {
        await revoke.mutateAsync(id);
        announce(`The invitation of ${email} was taken back.`);
      }}
    />
  );
}
