/** A site's months: what is due, and the one step that comes next. */
import type { listMonths, ResponseOf, Site } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { formatDate, formatInstant, formatMonth, formatShare } from '../../lib/format.ts';
import { monthStateWords } from '../../lib/month-states.ts';
import { useNarrowWindow } from '../../lib/use-narrow-window.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ForChosenSite, maySubmit } from './chosen-site.tsx';
import { CloseMonth } from './close-month.tsx';
import { MonthCalendar } from './month-calendar.tsx';
import { settledMonths } from './months.ts';
import type { Month } from './months.ts';
import { NextStepSection } from './next-step-section.tsx';
import { monthsQuery, useOpenSubmission } from './submissions.queries.ts';

export default function MonthPage() {
  return (
    <Page
      title="This month"
      lead={<p>Once a month the clinic’s training logs and assessments become one accepted submission.</p>}
      note={
        <>
          <p>A month is due on the 15th of the month after it. It can be submitted as soon as it is over, and corrected later.</p>
          <p>Coordinators are reminded by e-mail five days before, the day after, and then weekly, four times.</p>
        </>
      }
    >
      <ForChosenSite>{(site, account) => <MonthsOf key={site.id} site={site} isCoordinator={maySubmit(account, site)} />}</ForChosenSite>
    </Page>
  );
}

function MonthsOf({ site, isCoordinator }: { readonly site: Site; readonly isCoordinator: boolean }) {
  const query = useQuery(monthsQuery(site.id));
  if (query.data === undefined) {
    return (
      <Section title={site.name}>
        <Answer query={query} waiting="Reading the months of the site.">
          {() => null}
        </Answer>
      </Section>
    );
  }
  return <Months {...query.data} isCoordinator={isCoordinator} />;
}

type MonthsProps = ResponseOf<typeof listMonths> & { readonly isCoordinator: boolean };

function Months({ site, months, isCoordinator }: MonthsProps) {
  const open = useOpenSubmission();
  const navigate = useNavigate();
  const isNarrow = useNarrowWindow();
  const openMonth = (month: string) =>
    open.mutate({ siteId: site.id, month }, { onSuccess: (submission) => void navigate(`/submit/${submission.id}`) });
  const opening = open.isPending ? open.variables.month : null;
  const columns = columnsFor(site, isCoordinator, opening, openMonth);
  const past = months.filter(({ state }) => state !== 'not-yet-due');
  return (
    <>
      <NextStepSection site={site} months={months} isCoordinator={isCoordinator} opening={opening} onOpen={openMonth}>
        {open.isError && <ErrorNotice error={open.error} />}
      </NextStepSection>
      <Section
        title="Months of this site"
        id="months"
        note={
          <>
            <p>
              A filled stone is an accepted month, one with a bar had nothing to report, an empty one waits, a dashed one is not over yet.
            </p>
            <p>
              <TextLink to={`/submissions?site=${site.code}`}>Every submission of this site</TextLink>
            </p>
          </>
        }
      >
        <div className="grid gap-6">
          <p>{formatShare(settledMonths(past).length, past.length)} months are accepted or closed.</p>
          <MonthCalendar months={months} />
          <Table
            id="months"
            caption={`Months of ${site.name}`}
            columns={isNarrow ? actsSecond(columns) : columns}
            rows={months}
            rowKey={({ month }) => month}
            empty="The site has no month to submit yet."
            fileName={`${site.code}-months`}
          />
        </div>
      </Section>
    </>
  );
}

function columnsFor(site: Site, isCoordinator: boolean, opening: string | null, onOpen: (month: string) => void): readonly Column<Month>[] {
  return [
    { key: 'month', header: 'Month', value: ({ month }) => month, cell: ({ month }) => formatMonth(month), isRowHeader: true },
    { key: 'state', header: 'State', value: wordsOf, cell: (month) => <StateWords month={month} /> },
    { key: 'due', header: 'Due', value: ({ dueOn }) => dueOn, cell: ({ dueOn }) => formatDate(dueOn) },
    {
      key: 'accepted',
      header: 'Accepted',
      value: ({ acceptedAt }) => acceptedAt,
      cell: ({ acceptedAt, closed }) =>
        acceptedAt === null ? <span className="text-quiet">{closed === null ? 'not yet' : 'closed'}</span> : formatInstant(acceptedAt),
    },
    { key: 'rows', header: 'Rows in the last submission', value: ({ rows }) => rows, kind: 'number' },
    {
      key: 'next',
      header: 'Next',
      value: () => null,
      isAct: true,
      cell: (month) => (
        <MonthActs site={site} month={month} isCoordinator={isCoordinator} isOpening={opening === month.month} onOpen={onOpen} />
      ),
    },
  ];
}

/** What can be done with a month stays in sight without moving the table sideways. */
const actsSecond = (columns: readonly Column<Month>[]): readonly Column<Month>[] => {
  const placeOf = ({ isRowHeader, isAct }: Column<Month>) => (isRowHeader === true ? 0 : isAct === true ? 1 : 2);
  return [...columns].sort((a, b) => placeOf(a) - placeOf(b));
};

const wordsOf = ({ state, acceptedAt, closed }: Month): string => {
  const begunAgain = state === 'in-progress' || state === 'checking';
  if (begunAgain && acceptedAt !== null) return 'accepted, correction begun';
  if (begunAgain && closed !== null) return 'nothing to report, submission begun after all';
  return monthStateWords[state];
};

function StateWords({ month }: { readonly month: Month }) {
  const { state, closed } = month;
  return (
    <>
      <span className={state === 'overdue' ? 'font-semibold text-oxide' : state === 'due' ? 'font-semibold' : ''}>{wordsOf(month)}</span>
      {closed !== null && (
        <span className="block text-small text-quiet">
          {state === 'accepted' ? 'before: nothing to report, ' : ''}said by {closed.by}, {formatInstant(closed.at)}
        </span>
      )}
    </>
  );
}

interface MonthActsProps {
  readonly site: Site;
  readonly month: Month;
  readonly isCoordinator: boolean;
  readonly isOpening: boolean;
  readonly onOpen: (month: string) => void;
}

function MonthActs({ site, month: { month, state, submissionId }, isCoordinator, isOpening, onOpen }: MonthActsProps) {
  const name = formatMonth(month);
  if ((state === 'in-progress' || state === 'checking') && submissionId !== null) {
    return (
      <TextLink to={`/submit/${submissionId}`}>
        {isCoordinator ? 'Go on' : 'Look'}
        <span className="sr-only"> with {name}</span>
      </TextLink>
    );
  }
  const act = (words: string) => (
    <Button variant="quiet" isPending={isOpening} onPress={() => onOpen(month)} aria-label={`${words} ${name}`}>
      {words}
    </Button>
  );
  if (state === 'accepted' && submissionId !== null) {
    return (
      <>
        <TextLink to={`/submissions/${submissionId}/receipt`}>
          Receipt<span className="sr-only"> of {name}</span>
        </TextLink>
        {isCoordinator && act('Correct')}
      </>
    );
  }
  if (!isCoordinator || state === 'not-yet-due') return null;
  if (state === 'nothing-to-report') return act('Submit after all');
  return (
    <>
      {act('Submit')}
      <CloseMonth site={site} month={month} variant="quiet" />
    </>
  );
}
