/** What a commit would change, table by table, and row by row on demand. */
import type { Submission } from '@cairnstep/contract';
import { useSearchParams } from 'react-router-dom';
import { formatCount, formatNumber } from '../../lib/format.ts';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ChangesList } from './changes-list.tsx';
import { changeKinds } from './change-kinds.ts';
import { totalOf } from './stack-steps.ts';
import type { ChangeKind } from './submissions.queries.ts';
import { tableName } from './table-names.ts';

export type TableChange = NonNullable<Submission['preview']>['tables'][number];

export function ReviewSection({ submission }: { readonly submission: Submission }) {
  const { preview } = submission;
  if (preview === null) return null;
  const { added, changed, removed } = totalOf(preview.tables);
  const rows = formatCount(removed, 'row');
  return (
    <>
      <Section
        title="Review"
        id="review"
        note={
          <>
            <p>
              New: not in the registry yet. Changed: the same key, another value. Removed: in the registry for this month, not in your file.
            </p>
            <p>A row is known by its key: the participant code with the day and the numbers of session and bout.</p>
          </>
        }
      >
        <div className="grid gap-4">
          {removed > 0 && (
            <Notice kind="warning" title={`${rows} would be removed from the registry.`}>
              <p>They are in the registry for this month and missing in the files you sent. Look at them before you commit.</p>
            </Notice>
          )}
          {added + changed + removed === 0 && <p>The registry already holds just these rows. A commit would change nothing.</p>}
          <ChangeCounts
            id="changes"
            caption="What would change, in rows"
            tables={preview.tables}
            fileName={`${submission.site.code}-${submission.month}-changes`}
            linked
          />
        </div>
      </Section>
      <ChangesList submissionId={submission.id} tables={preview.tables} />
    </>
  );
}

export interface ChangeCountsProps {
  readonly id: string;
  readonly caption: string;
  readonly tables: readonly TableChange[];
  readonly fileName: string;
  /** Each number leads to its rows. */
  readonly linked?: boolean;
}

export function ChangeCounts({ id, caption, tables, fileName, linked = false }: ChangeCountsProps) {
  const columns: readonly Column<TableChange>[] = [
    { key: 'table', header: 'Table', value: ({ table }) => tableName(table), isRowHeader: true },
    ...changeKinds.map(({ kind, word }) => ({
      key: kind,
      header: word,
      kind: 'number' as const,
      value: (row: TableChange) => row[kind],
      cell: (row: TableChange) => (linked ? <CountLink row={row} kind={kind} word={word} /> : formatNumber(row[kind])),
    })),
  ];
  return (
    <Table
      id={id}
      caption={caption}
      columns={columns}
      rows={tables}
      rowKey={({ table }) => table}
      empty="No table came with a file."
      fileName={fileName}
    />
  );
}

function CountLink({ row, kind, word }: { readonly row: TableChange; readonly kind: ChangeKind; readonly word: string }) {
  const [search] = useSearchParams();
  const count = formatNumber(row[kind]);
  if (row[kind] === 0) return count;
  const rows = new URLSearchParams(search);
  rows.set('changes', row.table);
  rows.set('kind', kind);
  rows.delete('changes-page');
  return (
    <TextLink to={{ search: `?${rows}`, hash: '#rows' }}>
      {kind === 'removed' ? <strong className="font-semibold text-oxide">{count}</strong> : count}
      <span className="sr-only">
        {' '}
        {word.toLowerCase()} rows of {tableName(row.table).toLowerCase()}
      </span>
    </TextLink>
  );
}
