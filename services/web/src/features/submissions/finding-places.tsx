/** Every place the findings name, by file, line and column; narrowed by what the address says. */
import type { listFindings, ResponseOf, Submission } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useAddressChange, useAddressParam, usePageNumber } from '../../lib/address-state.ts';
import { Answer } from '../../ui/answer.tsx';
import { Landing } from '../../ui/landing.tsx';
import { Section } from '../../ui/page.tsx';
import { Pagination } from '../../ui/pagination.tsx';
import { Select } from '../../ui/select.tsx';
import type { SelectOption } from '../../ui/select.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ApplyMends } from './apply-mends.tsx';
import { MendCell } from './mend-cell.tsx';
import type { MendDrafts } from './mend-drafts.ts';
import { findingsQuery } from './submissions.queries.ts';
import type { FindingFilter, TableKey } from './submissions.queries.ts';
import { isColumn, tableName, tables } from './table-names.ts';

export type Place = ResponseOf<typeof listFindings>['items'][number];

/** The cells of one place. */
const placeColumns: readonly Column<Place>[] = [
  { key: 'table', header: 'Table', value: ({ table }) => tableName(table) },
  {
    key: 'line',
    header: 'Line',
    value: ({ line }) => line,
    kind: 'number',
    cell: ({ line }) => line ?? <span className="text-quiet">file</span>,
  },
  {
    key: 'column',
    header: 'Column',
    value: ({ column }) => column,
    cell: ({ table, column }) =>
      column === null ? <span className="text-quiet">whole row</span> : <ColumnKey table={table} column={column} />,
  },
  { key: 'found', header: 'Found', value: ({ found }) => found },
  { key: 'mend', header: 'Mend', value: ({ mend }) => mend },
  {
    key: 'rule',
    header: 'Rule',
    value: ({ rule }) => rule,
    cell: ({ rule, severity }) => (
      <>
        {rule} <span className={severity === 'error' ? 'text-oxide' : 'text-amber'}>{severity}</span>
      </>
    ),
  },
];

/** Leads to what the dictionary says of the column, where it has one. */
function ColumnKey({ table, column }: { readonly table: Place['table']; readonly column: string }) {
  const key = <code>{column}</code>;
  return isColumn(table, column) ? <TextLink to={`/dictionary/${table}/${column}`}>{key}</TextLink> : key;
}

export interface FindingPlacesProps {
  readonly submission: Submission;
  readonly caption: string;
  /** Values typed in place of cells; null for whoever only looks. */
  readonly drafts: MendDrafts | null;
}

export function FindingPlaces({ submission, caption, drafts }: FindingPlacesProps) {
  const filter = useFilter();
  const page = usePageNumber();
  const query = useQuery(findingsQuery(submission.id, filter, page));
  return (
    <Section
      id="places"
      title="Places in the files"
      note={
        <>
          <p>Line 1 is the header, as an editor counts.</p>
          {drafts !== null && (
            <p>
              A cell can be mended here: Enter goes on to the next one, Escape takes back what you typed. The file at the clinic stays as it
              is, so mend it there too.
            </p>
          )}
        </>
      }
      wide
    >
      <Landing name="places" label="Places in the files" />
      <div className="grid gap-4">
        <Filters submission={submission} filter={filter} />
        <Answer query={query} waiting="Reading the findings.">
          {({ items, pageSize, total }) => (
            <div>
              <Table
                id="places"
                caption={caption}
                columns={drafts === null ? placeColumns : [...placeColumns, mendColumn(submission, drafts, items)]}
                rows={items}
                rowKey={({ id }) => String(id)}
                isSortable={false}
                empty="No finding fits these filters. Choose others to see the rest."
              />
              <Pagination label="Findings" page={page} pageSize={pageSize} total={total} one="finding" anchor="places" />
            </div>
          )}
        </Answer>
        {drafts !== null && <ApplyMends submission={submission} drafts={drafts} />}
      </div>
    </Section>
  );
}

/** A cell that must be filled is filled. */
const mustBeFilledRule = 'F20';

/** One field for each cell, however many findings name it. */
function mendColumn({ files }: Submission, drafts: MendDrafts, items: readonly Place[]): Column<Place> {
  const isKept = (key: TableKey) =>
    files.some(({ table, tables: of, refused }) => !refused && (table === key || (table === null && of?.includes(key) === true)));
  const first = new Map<string, number>();
  const cellOf = ({ table, line, column }: Place) => `${table} ${line} ${column}`;
  for (const item of [...items].reverse()) first.set(cellOf(item), item.id);
  const empty = new Set(items.filter(({ rule }) => rule === mustBeFilledRule).map(cellOf));
  return {
    key: 'mend-here',
    header: 'New value',
    value: () => null,
    isAct: true,
    cell: (item) => {
      const { id, table, line, column } = item;
      if (table === null || line === null || line < 2 || column === null || !isColumn(table, column) || !isKept(table)) return null;
      if (first.get(cellOf(item)) !== id) return <span className="text-quiet">as above</span>;
      return <MendCell place={{ table, line, column }} mustBeFilled={empty.has(cellOf(item))} drafts={drafts} />;
    },
  };
}

function useFilter(): FindingFilter {
  const [rule] = useAddressParam('rule');
  const [table] = useAddressParam('in');
  const [severity] = useAddressParam('severity');
  const known = tables.find(({ key }) => key === table);
  return {
    ...(rule !== null && { rule }),
    ...(known !== undefined && { table: known.key }),
    ...((severity === 'error' || severity === 'warning') && { severity }),
  };
}

const all = 'all';

function Filters({ submission, filter }: { readonly submission: Submission; readonly filter: FindingFilter }) {
  const change = useAddressChange();
  const narrow = (name: string) => (value: string) => change({ [name]: value === all ? null : value, page: null });
  const inFiles = new Set(submission.files.flatMap(({ table, tables: held }) => held ?? (table === null ? [] : [table])));
  const files = tables.filter(({ key }) => inFiles.has(key)).map(({ key, name }) => ({ value: key, label: name }));
  const rules = submission.findings.map(({ rule, statement }) => ({ value: rule, label: `${rule}: ${statement}` }));
  const severities = [
    { value: 'error', label: 'Errors' },
    { value: 'warning', label: 'Warnings' },
  ];
  return (
    <div className="grid items-end gap-4 sm:grid-cols-2 md:grid-cols-[220px_200px_minmax(0,1fr)]">
      <Filter
        id="severity"
        label="Kind"
        any="Errors and warnings"
        value={filter.severity}
        options={severities}
        onChange={narrow('severity')}
      />
      <Filter id="in" label="Table" any="All tables" value={filter.table} options={files} onChange={narrow('in')} />
      <Filter id="rule" label="Rule" any="All rules" value={filter.rule} options={rules} onChange={narrow('rule')} />
    </div>
  );
}

interface FilterProps {
  readonly id: string;
  readonly label: string;
  readonly any: string;
  readonly value: string | undefined;
  readonly options: readonly SelectOption[];
  readonly onChange: (value: string) => void;
}

function Filter({ value, any, options, ...rest }: FilterProps) {
  return <Select {...rest} value={value ?? all} options={[{ value: all, label: any }, ...options]} />;
}
