/** Exactly what will be sent: the first rows as they leave, every different word, and what was left behind. */
import { memo } from 'react';
import { columnName, tableName } from '../features/submissions/table-names.ts';
import { formatBytes, formatCount, formatNumber, formatShare } from '../lib/format.ts';
import { Facts } from '../ui/facts.tsx';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { findingWords } from './finding-words.ts';
import { isOfAnotherMonth } from './month-state.ts';
import type { ColumnPicture, FindingPicture, PreparedPicture, PreparedTablePicture } from './worker/protocol.ts';

export interface PreviewSectionProps {
  readonly prepared: PreparedPicture;
  readonly isStale: boolean;
  /** "November 2026" */
  readonly monthName: string;
  /** Whether the registry has said whom it holds. */
  readonly knowsTheRegistry: boolean;
}

/** Large, and the same until it is worked out anew. */
export const PreviewSection = memo(function PreviewSection({ prepared, isStale, monthName, knowsTheRegistry }: PreviewSectionProps) {
  const { tables, people, newPeople, rowsLeftBehind, agesTopCoded, lengthChange, rowsInMonth, columns, findings, problems } = prepared;
  const rows = tables.reduce((sum, each) => sum + each.rows, 0);
  return (
    <Section
      title="Preview"
      id="preview"
      note={
        <>
          <p>These are the bytes that leave this page, and there are no others.</p>
          <p>A net is no proof: look whether any word below could tell who somebody is.</p>
        </>
      }
    >
      <div aria-busy={isStale} className="grid gap-6">
        {isStale && <p role="status">The preview is being worked out anew.</p>}
        {lengthChange !== null && lengthChange.newLengths > 0 && (
          <Notice
            kind="warning"
            title={`${formatNumber(lengthChange.newLengths)} of ${formatCount(lengthChange.ids, 'record number')} have a length that nobody had last month.`}
          >
            <p>
              Has a spreadsheet taken away zeros at the beginning? Then these people would get a second code. Look at the column of the
              record numbers in your files before you send.
            </p>
          </Notice>
        )}
        {rowsInMonth !== null && isOfAnotherMonth(rowsInMonth) && (
          <Notice
            kind="warning"
            title={`${formatShare(rowsInMonth.inside, rowsInMonth.dated)} rows of ${tableName(rowsInMonth.table)} are of ${monthName}.`}
          >
            <p>Are these the right files? Nobody can tell later, because dates do not leave this page.</p>
          </Notice>
        )}
        <Facts
          facts={[
            { term: 'Rows', value: `${formatNumber(rows)} in ${formatCount(tables.length, 'table')}` },
            {
              term: `Training in ${monthName}`,
              value:
                rowsInMonth !== null && `${formatShare(rowsInMonth.inside, rowsInMonth.dated)} rows of ${tableName(rowsInMonth.table)}`,
            },
            { term: 'Rows that stay behind', value: rowsLeftBehind === 0 ? 'none' : formatNumber(rowsLeftBehind) },
            { term: 'People', value: formatNumber(people) },
            { term: knowsTheRegistry ? 'New to the registry' : 'New to the key file', value: formatNumber(newPeople) },
            { term: 'Ages sent as 90', value: `${formatNumber(agesTopCoded)}, because the person is 90 or older` },
          ]}
        />
        {tables.map((table) => (
          <TablePreview key={table.table} table={table} />
        ))}
        <LeftBehind columns={columns} />
        <Findings findings={findings} columns={columns} problems={problems} />
      </div>
    </Section>
  );
});

/** More columns of words than this are folded: an examination has over a hundred. */
const columnsOpen = 20;

