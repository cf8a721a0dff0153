import type { listRequests, ResponseOf } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { formatCount, formatDate } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { statusWords, titleOf } from './request-words.ts';
import { requestsQuery } from './requests.queries.ts';

type Summary = ResponseOf<typeof listRequests>['requests'][number];

export default function DeskPage() {
  const query = useQuery(requestsQuery());
  return (
    <Page title="Desk" lead={<p>Requests for rows: what is asked, what consent allows person by person, and what was decided before.</p>}>
      {query.data === undefined ? (
        <Section>
          <Answer query={query} waiting="Reading the requests.">
            {() => null}
          </Answer>
        </Section>
      ) : (
        <Queue requests={query.data.requests} />
      )}
    </Page>
  );
}

function Queue({ requests }: { readonly requests: readonly Summary[] }) {
  const waiting = requests.filter(({ waitsForYou }) => waitsForYou);
  const others = requests.filter(({ waitsForYou }) => !waitsForYou);
  return (
    <>
      <Section
        title="Waiting for you"
        note={
          waiting.length > 0 && (
            <p>{formatCount(waiting.length, 'request waits', 'requests wait')} for your decision. The one handed in first stands first.</p>
          )
        }
      >
        <RequestTable
          id="waiting"
          caption="Requests you can decide"
          requests={[...waiting].sort((a, b) => (a.submittedAt ?? '').localeCompare(b.submittedAt ?? ''))}
          empty="Nothing waits for your decision. You get an e-mail when a request is handed in."
        />
      </Section>
      <Section
        title="Others"
        note={<p>Decided, taken back, or not yours to decide: your own team’s, and those on which you have given your decision.</p>}
      >
        <RequestTable
          id="others"
          caption="All other requests"
          requests={others}
          empty="There are no other requests."
          fileName="cairnstep-requests"
        />
      </Section>
    </>
  );
}

interface RequestTableProps {
  readonly id: string;
  readonly caption: string;
  readonly requests: readonly Summary[];
  readonly empty: string;
  readonly fileName?: string;
}

function RequestTable({ requests, empty, ...table }: RequestTableProps) {
  return (
    <Table
      {...table}
      columns={[
        {
          key: 'number',
          header: 'Number',
          isRowHeader: true,
          value: ({ number }) => number,
          cell: ({ id, number }) => <TextLink to={`/desk/${id}`}>{number}</TextLink>,
        },
        { key: 'title', header: 'Title', value: titleOf },
        { key: 'lead', header: 'Lead', value: ({ lead }) => lead },
        {
          key: 'submitted',
          header: 'Handed in',
          value: ({ submittedAt }) => submittedAt,
          cell: ({ submittedAt }) => (submittedAt === null ? <span className="text-quiet">not yet</span> : formatDate(submittedAt)),
        },
        { key: 'status', header: 'Status', value: ({ status }) => statusWords[status] },
      ]}
      rows={requests}
      rowKey={({ id }) => id}
      empty={<EmptyState>{empty}</EmptyState>}
    />
  );
}
