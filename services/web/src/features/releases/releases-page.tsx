import { useQuery } from '@tanstack/react-query';
import { hasRole, useAccount } from '../../lib/account.ts';
import { formatInstant } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { MakeRelease } from './make-release.tsx';
import { releasesQuery } from './releases.queries.ts';

export default function ReleasesPage() {
  const account = useAccount();
  const query = useQuery(releasesQuery());
  const newest = query.data?.releases[0]?.number ?? 0;
  return (
    <Page
      title="Releases"
      lead={
        <p>
          The registry, frozen at a moment and numbered. A release never changes, so a figure that names its release can always be shown
          again.
        </p>
      }
      note={<p>People whose consent does not allow it, and people who have withdrawn, are left out of every release made after that.</p>}
    >
      <Section note={<p>Participants are counted to the nearest 5.</p>}>
        <Answer query={query} waiting="Reading the releases.">
          {({ releases }) => (
            <Table
              id="releases"
              caption="All releases"
              columns={[
                {
                  key: 'number',
                  header: 'Release',
                  isRowHeader: true,
                  value: ({ number }) => number,
                  cell: ({ number }) => <TextLink to={`/explore?release=${number}`}>Release {number}</TextLink>,
                },
                { key: 'made', header: 'Made', value: ({ madeAt }) => madeAt, cell: ({ madeAt }) => formatInstant(madeAt) },
                { key: 'participants', header: 'Participants', kind: 'number', value: ({ participants }) => participants },
                { key: 'note', header: 'What it is for', value: ({ note }) => note },
              ]}
              rows={releases}
              rowKey={({ id }) => id}
              empty={
                <EmptyState>
                  No release has been made yet. Until a data steward makes the first one, nobody sees figures of all sites together.
                </EmptyState>
              }
              fileName="cairnstep-releases"
            />
          )}
        </Answer>
      </Section>
      {hasRole(account, 'steward') && query.data !== undefined && <MakeRelease number={newest + 1} />}
    </Page>
  );
}
