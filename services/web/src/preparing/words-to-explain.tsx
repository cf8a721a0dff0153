import { tableName } from '../features/submissions/table-names.ts';
import { Button } from '../ui/button.tsx';
import { Notice } from '../ui/notice.tsx';
import type { PreparedPicture } from './worker/protocol.ts';

export interface WordsToExplainProps {
  readonly columns: PreparedPicture['columns'];
  readonly onChange: (source: number, columnNumber: number) => void;
}

/**
 * The clinic's own words that stand for no code yet. They come before the problems, because they may be behind them: without a status
 * that is understood nobody has trained, and no first training day is known.
 */
export function WordsToExplain({ columns, onChange }: WordsToExplainProps) {
  const unexplained = columns.flatMap(({ source, table, columns: all }) =>
    all.filter(({ unknownWords }) => unknownWords.length > 0).map((column) => ({ source, table, column })),
  );
  if (unexplained.length === 0) return null;
  return (
    <Notice kind="warning" title="Words of your clinic that stand for nothing yet.">
      <ul className="grid gap-2">
        {unexplained.map(({ source, table, column: { number, header, unknownWords } }) => (
          <li key={`${source}:${number}`} className="grid justify-items-start">
            <p className="wrap-anywhere">
              <span className="font-semibold">
                {tableName(table)}, {header}:
              </span>{' '}
              {unknownWords.join(', ')}
            </p>
            <Button
              variant="quiet"
              aria-label={`Say what the words of ${header} in ${tableName(table)} mean`}
              onPress={() => onChange(source, number)}
            >
              Say what they mean
            </Button>
          </li>
        ))}
      </ul>
    </Notice>
  );
}
