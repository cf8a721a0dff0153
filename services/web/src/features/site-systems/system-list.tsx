/** The systems in a table; one that is lost or retired is disabled here. */
import { formatInstant } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { useSetSystemStatus } from './site-systems.queries.ts';
import type { System } from './site-systems.queries.ts';

const columns: readonly Column<System>[] = [
  { key: 'label', header: 'System', value: ({ label }) => label, isRowHeader: true },
  { key: 'site', header: 'Site', value: ({ site }) => `${site.name} (${site.code})` },
  {
    key: 'client',
    header: 'Client id',
    value: ({ subject }) => subject,
    cell: ({ subject }) => <code className="inline-block min-w-40 wrap-anywhere">{subject}</code>,
  },
  {
    key: 'status',
    header: 'State',
    value: ({ status }) => status,
    cell: ({ status }) => (status === 'active' ? 'active' : <strong className="font-semibold text-oxide">disabled</strong>),
  },
  {
    key: 'used',
    header: 'Last used',
    value: ({ lastUsedAt }) => lastUsedAt,
    cell: ({ lastUsedAt }) => (lastUsedAt === null ? <span className="text-quiet">never</span> : formatInstant(lastUsedAt)),
  },
  {
    key: 'added',
    header: 'Registered',
    value: ({ addedAt }) => addedAt,
    cell: ({ addedAt, addedBy }) => (
      <>
        {formatInstant(addedAt)}
        <span className="block text-small text-quiet">by {addedBy}</span>
      </>
    ),
  },
];
const act: Column<System> = { key: 'next', header: 'Next', value: () => null, isAct: true, cell: (system) => <Switch system={system} /> };

export function SystemList({ systems, mayChange }: { readonly systems: readonly System[]; readonly mayChange: boolean }) {
  return (
    <Table
      id="systems"
      caption="Systems by site"
      columns={mayChange ? [...columns, act] : columns}
      rows={systems}
      rowKey={({ id }) => id}
      empty={mayChange ? 'No system has been registered yet. Register the first one below.' : 'No system has been registered yet.'}
      fileName="site-systems"
    />
  );
}

function Switch({ system: { id, label, site, status } }: { readonly system: System }) {
  const set = useSetSystemStatus(id);
  const isActive = status === 'active';
  const verb = isActive ? 'Disable' : 'Enable';
  return (
    <ConfirmDialog
      trigger={
        <Button variant="quiet" aria-label={`${verb} ${label}`}>
          {verb}
        </Button>
      }
      title={`${verb} ${label}?`}
      consequence={
        isActive
          ? `From its next request on it is refused. ${site.name} can still submit by hand; what the system submitted stays.`
          : `It can submit for ${site.name} again, with tokens of the identity provider.`
      }
      confirm={`${verb} the system`}
      danger={isActive}
      onConfirm={async () => {
        await set.mutateAsync(isActive ? 'disabled' : 'active');
        announce(`${label} is ${isActive ? 'disabled' : 'active again'}.`);
      }}
    />
  );
}
