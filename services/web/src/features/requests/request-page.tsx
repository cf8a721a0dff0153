import type { AccessRequest } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { hasRole, useAccount } from '../../lib/account.ts';
import { useBuildExport } from '../../lib/build-export.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button, LinkButton } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Reach } from './reach.tsx';
import { RequestDraft } from './request-draft.tsx';
import { RequestSheet } from './request-sheet.tsx';
import { statusWords, titleOf } from './request-words.ts';
import { requestQuery } from './requests.queries.ts';
import { Standing } from './standing.tsx';
import { Votes } from './votes.tsx';
import { WithdrawRequest } from './withdraw-request.tsx';

export default function RequestPage() {
  const { requestId = '' } = useParams();
  const query = useQuery(requestQuery(requestId));
  const request = query.data;
  if (request === undefined) {
    return (
      <Page title="Access request">
        <Section>
          <Answer query={query} waiting="Reading the request.">
            {() => null}
          </Answer>
        </Section>
      </Page>
    );
  }
  return request.actions.includes('edit') ? <RequestDraft key={request.id} request={request} /> : <RequestView request={request} />;
}

function RequestView({ request }: { readonly request: AccessRequest }) {
  const account = useAccount();
  return (
    <Page
      title={titleOf(request.form)}
      kicker={`Access request ${request.number}, ${statusWords[request.status]}`}
      note={<p>Just this wording was handed in. Its fingerprint begins with {request.versionHash.slice(0, 12)}.</p>}
      actions={
        <>
          {request.actions.includes('build-export') && <BuildExport requestId={request.id} />}
          {hasRole(account, 'steward') && request.status !== 'draft' && (
            <LinkButton to={`/desk/${request.id}`}>Open on the desk</LinkButton>
          )}
          <Button onPress={() => window.print()}>{request.decidedAt === null ? 'Print' : 'Print the decision'}</Button>
          <WithdrawRequest request={request} />
        </>
      }
    >
      <Section title={request.decidedAt === null ? 'Where it stands' : 'The decision'}>
        <div className="grid gap-5">
          <Standing request={request} />
          {request.votes.length > 0 && <Votes votes={request.votes} />}
        </div>
      </Section>
      <RequestSheet request={request} reach={<Reach request={request} />} />
    </Page>
  );
}

function BuildExport({ requestId }: { readonly requestId: string }) {
  const build = useBuildExport();
  const navigate = useNavigate();
  return (
    <>
      <Button
        variant="primary"
        isPending={build.isPending}
        onPress={() => build.mutate(requestId, { onSuccess: () => void navigate('/exports') })}
      >
        Build the export
      </Button>
      {build.isError && (
        <div className="basis-full">
          <ErrorNotice error={build.error} />
        </div>
      )}
    </>
  );
}
