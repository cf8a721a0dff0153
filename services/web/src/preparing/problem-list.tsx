import type { TableKey } from '@cairnstep/dictionary';
import { columnName, tableName } from '../features/submissions/table-names.ts';
import { formatCount } from '../lib/format.ts';
import { Button } from '../ui/button.tsx';
import { Notice } from '../ui/notice.tsx';
import type { ProblemPicture } from './worker/protocol.ts';

export interface ProblemListProps {
  readonly problems: readonly ProblemPicture[];
  readonly onChange: (table: TableKey, columnNumber: number) => void;
}

/** More lines than this are counted; the file is sorted faster than they are read. */
const linesShown = 12;

/** What the site has to mend or to know, with the place in its own file. */
export function ProblemList({ problems, onChange }: ProblemListProps) {
  if (problems.length === 0) return <p>Every row and cell of the files can be read.</p>;
  return (
    <Notice kind="warning" title={`${formatCount(problems.length, 'thing')} to mend or to know.`}>
      <p>Mend it in your files and drop them again, or change what becomes of the column. What cannot be read is not sent.</p>
      <ul className="mt-3 grid gap-3">
        {problems.map((problem, at) => (
          <li key={at} className="grid justify-items-start">
            <p>
              <span className="font-semibold wrap-anywhere">{placeOf(problem)}</span>
              {problem.count > 0 && `, ${formatCount(problem.count, 'row')}`}
            </p>
            <p>{problem.message}</p>
            {problem.lines.length > 0 && <p className="text-small text-quiet">{linesOf(problem)}</p>}
            {problem.columnNumber !== null && (
              <Button
                variant="quiet"
                aria-label={`Change what becomes of ${problem.header ?? 'the column'} in ${tableName(problem.table)}`}
                onPress={() => onChange(problem.table, problem.columnNumber ?? 0)}
              >
                Change the column
              </Button>
            )}
          </li>
        ))}
      </ul>
    </Notice>
  );
}

function placeOf({ table, header, columnNumber, variable }: ProblemPicture): string {
  const parts = [tableName(table)];
  if (columnNumber !== null) parts.push(header === null || header.trim() === '' ? `column ${columnNumber}` : header);
  if (variable !== null) parts.push(`for ${columnName(table, variable)}`);
  return parts.join(', ');
}

function linesOf({ lines, count }: ProblemPicture): string {
  const shown = lines.slice(0, linesShown).join(', ');
  const more = count - Math.min(lines.length, linesShown);
  return `${count === 1 ? 'Line' : 'Lines'} ${shown}${more > 0 ? ` and ${formatCount(more, 'more', 'more')}` : ''} of your file`;
}
