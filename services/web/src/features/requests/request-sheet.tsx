/**
 * A request laid out by the Five Safes (Desai, Ritchie and Welpton, 2016): projects, people, settings, data, outputs.
 * The same for the requester and for the steward who weighs it.
 */
import type { AccessRequest } from '@cairnstep/contract';
import type { ReactNode } from 'react';
import { formatCount, formatDate } from '../../lib/format.ts';
import { Section } from '../../ui/page.tsx';
import { CohortInWords } from './cohort-in-words.tsx';
import { countryName } from './countries.ts';
import { duties, purposes, tables, terms } from './request-words.ts';

export interface RequestSheetProps {
  readonly request: AccessRequest;
  /** Whom it reaches, as exactly as the reader may know; stands with the data. */
  readonly reach: ReactNode;
}

export function RequestSheet({ request, reach }: RequestSheetProps) {
  const { form } = request;
  return (
    <>
      <Section title="The project" note={<p>Safe projects: is this use of the data right, and of use to those who gave it?</p>}>
        <Facts>
          <Fact label="Research question">{form.question}</Fact>
          <Fact label="Summary for participants">{form.laySummary}</Fact>
          <Fact label="Purpose">{purposes.find(({ value }) => value === form.purpose)?.label}</Fact>
          <Fact label="Ethics approval">
            {[form.ethicsCommittee, form.ethicsReference].filter((part) => part !== '').join(', reference ')}
            {form.ethicsExpiresOn !== null && <span className="block">Valid until {formatDate(form.ethicsExpiresOn)}</span>}
          </Fact>
          <Fact label="Commercial interest">{answerWords(form.commercialInterest, 'Somebody has one', 'Nobody has one')}</Fact>
          <Fact label="Funding">{form.funding}</Fact>
        </Facts>
      </Section>
      <Section title="The people" note={<p>Safe people: can they be trusted to use the data as they say?</p>}>
        <Facts>
          <Fact label="Lead">
            {request.lead}
            {request.institution !== null && `, ${request.institution}`}
          </Fact>
          <Fact label="Organisation">{answerWords(form.organisationType, 'Works for profit', 'Works not for profit', 'for_profit')}</Fact>
          <Fact label="Others who would see rows">
            {form.team.length === 0 ? (
              'Nobody else'
            ) : (
              <ul>
                {form.team.map((address) => (
                  <li key={address}>{address}</li>
                ))}
              </ul>
            )}
          </Fact>
        </Facts>
      </Section>
      <Section title="The setting" note={<p>Safe settings: does the place where the files are kept prevent misuse?</p>}>
        <Facts>
          <Fact label="Country of the team and the files">{form.country === null ? null : countryName(form.country)}</Fact>
          <Fact label="Where the files are kept, and who can reach them">{form.storage}</Fact>
          <Fact label="Duration">{form.months === null ? null : formatCount(form.months, 'month')}</Fact>
        </Facts>
      </Section>
      <Section
        title="The data"
        note={
          <>
            <p>Safe data: can anyone be recognised in what would be handed out?</p>
            <p>
              Every export is coarsened until each person in it shares level, grade, age band and sex with at least four others. Days become
              four-week blocks, the clinic is left out, and everyone has a new code.
            </p>
          </>
        }
      >
        <Facts>
          <Fact label="Cohort">
            <CohortInWords cohort={form.cohort} />
          </Fact>
          {tables
            .flatMap(({ value, label, holds }) =>
              form.tables.filter(({ table }) => table === value).map((asked) => ({ ...asked, label, holds })),
            )
            .map(({ table, justification, label, holds }) => (
              <Fact key={table} label={`Table: ${label}`}>
                <span className="block text-small text-quiet">{holds}</span>
                {justification}
              </Fact>
            ))}
        </Facts>
        <div className="mt-5 max-w-2xl">{reach}</div>
      </Section>
      <Section title="The outputs" note={<p>Safe outputs: can anyone be recognised in what is published?</p>}>
        <Facts>
          {duties.map(({ field, label }) => (
            <Fact key={field} label={label}>
              {answerWords(form[field], 'Yes', 'No')}
            </Fact>
          ))}
          <Fact label="Terms">{form.termsAccepted ? `Accepted: ${terms}.` : null}</Fact>
        </Facts>
      </Section>
    </>
  );
}

function answerWords(answer: string | null, yes: string, no: string, positive = 'yes'): string | null {
  return answer === null ? null : answer === positive ? yes : no;
}

function Facts({ children }: { readonly children: ReactNode }) {
  return <dl className="grid max-w-2xl gap-4">{children}</dl>;
}

/** What was left open says so. */
function Fact({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  const isOpen = children === null || children === undefined || children === '';
  return (
    <div>
      <dt className="text-small text-quiet">{label}</dt>
      <dd className="whitespace-pre-line">{isOpen ? <span className="text-quiet">Not answered</span> : children}</dd>
    </div>
  );
}