function TablePreview({
  table: { table, rows, rowsInFile, people, bytes, headers, firstRows, words },
}: {
  readonly table: PreparedTablePicture;
}) {
  const name = tableName(table);
  const telling = words.filter(({ values }) => values.length > 0);
  return (
    <section aria-label={name} className="grid gap-3">
      <h3 className="font-semibold">{name}</h3>
      <p className="text-quiet">
        {formatShare(rows, rowsInFile)} rows of the file, {formatCount(people, 'person', 'people')}, {formatBytes(bytes)}.{' '}
        {rows > firstRows.length ? `The first ${firstRows.length} rows, as they leave:` : 'All rows, as they leave:'}
      </p>
      <div
        tabIndex={0}
        role="region"
        aria-label={`First rows of ${name}`}
        className="scrolls max-h-96 overflow-auto border border-hairline"
      >
        <table className="numbers border-separate border-spacing-0 font-mono text-small">
          <thead>
            <tr>
              {headers.map((header) => (
                <th
                  key={header}
                  scope="col"
                  className="sticky top-0 border-b border-edge bg-paper px-2 py-1 text-left font-semibold whitespace-nowrap"
                >
                  {header}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {firstRows.map((cells, row) => (
              <tr key={row}>
                {cells.map((cell, at) => (
                  <td key={at} className="border-b border-hairline px-2 py-1 whitespace-nowrap">
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {telling.length > 0 && (
        <details open={telling.length <= columnsOpen}>
          <summary className="link">
            All different words and codes of {name}, {formatCount(telling.length, 'column')}
          </summary>
          <dl className="mt-2 grid">
            {telling.map(({ column, values, numbers }) => (
              <div key={column} className="gap-x-6 border-b border-hairline py-1 sm:grid sm:grid-cols-[minmax(0,14rem)_minmax(0,1fr)]">
                <dt className="text-quiet">{columnName(table, column)}</dt>
                <dd className="numbers font-mono text-small wrap-anywhere">
                  {values.map(({ value, count }) => `${value} × ${formatNumber(count)}`).join(', ')}
                  {numbers > 0 && `, numbers × ${formatNumber(numbers)}`}
                </dd>
              </div>
            ))}
          </dl>
        </details>
      )}
    </section>
  );
}

const nameOfColumn = ({ header, number }: ColumnPicture): string => (header.trim() === '' ? `column ${number}` : header);

function LeftBehind({ columns }: Pick<PreparedPicture, 'columns'>) {
  const tables = columns
    .map(({ table, columns: all }) => ({ table, left: all.filter(({ match }) => match.as === 'left-out') }))
    .filter(({ left }) => left.length > 0);
  if (tables.length === 0) return null;
  return (
    <section aria-labelledby="left-behind" className="grid gap-2">
      <h3 id="left-behind" className="font-semibold">
        Columns that stay behind
      </h3>
      <ul className="grid max-w-2xl gap-1">
        {tables.map(({ table, left }) => (
          <li key={table} className="wrap-anywhere">
            {tableName(table)}: {left.map(nameOfColumn).join(', ')}
          </li>
        ))}
      </ul>
    </section>
  );
}

function Findings({ findings, columns, problems }: Pick<PreparedPicture, 'findings' | 'columns' | 'problems'>) {
  if (findings.length === 0) return null;
  const isWithheld = ({ table, header }: FindingPicture) =>
    problems.some((problem) => problem.kind === 'identifiers-in-column' && problem.table === table && problem.header === header);
  const isUsed = (finding: FindingPicture) =>
    !isWithheld(finding) &&
    columns.some(({ table, columns: all }) =>
      all.some(({ header, match }) => table === finding.table && header === finding.header && match.as !== 'left-out'),
    );
  return (
    <section aria-labelledby="findings" className="grid gap-2">
      <h3 id="findings" className="font-semibold">
        What looks as if it identified somebody
      </h3>
      <ul className="grid max-w-2xl gap-1">
        {findings.map((finding, at) => {
          const { table, header, class: name, count, line } = finding;
          return (
            <li key={at} className="wrap-anywhere">
              {tableName(table)}, {header.trim() === '' ? 'a column without a header' : header}: {findingWords[name]}
              {count > 0 && `, ${formatCount(count, 'cell')}`}
              {line !== null && `, first on line ${line}`}.{' '}
              <span className="text-quiet">
                {isUsed(finding) ? 'The column is used: look whether these cells may be sent.' : 'The column stays behind.'}
              </span>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
