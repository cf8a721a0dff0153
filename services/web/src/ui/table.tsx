/**
 * Rows and columns to read: a caption, the unit in the header, sorting kept in the address, a header that stays in sight,
 * copying as text and downloading as CSV. Sorts the rows it is given; paged lists keep the server's order (`isSortable={false}`).
 */
import { useId } from 'react';
import type { ReactNode } from 'react';
import { useAddressParam } from '../lib/address-state.ts';
import { toCsv, toTabSeparated } from '../lib/csv.ts';
import type { CsvValue } from '../lib/csv.ts';
import { formatCount, formatNumber } from '../lib/format.ts';
import { saveFile } from '../lib/save-file.ts';
import { announce } from './announcer.tsx';
import { Button } from './button.tsx';
import { ScrollFrame } from './scroll-frame.tsx';

export interface Column<Row> {
  readonly key: string;
  readonly header: string;
  /** Stands in the header, so that cells hold bare numbers. */
  readonly unit?: string;
  /** What the column sorts by, copies and downloads. Null: nothing known, always last. */
  readonly value: (row: Row) => CsvValue;
  /** How it shows, where that differs from the plain value. */
  readonly cell?: (row: Row) => ReactNode;
  /** Digits after the point for numbers shown plainly. */
  readonly decimals?: number;
  /** `number` aligns at the right with tabular figures. */
  readonly kind?: 'text' | 'number';
  /** The column that names the row. */
  readonly isRowHeader?: boolean;
  /** Things to press or follow: neither sorted by nor copied. */
  readonly isAct?: boolean;
}

export interface TableProps<Row> {
  /** Unique on the page; also the name of the sort parameter in the address (`sort-<id>`). */
  readonly id: string;
  readonly caption: string;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  /** Shown instead of an empty body: says what to do next. */
  readonly empty: ReactNode;
  readonly isSortable?: boolean;
  /** Keeps the cells that name the rows in sight while wide tables scroll sideways. */
  readonly pinsRowHeaders?: boolean;
  /** Name of the CSV file, without its ending; no file name, no copying and downloading. */
  readonly fileName?: string;
}

interface Sort {
  readonly key: string;
  readonly descending: boolean;
}

