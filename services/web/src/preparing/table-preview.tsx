/** One table as it leaves: its first rows, and every different word in it. */
import { columnName, tableName } from '../features/submissions/table-names.ts';
import { formatBytes, formatCount, formatNumber, formatShare } from '../lib/format.ts';
import type { PreparedTablePicture } from './worker/protocol.ts';

/** More columns of words than this are folded: an examination has over a hundred. */
const columnsOpen = 20;

export function TablePreview({
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
