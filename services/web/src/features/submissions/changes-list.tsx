/** The rows behind one number of the preview: their key, and each value before and after. */
import type { listChanges, ResponseOf } from '@cairnstep/contract';
import { tableOf } from '@cairnstep/dictionary';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useAddressParam, usePageNumber } from '../../lib/address-state.ts';
import { Answer } from '../../ui/answer.tsx';
import { Landing } from '../../ui/landing.tsx';
import { Section } from '../../ui/page.tsx';
import { Pagination } from '../../ui/pagination.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { changeKinds } from './change-kinds.ts';
import type { TableChange } from './review-section.tsx';
import { changesQuery } from './submissions.queries.ts';
import type { ChangeKind, TableKey } from './submissions.queries.ts';
import { columnName, tableName } from './table-names.ts';

type Change = ResponseOf<typeof listChanges>['items'][number];

export function ChangesList({ submissionId, tables }: { readonly submissionId: string; readonly tables: readonly TableChange[] }) {
  const [table] = useAddressParam('changes');
  const [kind] = useAddressParam('kind');
  const counted = tables.find((one) => one.table === table);
  const named = changeKinds.find((one) => one.kind === kind);
  if (counted === undefined || named === undefined) return null;
  return <Rows submissionId={submissionId} table={counted.table} {...named} />;
}

interface RowsProps {
  readonly submissionId: string;
  readonly table: TableKey;
  readonly kind: ChangeKind;
  readonly word: string;
}

function Rows({ submissionId, table, kind, word }: RowsProps) {
  const page = usePageNumber('changes-page');
  const query = useQuery(changesQuery(submissionId, table, kind, page));
  const title = `${word} rows of ${tableName(table).toLowerCase()}`;
  return (
    <Section id="rows" title={title} wide>
      <Landing name="rows" label={title} />
      <Answer query={query} waiting="Reading the rows.">
        {({ items, pageSize, total }) => (
          <div>
            <Table
              id="rows"
              caption={kind === 'removed' ? 'Key and last values' : 'Key and values, in the order of the file'}
              columns={columnsOf(table, kind)}
              rows={items}
              rowKey={({ key }) => Object.values(key).join(' ')}
              isSortable={false}
              empty="There is no such row any more. Check the month again to see what would change now."
              fileName={`${table}-${kind}`}
            />
            <Pagination label="rows" page={page} pageSize={pageSize} total={total} one="row" name="changes-page" anchor="rows" />
          </div>
        )}
      </Answer>
    </Section>
  );
}

function columnsOf(table: TableKey, kind: ChangeKind): readonly Column<Change>[] {
  const keys = tableOf(table).rowKey.map((column, index): Column<Change> => ({
    key: column,
    header: columnName(table, column),
    value: ({ key }) => key[column] ?? null,
    isRowHeader: index === 0,
    cell: ({ key }) => (index === 0 ? <code>{key[column]}</code> : <Value>{key[column] ?? null}</Value>),
  }));
  const line: Column<Change> = { key: 'line', header: 'Line', value: ({ line: at }) => at, kind: 'number' };
  const values: Column<Change> = {
    key: 'values',
    header: kind === 'changed' ? 'Before and after' : 'Values',
    value: ({ cells }) => cells.map((cell) => `${cell.column}: ${cellWords(cell, kind)}`).join('; '),
    cell: ({ cells }) => <Values table={table} kind={kind} cells={cells} />,
  };
  return [...(kind === 'removed' ? [] : [line]), ...keys, ...(kind === 'unchanged' ? [] : [values])];
}

type Cell = Change['cells'][number];

const cellWords = ({ before, after }: Cell, kind: ChangeKind): string =>
  kind === 'changed' ? `${before ?? 'empty'} to ${after ?? 'empty'}` : (after ?? before ?? 'empty');

/** So many values of a row are in sight at once; an exam has more than a hundred. */
const inSight = 6;

function Values({ table, kind, cells }: { readonly table: TableKey; readonly kind: ChangeKind; readonly cells: readonly Cell[] }) {
  const shown = cells.slice(0, inSight);
  const folded = cells.slice(inSight);
  return (
    <>
      {kind === 'removed' && <p className="font-semibold text-oxide">Removed from the registry</p>}
      <CellList table={table} kind={kind} cells={shown} />
      {folded.length > 0 && (
        <details>
          <summary className="link">{folded.length} more</summary>
          <CellList table={table} kind={kind} cells={folded} />
        </details>
      )}
    </>
  );
}

function CellList({ table, kind, cells }: { readonly table: TableKey; readonly kind: ChangeKind; readonly cells: readonly Cell[] }) {
  return (
    <ul className="min-w-60">
      {cells.map((cell) => (
        <li key={cell.column}>
          <span className="text-quiet">{columnName(table, cell.column)}: </span>
          {kind === 'changed' ? (
            <>
              <Value>{cell.before}</Value> <span className="text-quiet">becomes</span>{' '}
              <strong className="font-semibold">
                <Value>{cell.after}</Value>
              </strong>
            </>
          ) : (
            <Value>{cell.after ?? cell.before}</Value>
          )}
        </li>
      ))}
    </ul>
  );
}

/** A stored number shows a true minus; it is copied and downloaded as stored. */
const withMinus = (text: string): string => text.replace(/^-(?=\d)/, '\u2212');

function Value({ children }: { readonly children: string | null }): ReactNode {
  return children === null ? <span className="text-quiet">empty</span> : <span className="numbers">{withMinus(children)}</span>;
}
