/** Every submission of a site, newest first, with the way to its receipt; and which headers of its files pass. */
import type { listSubmissions, ResponseOf, Site } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useLocation } from 'react-router-dom';
import { usePageNumber } from '../../lib/address-state.ts';
import { formatInstant, formatMonth } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Pagination } from '../../ui/pagination.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ForChosenSite } from './chosen-site.tsx';
import { SafeHeaders } from './safe-headers.tsx';
import { submissionsQuery } from './submissions.queries.ts';

type Line = ResponseOf<typeof listSubmissions>['items'][number];

export default function SubmissionsPage() {
  const { search } = useLocation();
  return (
    <Page
      title="Submissions"
      lead={
        <>
          <p>What the site sent, what became of it, and the receipts.</p>
          <p className="text-base">
            <TextLink to={{ search, hash: '#safe-headers' }}>Headers marked as safe</TextLink>
          </p>
        </>
      }
      note={<p>A later submission corrects a month that was accepted: tables it brings no file of stay as they are. Both receipts stay.</p>}
    >
      <ForChosenSite>
        {(site, account) => (
          <>
            <SubmissionsOf site={site} />
            <SafeHeaders site={site} account={account} />
          </>
        )}
      </ForChosenSite>
    </Page>
  );
}

function SubmissionsOf({ site }: { readonly site: Site }) {
  const page = usePageNumber();
  const query = useQuery(submissionsQuery(site.id, page));
  return (
    <Section title={site.name} id="submissions">
      <Answer query={query} waiting="Reading the submissions.">
        {({ items, pageSize, total }) => (
          <>
            <Table
              id="submissions"
              caption={`Submissions of ${site.name}, newest first`}
              columns={columns}
              rows={items}
              rowKey={({ id }) => id}
              isSortable={false}
              empty={
                <>
                  No submission has been opened yet. Begin with <TextLink to={`/month?site=${site.code}`}>the months of the site</TextLink>.
                </>
              }
              fileName={`${site.code}-submissions`}
            />
            <Pagination label="submissions" page={page} pageSize={pageSize} total={total} one="submission" />
          </>
        )}
      </Answer>
    </Section>
  );
}

const states: Readonly<Record<Line['status'], string>> = {
  open: 'files are being added',
  checking: 'being checked',
  checked: 'checked, not committed',
  accepted: 'accepted',
  superseded: 'corrected by a later submission',
  discarded: 'given up',
};

const columns: readonly Column<Line>[] = [
  { key: 'month', header: 'Month', value: ({ month }) => month, cell: ({ month }) => formatMonth(month), isRowHeader: true },
  { key: 'state', header: 'State', value: ({ status }) => states[status] },
  { key: 'begun', header: 'Begun', value: ({ createdAt }) => createdAt, cell: ({ createdAt }) => formatInstant(createdAt) },
  { key: 'by', header: 'By', value: ({ createdBy }) => createdBy },
  {
    key: 'settled',
    header: 'Settled',
    value: ({ settledAt }) => settledAt,
    cell: ({ settledAt }) => (settledAt === null ? <span className="text-quiet">not yet</span> : formatInstant(settledAt)),
  },
  { key: 'rows', header: 'Rows sent', value: ({ rows }) => rows, kind: 'number' },
  { key: 'next', header: 'Open', value: () => null, cell: (line) => <Way line={line} />, isAct: true },
];

function Way({ line: { id, month, status } }: { readonly line: Line }) {
  const hasReceipt = status === 'accepted' || status === 'superseded';
  return (
    <TextLink to={hasReceipt ? `/submissions/${id}/receipt` : `/submit/${id}`}>
      {hasReceipt ? 'Receipt' : 'Submission'}
      <span className="sr-only"> of {formatMonth(month)}</span>
    </TextLink>
  );
}
