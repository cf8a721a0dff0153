/** The last twelve months of every site the reader may see: what is due, overdue, being worked on, in. */
import type { SiteMonth } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { hasRole, useAccount } from '../../lib/account.ts';
import { useAddressParam } from '../../lib/address-state.ts';
import { formatMonth } from '../../lib/format.ts';
import { monthStateWords } from '../../lib/month-states.ts';
import { Answer } from '../../ui/answer.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { MonthStone } from '../../ui/month-stone.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { calendarQuery } from './calendar.queries.ts';
import type { Calendar, SiteLine } from './calendar.queries.ts';
import { isOverdue, standingOf } from './standing.ts';

export default function CalendarPage() {
  const query = useQuery(calendarQuery());
  const isSteward = hasRole(useAccount(), 'steward');
  return (
    <Page
      title="Calendar"
      lead={
        <p>
          {isSteward
            ? 'The months of every site: what is in, and what is missing.'
            : 'The months of your sites: what is in, and what is missing.'}
        </p>
      }
      note={
        <>
          <p>A month is due on the 15th of the month after it, and overdue from the next day on.</p>
          <p>The site’s coordinators are reminded by e-mail five days before, the day after, and then weekly, four times.</p>
        </>
      }
    >
      <Section title="Months by site" id="sites" wide>
        <Answer query={query} waiting="Reading the months of the sites.">
          {(calendar) => <SitesByMonth calendar={calendar} isSteward={isSteward} />}
        </Answer>
      </Section>
    </Page>
  );
}

interface SitesByMonthProps {
  readonly calendar: Calendar;
  readonly isSteward: boolean;
}

function SitesByMonth({ calendar: { months, sites }, isSteward }: SitesByMonthProps) {
  const [only, setOnly] = useAddressParam('only');
  const isOnlyOverdue = only === 'overdue';
  const shown = isOnlyOverdue ? sites.filter(isOverdue) : sites;
  return (
    <div className="grid gap-4">
      <p>{standingOf(sites)}</p>
      {sites.length > 1 && (
        <Checkbox id="only-overdue" value={isOnlyOverdue} onChange={(is) => setOnly(is ? 'overdue' : null)}>
          Only sites with an overdue month
        </Checkbox>
      )}
      <Table
        id="calendar"
        caption={isOnlyOverdue ? 'Sites with an overdue month, newest month first' : 'Sites and their last twelve months, newest first'}
        columns={[siteColumn(isSteward), ...[...months].reverse().map(columnOf)]}
        rows={shown}
        rowKey={({ site }) => site.id}
        pinsRowHeaders
        empty={isOnlyOverdue ? 'No site has an overdue month. Take the tick out to see every site.' : 'No site has been entered yet.'}
        fileName="months-by-site"
      />
    </div>
  );
}

/** The people of a site go on to what they can do about its months, stewards to what came. */
const siteColumn = (isSteward: boolean): Column<SiteLine> => ({
  key: 'site',
  header: 'Site',
  value: ({ site }) => `${site.code} ${site.name}`,
  cell: ({ site }) => <TextLink to={`/${isSteward ? 'submissions' : 'month'}?site=${site.code}`}>{`${site.name} (${site.code})`}</TextLink>,
  isRowHeader: true,
});

const monthIn = (line: SiteLine, month: string): SiteMonth | undefined => line.months.find((one) => one.month === month);

function columnOf(month: string): Column<SiteLine> {
  return {
    key: month,
    header: shortMonth(month),
    value: (line) => {
      const found = monthIn(line, month);
      return found === undefined ? 'not yet in the registry' : monthStateWords[found.state];
    },
    cell: (line) => <MonthCell line={line} month={monthIn(line, month)} />,
  };
}

/** "2026-11" as "Nov 2026": a column is as wide as its longest word. */
function shortMonth(month: string): string {
  const [name = '', year = ''] = formatMonth(month).split(' ');
  return `${name.slice(0, 3)} ${year}`;
}

function MonthCell({ line, month }: { readonly line: SiteLine; readonly month: SiteMonth | undefined }) {
  if (month === undefined) return <span className="text-small text-quiet">not yet in the registry</span>;
  const { state, submissionId, acceptedAt, closed } = month;
  const word = monthStateWords[state];
  const about = <span className="sr-only">{`, ${line.site.name}, ${formatMonth(month.month)}`}</span>;
  const begunAgain = (state === 'in-progress' || state === 'checking') && (acceptedAt !== null || closed !== null);
  return (
    <span className="grid justify-items-start gap-1 text-small">
      <MonthStone state={state} />
      {submissionId === null ? (
        <span className={state === 'overdue' ? 'font-semibold text-oxide' : state === 'due' ? 'font-semibold' : 'text-quiet'}>{word}</span>
      ) : (
        <TextLink to={state === 'accepted' ? `/submissions/${submissionId}/receipt` : `/submit/${submissionId}`}>
          {word}
          {about}
        </TextLink>
      )}
      {begunAgain && <span className="text-quiet">{acceptedAt === null ? 'after “nothing to report”' : 'a correction'}</span>}
      {state === 'nothing-to-report' && closed !== null && <span className="text-quiet">{`said by ${closed.by}`}</span>}
    </span>
  );
}
