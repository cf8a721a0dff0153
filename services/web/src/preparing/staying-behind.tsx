/** What stays at the clinic, and why; and what the detectors saw in the files. */
import { identifierWords } from '@cairnstep/deidentification';
import { tableName } from '../features/submissions/table-names.ts';
import { formatCount } from '../lib/format.ts';
import { isWithheld, nameOfColumn } from './columns-behind.ts';
import type { FindingPicture, PreparedPicture } from './worker/protocol.ts';

export function StayingBehind({ columns, problems, findings }: Pick<PreparedPicture, 'columns' | 'problems' | 'findings'>) {
  return (
    <>
      <LeftBehind columns={columns} problems={problems} />
      <Findings findings={findings} columns={columns} problems={problems} />
    </>
  );
}

type WithProblems = Pick<PreparedPicture, 'columns' | 'problems'>;

function LeftBehind({ columns, problems }: WithProblems) {
  const tables = columns
    .map(({ table, columns: all }) => {
      const withheld = all.filter(({ header, match }) => match.as !== 'left-out' && isWithheld(problems, table, header));
      const unnamed = all.filter(({ isMatchable }) => !isMatchable);
      const others = all.filter(({ match, isMatchable }) => match.as === 'left-out' && isMatchable);
      return {
        table,
        reasons: [
          ['not asked for', others],
          ['cells that seem to identify people', withheld],
          ['no header of their own', unnamed],
        ] as const,
      };
    })
    .filter(({ reasons }) => reasons.some(([, left]) => left.length > 0));
  if (tables.length === 0) return null;
  return (
    <section aria-labelledby="left-behind" className="grid gap-2">
      <h3 id="left-behind" className="font-semibold">
        Columns that stay behind
      </h3>
      <ul className="grid max-w-2xl gap-1">
        {tables.map(({ table, reasons }) =>
          reasons
            .filter(([, left]) => left.length > 0)
            .map(([reason, left]) => (
              <li key={`${table} ${reason}`} className="wrap-anywhere">
                {tableName(table)}, <span className="text-quiet">{reason}:</span> {left.map(nameOfColumn).join(', ')}
              </li>
            )),
        )}
      </ul>
    </section>
  );
}

function Findings({ findings, columns, problems }: WithProblems & Pick<PreparedPicture, 'findings'>) {
  if (findings.length === 0) return null;
  const isUsed = (finding: FindingPicture) =>
    !isWithheld(problems, finding.table, finding.header) &&
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
              {tableName(table)}, {header.trim() === '' ? 'a column without a header' : header}: {identifierWords[name]}
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
