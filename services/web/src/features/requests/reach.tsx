/** How many people a request reaches, and why the others are not reached. */
import type { AccessRequest, ConsentQuestion, getReach, ResponseOf } from '@cairnstep/contract';
import { reasons } from '@cairnstep/consent';
import { useQuery } from '@tanstack/react-query';
import { formatNumber } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { HiddenMark } from '../../ui/hidden-mark.tsx';
import { Table } from '../../ui/table.tsx';
import { reachQuery } from './requests.queries.ts';

type Reached = ResponseOf<typeof getReach>;

export function Reach({ request }: { readonly request: Pick<AccessRequest, 'id' | 'versionHash'> }) {
  const query = useQuery(reachQuery(request));
  return (
    <Answer query={query} waiting="Counting whom the request reaches.">
      {(reached) => <ReachFigures reached={reached} />}
    </Answer>
  );
}

export function ReachFigures({ reached: { inCohort, consenting, openQuestions } }: { readonly reached: Reached }) {
  return (
    <div className="grid gap-2">
      <dl className="border-y border-hairline">
        <Line label="people in the cohort" count={inCohort} />
        {openQuestions.length === 0 && <Line label="of them consent to this use" count={consenting} />}
      </dl>
      {openQuestions.length > 0 && (
        <p>
          How many of them consent is worked out once these are answered:{' '}
          {[...new Set(openQuestions.map((field) => questionWords[field]))].join(', ')}.
        </p>
      )}
    </div>
  );
}

const questionWords: Readonly<Record<ConsentQuestion, string>> = {
  purpose: 'purpose',
  commercialInterest: 'commercial interest',
  ethicsExpiresOn: 'last day of the ethics approval',
  organisationType: 'how the organisation works',
  country: 'country',
  months: 'how long access is needed',
  agreesToPublish: 'what you owe in return',
  agreesToCollaborate: 'what you owe in return',
  agreesToReturn: 'what you owe in return',
};

function Line({ label, count }: { readonly label: string; readonly count: number | null }) {
  return (
    <div className="flex items-baseline gap-3 border-hairline py-2 not-first:border-t">
      <dd className="numbers w-14 shrink-0 text-right text-section font-semibold text-ink">
        {count === null ? <HiddenMark /> : formatNumber(count)}
      </dd>
      <dt>{label}</dt>
    </div>
  );
}

const verdictWords: Readonly<Record<Reached['reasons'][number]['verdict'], string>> = {
  not_permitted: 'not permitted',
  manual_review: 'a person has to decide',
};

/** A reason newer than this client is shown by its code. */
const inWords = (code: string): string => (reasons as Readonly<Record<string, string>>)[code] ?? code;

export function ReachReasons({ reached }: { readonly reached: Reached }) {
  return (
    <Table
      id="reasons"
      caption="Why consent does not reach the others"
      columns={[
        { key: 'reason', header: 'Reason', isRowHeader: true, value: ({ reason }) => inWords(reason) },
        { key: 'verdict', header: 'What follows', value: ({ verdict }) => verdictWords[verdict] },
        { key: 'participants', header: 'People', kind: 'number', value: ({ participants }) => participants },
      ]}
      rows={reached.reasons}
      rowKey={({ reason, verdict }) => `${verdict} ${reason}`}
      empty="Consent of everyone in the cohort permits this use."
    />
  );
}
