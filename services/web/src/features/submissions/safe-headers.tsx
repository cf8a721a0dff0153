/** Headers of a site's files that screening lets pass. A steward marks and removes them; the site's people look. */
import type { Account, Site } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { hasRole } from '../../lib/account.ts';
import { formatInstant } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Landing } from '../../ui/landing.tsx';
import { Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { MarkHeaderForm } from './mark-header-form.tsx';
import { safeHeadersQuery, useUnmarkHeader } from './safe-headers.queries.ts';
import type { SafeHeader } from './safe-headers.queries.ts';

export function SafeHeaders({ site, account }: { readonly site: Site; readonly account: Account }) {
  const query = useQuery(safeHeadersQuery(site.id));
  const mayMark = hasRole(account, 'steward');
  return (
    <Section
      title="Headers marked as safe"
      id="safe-headers"
      note={
        <>
          <p>The header alone is no longer judged, in files of this site only. The cells under it are, as everywhere.</p>
          <p>Both marking and removing stand in the audit log.</p>
        </>
      }
    >
      <Landing name="safe-headers" label="Headers marked as safe" />
      <p className="mb-4 max-w-2xl">
        A file is refused when the header of a column announces what identifies a person, such as “mobile”. Where it means something else at
        this site, {mayMark ? 'mark it here' : 'ask a data steward to mark it'}.
      </p>
      <div className="grid gap-8">
        <Answer query={query} waiting="Reading the headers.">
          {({ headers }) => (
            <Table
              id="safe-headers"
              caption={`Headers that pass in files of ${site.name}`}
              columns={mayMark ? [...columns, removal(site)] : columns}
              rows={headers}
              rowKey={({ header }) => header}
              empty="No header is marked for this site: all are judged."
            />
          )}
        </Answer>
        {mayMark && <MarkHeaderForm key={site.id} site={site} />}
      </div>
    </Section>
  );
}

const columns: readonly Column<SafeHeader>[] = [
  {
    key: 'header',
    header: 'Header',
    value: ({ header }) => header,
    cell: ({ header }) => <code className="wrap-anywhere">{header}</code>,
    isRowHeader: true,
  },
  { key: 'by', header: 'Marked by', value: ({ markedBy }) => markedBy },
  { key: 'marked', header: 'Marked', value: ({ markedAt }) => markedAt, cell: ({ markedAt }) => formatInstant(markedAt) },
];

const removal = (site: Site): Column<SafeHeader> => ({
  key: 'next',
  header: 'Next',
  value: () => null,
  isAct: true,
  cell: ({ header }) => <RemoveHeader site={site} header={header} />,
});

function RemoveHeader({ site, header }: { readonly site: Site; readonly header: string }) {
  const unmark = useUnmarkHeader(site.id);
  return (
    <ConfirmDialog
      trigger={
        <Button variant="quiet" aria-label={`Remove ${header}`}>
          Remove
        </Button>
      }
      title={`Have “${header}” judged again?`}
      consequence={`From the next check on, files of ${site.name} with this header are refused. Months that were accepted stay.`}
      confirm="Remove the mark"
      danger
      onConfirm={async () => {
        await unmark.mutateAsync(header);
        announce(`The header ${header} is judged again.`);
      }}
    />
  );
}
