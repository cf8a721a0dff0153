/** Who did what: every entry for stewards, their own acts for others. */
import { roles } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { hasRole, useAccount } from '../../lib/account.ts';
import { usePageNumber } from '../../lib/address-state.ts';
import { formatInstant, formatNumber } from '../../lib/format.ts';
import { roleNames } from '../../lib/role-names.ts';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Pagination } from '../../ui/pagination.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { actWords } from './act-words.ts';
import { auditQuery } from './audit.queries.ts';
import type { Entry } from './audit.queries.ts';
import { Verification } from './verification.tsx';

export default function AuditPage() {
  const account = useAccount();
  const isSteward = hasRole(account, 'steward');
  const page = usePageNumber();
  const query = useQuery(auditQuery(page));
  return (
    <Page
      title="Audit"
      lead={<p>{leadOf(isSteward, hasRole(account, 'administrator'))}</p>}
      note={<p>The log only grows. Each entry carries a digest of the one before it, so that a change to any of them shows.</p>}
    >
      {isSteward && (
        <Section
          title="Verification"
          id="verification"
          note={<p>The same can be run on the server with the audit:verify command, without trusting this page.</p>}
        >
          <Verification />
        </Section>
      )}
      <Section title="Entries" id="entries" wide>
        <Answer query={query} waiting="Reading the log.">
          {({ items, pageSize, total }) => (
            <>
              <Table
                id="entries"
                caption="Entries, newest first"
                columns={columns}
                rows={items}
                rowKey={({ seq }) => String(seq)}
                isSortable={false}
                empty={page > 1 ? 'There are no entries this far back. Go to an earlier page.' : 'Nothing has been done yet.'}
                fileName="audit"
              />
              <Pagination label="entries" page={page} pageSize={pageSize} total={total} one="entry" many="entries" anchor="entries" />
            </>
          )}
        </Answer>
      </Section>
    </Page>
  );
}

function leadOf(isSteward: boolean, isAdministrator: boolean): string {
  if (isSteward) return 'Who saw, changed, decided and downloaded what, in the whole registry.';
  return isAdministrator ? 'What was done to accounts, roles and site systems, and your own acts.' : 'Your own acts in the registry.';
}

/** Someone with several roles acts with all of them; a site's system acts as one, the registry itself has none. */
function rolesInWords(names: string | null): string | null {
  if (names === 'site-system') return 'system of a site';
  const known = (names ?? '').split(' ').flatMap((name) => roles.filter((role) => role === name));
  return known.length === 0 ? null : known.map((role) => roleNames[role]).join(', ');
}

const results: Readonly<Record<Entry['result'], string>> = { ok: 'done', refused: 'refused', failed: 'failed' };

const columns: readonly Column<Entry>[] = [
  { key: 'seq', header: 'Number', value: ({ seq }) => seq, cell: ({ seq }) => formatNumber(seq), kind: 'number' },
  { key: 'at', header: 'When', value: ({ at }) => at, cell: ({ at }) => <span className="numbers">{formatInstant(at)}</span> },
  { key: 'actor', header: 'Who', value: ({ actor }) => (actor === 'system' ? 'the registry itself' : actor) },
  { key: 'role', header: 'Role', value: ({ role }) => rolesInWords(role) },
  {
    key: 'act',
    header: 'Act',
    value: ({ act }) => act,
    cell: ({ act }) => actWords(act),
    isRowHeader: true,
  },
  {
    key: 'object',
    header: 'Of',
    value: ({ object }) => object,
    cell: ({ object }) =>
      object === null ? <span className="text-quiet">nothing named</span> : <code className="text-small break-all">{object}</code>,
  },
  {
    key: 'result',
    header: 'Result',
    value: ({ result }) => results[result],
    cell: ({ result }) => <span className={result === 'ok' ? '' : 'font-semibold text-oxide'}>{results[result]}</span>,
  },
];
