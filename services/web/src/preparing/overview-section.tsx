/** What the files have led to, with a way to each part of it: the parts are long. */
import type { MouseEvent } from 'react';
import { tableName } from '../features/submissions/table-names.ts';
import { formatCount, formatShare } from '../lib/format.ts';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { isOfAnotherMonth } from './month-state.ts';
import { countToDecide } from './to-decide.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface OverviewSectionProps {
  readonly prepared: PreparedPicture;
  /** "November 2026" */
  readonly monthName: string;
  /** Title of the last part. */
  readonly lastPart: string;
  /** How many things have to be looked at before it. */
  readonly toLookAt: number;
}

export function OverviewSection({ prepared, monthName, lastPart, toLookAt }: OverviewSectionProps) {
  const { rowsInMonth, tables } = prepared;
  const toDecide = countToDecide(prepared);
  const rows = tables.reduce((sum, each) => sum + each.rows, 0);
  const parts = [
    { id: 'columns', name: 'Columns', words: toDecide === 0 ? 'nothing to decide' : `${formatCount(toDecide, 'thing')} to decide` },
    { id: 'preview', name: 'Preview', words: `${formatCount(rows, 'row')} in ${formatCount(tables.length, 'table')}` },
    { id: 'send', name: lastPart, words: toLookAt === 0 ? '' : `${formatCount(toLookAt, 'thing')} to look at before` },
  ];
  return (
    <Section title="The files are read" id="overview">
      <div className="grid gap-4">
        {rowsInMonth !== null && isOfAnotherMonth(rowsInMonth) && (
          <Notice
            kind="warning"
            title={`These look like files of another month: ${formatShare(rowsInMonth.inside, rowsInMonth.dated)} rows of ${tableName(rowsInMonth.table)} are of ${monthName}.`}
          >
            <p>
              Choose the files of {monthName} above. Send these only if they are meant, because they correct earlier months. Nobody can tell
              later, because dates do not leave this page.
            </p>
          </Notice>
        )}
        <nav aria-label="Parts of this sheet">
          <ul className="flex flex-wrap gap-x-8 gap-y-2">
            {parts.map(({ id, name, words }) => (
              <li key={id}>
                <a href={`#${id}`} className="link" onClick={(event) => goTo(event, id)}>
                  {name}
                </a>
                {words !== '' && <span className="text-quiet">: {words}</span>}
              </li>
            ))}
          </ul>
        </nav>
      </div>
    </Section>
  );
}

/** A link to a place scrolls no page around this one, and leaves the keyboard where it was. */
function goTo(event: MouseEvent, id: string): void {
  event.preventDefault();
  const section = document.getElementById(id);
  const heading = section?.querySelector('h2');
  heading?.setAttribute('tabindex', '-1');
  section?.scrollIntoView();
  heading?.focus({ preventScroll: true });
}
