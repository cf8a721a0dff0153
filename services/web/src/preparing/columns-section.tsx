/** What becomes of each column of the clinic's files. Folded where all were matched without a question. */
import { memo, useState } from 'react';
import { tableName } from '../features/submissions/table-names.ts';
import { formatCount } from '../lib/format.ts';
import { Button } from '../ui/button.tsx';
import { Checkbox } from '../ui/checkbox.tsx';
import { Section } from '../ui/page.tsx';
import { ColumnEditor } from './column-editor.tsx';
import { nameOfColumn, staysBehind } from './columns-behind.ts';
import { FirstDays } from './first-days.tsx';
import { describeMatch } from './meanings.ts';
import { ProblemList } from './problem-list.tsx';
import { hasToDecide } from './to-decide.ts';
import type { Month } from './use-month.ts';
import { WordsToExplain } from './words-to-explain.tsx';
import type { ColumnPicture, PreparedPicture, TableColumns } from './worker/protocol.ts';

/** The column whose editor is open, if any: `3:17` is column 17 of source 3. */
type OpenEditor = string | null;

export function ColumnsSection({ month, prepared }: { readonly month: Month; readonly prepared: PreparedPicture }) {
  const [open, setOpen] = useState<OpenEditor>(null);
  const { columns, problems, firstDays } = prepared;
  return (
    <Section
      title="Columns"
      id="columns"
      note={
        <>
          <p>Headers and example cells are shown here only. What you choose is remembered in the key file for next month.</p>
          <p>A column that stays behind is not sent, and neither is its header.</p>
        </>
      }
    >
      <div className="grid gap-6">
        <WordsToExplain columns={columns} onChange={(source, columnNumber) => setOpen(`${source}:${columnNumber}`)} />
        <ProblemList
          problems={problems}
          onChange={(table, columnNumber) => {
            const source = columns.find((each) => each.table === table)?.source;
            if (source !== undefined) setOpen(`${source}:${columnNumber}`);
          }}
        />
        {firstDays.length > 0 && <FirstDays month={month} places={firstDays} />}
        {columns.map((each) => (
          <TableOfColumns key={each.source} columns={each} problems={problems} month={month} open={open} setOpen={setOpen} />
        ))}
      </div>
    </Section>
  );
}

interface TableOfColumnsProps {
  readonly columns: TableColumns;
  readonly problems: PreparedPicture['problems'];
  readonly month: Month;
  readonly open: OpenEditor;
  readonly setOpen: (open: OpenEditor) => void;
}

function TableOfColumns({ columns: all, problems, month, open, setOpen }: TableOfColumnsProps) {
  const { source, table, columns } = all;
  const [isOpen, setUnfolded] = useState<boolean | null>(null);
  const [isBehindOnly, setBehindOnly] = useState(false);
  const isEditedHere = open?.startsWith(`${source}:`) === true;
  // It stays open once the question is settled: what has the focus must not vanish.
  if (isOpen !== true && (isEditedHere || (isOpen === null && hasToDecide(all, problems)))) setUnfolded(true);
  const behind = columns.filter((column) => staysBehind(column, table, problems));
  const isMixed = behind.length > 0 && behind.length < columns.length;
  const isEdited = ({ number }: ColumnPicture) => open === `${source}:${number}`;
  const shown = isBehindOnly && isMixed ? columns.filter((column) => behind.includes(column) || isEdited(column)) : columns;

  function fold(): void {
    setUnfolded(isOpen !== true);
    if (isEditedHere) setOpen(null);
  }

  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h3 className="font-semibold">{tableName(table)}</h3>
        <Button variant="quiet" aria-expanded={isOpen === true} onPress={fold}>
          {isOpen === true ? `Fold the columns of ${tableName(table)}` : `Show the columns of ${tableName(table)}`}
        </Button>
      </div>
      <p className="text-quiet wrap-anywhere">
        {formatCount(columns.length - behind.length, 'column')} used, {behindWords(behind)}. {newsOf(columns)}
      </p>
      {isOpen === true && isMixed && (
        <Checkbox id={`behind-only-${source}`} value={isBehindOnly} onChange={setBehindOnly}>
          Show only what stays behind of {tableName(table)}
        </Checkbox>
      )}
      {isOpen === true && (
        <ul className="border-t border-hairline">
          {shown.map((column) => (
            <ColumnItem
              key={column.number}
              column={column}
              source={source}
              table={table}
              matchColumn={month.matchColumn}
              isEdited={isEdited(column)}
              setOpen={setOpen}
            />
          ))}
        </ul>
      )}
    </div>
  );
}

const behindWords = (behind: readonly ColumnPicture[]): string =>
  behind.length === 0
    ? 'none stays behind'
    : `${behind.length} ${behind.length === 1 ? 'stays' : 'stay'} behind: ${behind.map(nameOfColumn).join(', ')}`;

function newsOf(columns: readonly ColumnPicture[]): string {
  const fresh = columns.filter(({ isNew, isMatchable }) => isNew && isMatchable).length;
  if (fresh === 0) return 'As last month.';
  return fresh === columns.filter(({ isMatchable }) => isMatchable).length
    ? 'New: next month they are remembered.'
    : `${fresh} not as last month.`;
}

interface ColumnItemProps {
  readonly column: ColumnPicture;
  readonly source: number;
  readonly table: TableColumns['table'];
  readonly matchColumn: Month['matchColumn'];
  readonly isEdited: boolean;
  readonly setOpen: (open: OpenEditor) => void;
}

/** A table may have a hundred and more: only the one that changes is drawn again. */
const ColumnItem = memo(function ColumnItem({ column, source, table, matchColumn, isEdited, setOpen }: ColumnItemProps) {
  const { number, header, examples, match, isMatchable, unknownWords } = column;
  const name = header.trim() === '' ? `Column ${number}` : header;
  return (
    <li className="grid gap-3 border-b border-hairline py-2">
      <div className="grid items-baseline gap-x-6 gap-y-1 columns:grid-cols-[minmax(0,5fr)_minmax(0,6fr)_auto]">
        <div className="min-w-0">
          <p className="font-semibold wrap-anywhere">{name}</p>
          <p className="text-small text-quiet wrap-anywhere">{examples.length === 0 ? 'empty' : examples.join(' · ')}</p>
        </div>
        <p className={match.as === 'left-out' ? 'text-quiet' : ''}>
          {isMatchable ? describeMatch(table, match) : 'Stays behind: a column needs a header of its own to be used'}
          {unknownWords.length > 0 && (
            <span className="block text-small text-amber">{formatCount(unknownWords.length, 'word')} not known</span>
          )}
        </p>
        {isMatchable && (
          <div className="justify-self-start">
            <Button
              variant="quiet"
              {...(!isEdited && { 'aria-label': `Change what becomes of ${name}` })}
              aria-expanded={isEdited}
              onPress={() => setOpen(isEdited ? null : `${source}:${number}`)}
            >
              {isEdited ? 'Close' : 'Change'}
            </Button>
          </div>
        )}
      </div>
      {isEdited && <ColumnEditor column={column} table={table} onMatch={(chosen) => void matchColumn(source, chosen)} />}
    </li>
  );
});