export function Table<Row>({
  id,
  caption,
  columns,
  rows,
  rowKey,
  empty,
  isSortable = true,
  pinsRowHeaders = false,
  fileName,
}: TableProps<Row>) {
  const captionId = useId();
  const [sortText, setSortText] = useAddressParam(`sort-${id}`);
  const sort = isSortable ? readSort(sortText, columns) : null;
  const ordered = sort === null ? rows : sorted(rows, columns, sort);

  if (rows.length === 0) return <div className="py-4 text-quiet">{empty}</div>;
  return (
    <div className="grid gap-2">
      <ScrollFrame labelledBy={captionId}>
        <table className="w-full border-separate border-spacing-0">
          <caption id={captionId} className="pb-2 text-left font-semibold">
            {caption}
          </caption>
          <thead>
            <tr>
              {columns.map((column) => (
                <HeaderCell
                  key={column.key}
                  column={column}
                  isPinned={pinsRowHeaders && column.isRowHeader === true}
                  direction={sort?.key === column.key ? (sort.descending ? 'descending' : 'ascending') : undefined}
                  onSort={isSortable && column.isAct !== true ? () => setSortText(nextSort(column, sort)) : undefined}
                />
              ))}
            </tr>
          </thead>
          {/* What takes the focus does not end up under the head that sticks. */}
          <tbody className="[&_:is(a,button,input)]:scroll-mt-20">
            {ordered.map((row) => (
              <tr key={rowKey(row)} className="hover:bg-paper">
                {columns.map((column) => (
                  <BodyCell key={column.key} column={column} row={row} isPinned={pinsRowHeaders && column.isRowHeader === true} />
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollFrame>
      {fileName !== undefined && <Takeaway columns={columns.filter(({ isAct }) => isAct !== true)} rows={ordered} fileName={fileName} />}
    </div>
  );
}

// `wrap-normal`: a column is as wide as its longest word, and a rounding of that width must not break the word.
const cellLook = 'border-b px-3 py-2 font-normal wrap-normal first:pl-0 last:pr-0';
const alignment = (kind: 'text' | 'number' = 'text') => (kind === 'number' ? 'numbers text-right' : 'text-left');

/** Above the cells that scroll under it; narrow enough to leave them room. */
const pinned = 'sticky left-0 max-w-36 bg-sheet pr-3';

function HeaderCell<Row>({
  column,
  isPinned,
  direction,
  onSort,
}: {
  readonly column: Column<Row>;
  readonly isPinned: boolean;
  readonly direction: 'ascending' | 'descending' | undefined;
  readonly onSort: (() => void) | undefined;
}) {
  const words = (
    <>
      <span className="font-semibold">{column.header}</span>
      {column.unit !== undefined && <span className="text-quiet">, {column.unit}</span>}
    </>
  );
  return (
    <th
      scope="col"
      aria-sort={direction}
      className={`${cellLook} sticky top-0 border-edge bg-sheet align-bottom ${alignment(column.kind)} ${isPinned ? `${pinned} z-2` : 'z-1'}`}
    >
      {onSort === undefined ? (
        words
      ) : (
        <button type="button" onClick={onSort} className="inline-flex min-h-6 items-center gap-1 [text-align:inherit] hover:underline">
          <span>{words}</span>
          <SortMark direction={direction} />
        </button>
      )}
    </th>
  );
}

function SortMark({ direction }: { readonly direction: 'ascending' | 'descending' | undefined }) {
  return (
    <svg
      aria-hidden="true"
      width="9"
      height="16"
      viewBox="0 0 9 16"
      className="not-printed shrink-0 text-edge"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
    >
      {direction !== 'descending' && <path d="M1 6 4.5 2 8 6" className={direction === undefined ? '' : 'stroke-ink'} />}
      {direction !== 'ascending' && <path d="M1 10 4.5 14 8 10" className={direction === undefined ? '' : 'stroke-ink'} />}
    </svg>
  );
}

function BodyCell<Row>({ column, row, isPinned }: { readonly column: Column<Row>; readonly row: Row; readonly isPinned: boolean }) {
  const look = `${cellLook} border-hairline align-top ${alignment(column.kind)} ${isPinned ? pinned : ''}`;
  const content = column.cell === undefined ? plain(column, row) : column.cell(row);
  // Buttons are as tall as a row: they must not make it taller.
  const shown = column.isAct === true ? <div className="-my-2 flex min-h-10 flex-wrap items-center gap-x-4">{content}</div> : content;
  if (column.isRowHeader === true) {
    return (
      <th scope="row" className={look}>
        {shown}
      </th>
    );
  }
  return <td className={look}>{shown}</td>;
}

function plain<Row>(column: Column<Row>, row: Row): ReactNode {
  const value = column.value(row);
  if (value === null) return <span className="text-quiet">none</span>;
  return typeof value === 'number' ? formatNumber(value, column.decimals ?? 0) : value;
}

function Takeaway<Row>({
  columns,
  rows,
  fileName,
}: {
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly fileName: string;
}) {
  const cells = () => [
    columns.map(({ header, unit }) => (unit === undefined ? header : `${header}, ${unit}`)),
    ...rows.map((row) => columns.map(({ value }) => value(row))),
  ];
  async function copy(): Promise<void> {
    try {
      await navigator.clipboard.writeText(toTabSeparated(cells()));
      announce(`Copied ${formatCount(rows.length, 'row')}.`);
    } catch {
      announce('The browser did not allow copying. Download the CSV file instead.');
    }
  }
  return (
    <div className="not-printed flex flex-wrap gap-x-6">
      <Button variant="quiet" onPress={() => void copy()}>
        Copy as text
      </Button>
      <Button variant="quiet" onPress={() => saveFile(`${fileName}.csv`, toCsv(cells()), 'text/csv;charset=utf-8')}>
        Download CSV
      </Button>
    </div>
  );
}

function readSort<Row>(text: string | null, columns: readonly Column<Row>[]): Sort | null {
  if (text === null) return null;
  const descending = text.startsWith('-');
  const key = descending ? text.slice(1) : text;
  return columns.some((column) => column.key === key) ? { key, descending } : null;
}

/** First press: numbers from the largest, words from A. Second: the other way. Third: the order they came in. */
function nextSort<Row>(column: Column<Row>, current: Sort | null): string | null {
  const firstDescending = column.kind === 'number';
  const write = (descending: boolean) => (descending ? `-${column.key}` : column.key);
  if (current?.key !== column.key) return write(firstDescending);
  return current.descending === firstDescending ? write(!firstDescending) : null;
}

function sorted<Row>(rows: readonly Row[], columns: readonly Column<Row>[], sort: Sort): readonly Row[] {
  const value = columns.find(({ key }) => key === sort.key)?.value;
  if (value === undefined) return rows;
  const sign = sort.descending ? -1 : 1;
  return [...rows].sort((a, b) => {
    const [left, right] = [value(a), value(b)];
    if (left === null || right === null) return left === right ? 0 : left === null ? 1 : -1;
    if (typeof left === 'number' && typeof right === 'number') return sign * (left - right);
    return sign * String(left).localeCompare(String(right), 'en', { numeric: true });
  });
}
