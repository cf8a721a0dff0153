import type { AccessRequest } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { useAccount } from '../../lib/account.ts';
import { formatDate, formatInstant } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { AddressButton, Button } from '../../ui/button.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { DecisionForm } from './decision-form.tsx';
import { ReachFigures, ReachReasons } from './reach.tsx';
import { RequestSheet } from './request-sheet.tsx';
import { statusWords, titleOf } from './request-words.ts';
import { reachQuery, requestQuery } from './requests.queries.ts';
import { Because, Standing } from './standing.tsx';
import { Votes } from './votes.tsx';

export default function ReviewPage() {
  const { requestId = '' } = useParams();
  const query = useQuery(requestQuery(requestId));
  if (query.data === undefined) {
    return (
      <Page title="Review" kicker={<TextLink to="/desk">Desk</TextLink>}>
        <Section>
          <Answer query={query} waiting="Reading the request.">
            {() => null}
          </Answer>
        </Section>
      </Page>
    );
  }
  return <Review request={query.data} />;
}

function Review({ request }: { readonly request: AccessRequest }) {
  const reach = useQuery(reachQuery(request));
  const mayVote = request.actions.includes('vote');
  return (
    <Page
      title={titleOf(request.form)}
      kicker={
        <>
          <TextLink to="/desk">Desk</TextLink>, access request {request.number}, {statusWords[request.status]}
        </>
      }
      lead={
        <p>
          From {request.lead}
          {request.institution !== null && `, ${request.institution}`}
          {request.submittedAt !== null && `. Handed in ${formatInstant(request.submittedAt)}`}.
        </p>
      }
      note={<p>A decision holds for just this wording. Its fingerprint begins with {request.versionHash.slice(0, 12)}.</p>}
      actions={
        <>
          {mayVote && <AddressButton href="#decision">To your decision</AddressButton>}
          <Button onPress={() => window.print()}>Print</Button>
        </>
      }
    >
      <Section title="Where it stands">
        <div className="grid gap-5">
          <Standing request={request} />
          {request.votes.length > 0 && <Votes votes={request.votes} />}
        </div>
      </Section>
      <RequestSheet
        request={request}
        reach={
          <Answer query={reach} waiting="Matching each person’s consent.">
            {(reached) => (
              <div className="grid gap-5">
                <ReachFigures reached={reached} />
                <p className="text-small text-quiet">
                  Exact, for stewards only; looking is recorded. Consent is matched person by person, by the Data Use Ontology of the Global
                  Alliance for Genomics and Health. One person can be counted under several reasons.
                </p>
                <ReachReasons reached={reached} />
              </div>
            )}
          </Answer>
        }
      />
      <Section
        title="Your decision"
        id="decision"
        note={
          mayVote && (
            <>
              <p>
                {request.votesNeeded === 1
                  ? 'One steward decides this request.'
                  : `${request.votesNeeded} stewards have to agree on this request.`}
              </p>
              <Because reasons={request.votesNeededBecause} />
              <p>What another steward decided is shown after you have given your own decision.</p>
            </>
          )
        }
      >
        {mayVote ? (
          <div className="grid gap-6">
            <Weigh request={request} />
            <DecisionForm request={request} consenting={reach.data?.consenting ?? null} />
          </div>
        ) : (
          <Notice title={request.mayNotVoteBecause ?? 'This request is not yours to decide.'}>
            <p>Nothing is asked of you here.</p>
          </Notice>
        )}
      </Section>
    </Page>
  );
}

/** What a steward should see before deciding, worked out from the request itself. */
function Weigh({ request: { form, institution, votesNeeded } }: { readonly request: AccessRequest }) {
  const account = useAccount();
  const isOwnInstitution = institution !== null && institution === account?.institution;
  return (
    <>
      {isOwnInstitution && votesNeeded < 2 && (
        <Notice kind="warning" title="The lead works at your institution.">
          <p>You may decide, but a second steward from another institution then has to agree.</p>
        </Notice>
      )}
      {form.ethicsExpiresOn !== null && form.months !== null && form.ethicsExpiresOn < monthsFromNow(form.months) && (
        <Notice kind="warning" title="The ethics approval ends before the access would.">
          <p>
            It is valid until {formatDate(form.ethicsExpiresOn)}. After that day exports can neither be built nor downloaded, unless a new
            request is approved.
          </p>
        </Notice>
      )}
    </>
  );
}

function monthsFromNow(months: number): string {
  const day = new Date();
  day.setUTCMonth(day.getUTCMonth() + months);
  return day.toISOString().slice(0, 10);
}
