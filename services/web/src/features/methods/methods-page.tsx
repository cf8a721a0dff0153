import type { EvidenceRow } from '@cairnstep/statistics';
import { evidenceTable } from '@cairnstep/statistics';
import { useAddressChange, useAddressParam } from '../../lib/address-state.ts';
import { formatCount } from '../../lib/format.ts';
import { Button } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { ExplainedItem } from '../../ui/explained-item.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { SearchFields } from '../../ui/search-fields.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { methodAddress } from './addresses.ts';
import { entries, findEntries, topics, topicWords } from './entries.ts';
import type { Entry } from './entries.ts';
import { evidenceColumns } from './evidence-columns.tsx';

export default function MethodsPage() {
  const [query, setQuery] = useAddressParam('q');
  const [asked, setAsked] = useAddressParam('question');
  const change = useAddressChange();
  const topic = topics.find((known) => known === asked) ?? 'all';
  const found = findEntries(query ?? '', topic);
  const evidence = evidenceTable.filter(({ method }) => found.some(({ slug }) => slug === method));
  return (
    <Page
      title="Methods"
      lead={
        <p>
          How every figure of the registry is computed, what the registry decides itself, and how near it comes to figures computed
          elsewhere.
        </p>
      }
      actions={
        <Button variant="quiet" onPress={() => window.print()}>
          Print
        </Button>
      }
      note={
        <p>
          Observational data: groups are compared, no effect is claimed. Intervals are two-sided at 95% and stand before p-values; what is
          missing is counted, never filled in.
        </p>
      }
    >
      <Section>
        <SearchFields
          id="methods"
          hint="Name, use or source"
          words={query ?? ''}
          onWords={setQuery}
          choice={{
            label: 'Question',
            hint: 'What you want to know',
            value: topic,
            onChange: (chosen) => setAsked(chosen === 'all' ? null : chosen),
            options: [{ value: 'all', label: 'Every question' }, ...topics.map((value) => ({ value, label: topicWords[value] }))],
          }}
        />
        <p role="status" className="pt-4 text-quiet">
          {formatCount(found.length, 'page')} of {entries.length}
        </p>
        {found.length === 0 && (
          <EmptyState action={<Button onPress={() => change({ q: null, question: null })}>Show every method</Button>}>
            No page holds all of these words under this question. Try fewer of them, or every question.
          </EmptyState>
        )}
      </Section>
      {topics.map((each) => (
        <TopicSection key={each} title={topicWords[each]} id={each} entries={found.filter((entry) => entry.topic === each)} />
      ))}
      {evidence.length > 0 && (
        <Section title="Evidence" id="evidence" wide note={<EvidenceNote />}>
          <Table
            id="evidence"
            caption="Each method beside figures from outside the registry"
            columns={columns}
            rows={evidence}
            rowKey={({ method, source }) => `${method} ${source}`}
            empty="No figure has been compared yet."
            fileName="cairnstep-evidence"
          />
        </Section>
      )}
    </Page>
  );
}

function EvidenceNote() {
  return (
    <>
      <p>
        The relative error is the largest of all figures compared. Where the source itself was printed with few digits, or was found by a
        search that stops early, its error is part of it.
      </p>
      <p>
        Anyone with the program can repeat it: <code>npm run verify:statistics</code>
      </p>
    </>
  );
}

function TopicSection({ title, id, entries: shown }: { readonly title: string; readonly id: string; readonly entries: readonly Entry[] }) {
  if (shown.length === 0) return null;
  return (
    <Section title={title} id={id}>
      <ul>
        {shown.map(({ slug, title: name, summary }) => (
          <ExplainedItem key={slug} name={<TextLink to={methodAddress(slug)}>{name}</TextLink>}>
            {summary}
          </ExplainedItem>
        ))}
      </ul>
    </Section>
  );
}

const titleOf = (method: string): string => entries.find(({ slug }) => slug === method)?.title ?? method;

const columns: readonly Column<EvidenceRow>[] = [
  {
    key: 'method',
    header: 'Method',
    value: ({ method }) => titleOf(method),
    cell: ({ method }) => <TextLink to={methodAddress(method)}>{titleOf(method)}</TextLink>,
    isRowHeader: true,
  },
  ...evidenceColumns.map((column) => ({ ...column, isRowHeader: false })),
];
