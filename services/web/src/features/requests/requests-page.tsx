import { useQuery } from '@tanstack/react-query';
import { formatDate } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { LinkButton } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { statusWords, titleOf } from './request-words.ts';
import { requestsQuery } from './requests.queries.ts';

export default function RequestsPage() {
  const query = useQuery(requestsQuery());
  return (
    <Page
      title="Access requests"
      lead={
        <p>Rows leave the registry only for an approved purpose that each participant’s consent allows. Here are your team’s requests.</p>
      }
      note={<p>A request begins best in the grid: choose the groups you want to study, then ask for their rows.</p>}
      actions={
        <>
          <LinkButton variant="primary" to="/explore">
            Choose a cohort in the grid
          </LinkButton>
          <LinkButton to="/requests/new">Ask for everyone’s rows</LinkButton>
        </>
      }
    >
      <Section>
        <Answer query={query} waiting="Reading your requests.">
          {({ requests }) => (
            <Table
              id="requests"
              caption="Requests of your team"
              columns={[
                {
                  key: 'number',
                  header: 'Number',
                  isRowHeader: true,
                  value: ({ number }) => number,
                  cell: ({ id, number }) => <TextLink to={`/requests/${id}`}>{number}</TextLink>,
                },
                { key: 'title', header: 'Title', value: titleOf },
                { key: 'status', header: 'Status', value: ({ status }) => statusWords[status] },
                {
                  key: 'submitted',
                  header: 'Handed in',
                  value: ({ submittedAt }) => submittedAt,
                  cell: ({ submittedAt }) => (submittedAt === null ? <span className="text-quiet">not yet</span> : formatDate(submittedAt)),
                },
                {
                  key: 'updated',
                  header: 'Last changed',
                  value: ({ updatedAt }) => updatedAt,
                  cell: ({ updatedAt }) => formatDate(updatedAt),
                },
              ]}
              rows={requests}
              rowKey={({ id }) => id}
              empty={<EmptyState>No request has been written yet. Choose a cohort in the grid and ask for its rows.</EmptyState>}
              fileName="cairnstep-requests"
            />
          )}
        </Answer>
      </Section>
    </Page>
  );
}
