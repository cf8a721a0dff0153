/** The clinic's own files become files without identity, in this browser, and only those leave it. */
import type { Submission } from '@cairnstep/contract';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { useAccount } from '../../lib/account.ts';
import { formatMonth } from '../../lib/format.ts';
import { LinkButton } from '../../ui/button.tsx';
import { LeaveQuestion } from '../../ui/leave-question.tsx';
import { NoPermission } from '../../ui/no-permission.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { maySubmit } from './chosen-site.tsx';
import { PreparingFrame } from './preparing-frame.tsx';
import type { PreparingAct } from './preparing-frame.tsx';
import type { SiteKnowledge } from './preparing.queries.ts';
import { useCheck } from './submissions.queries.ts';
import { usePreparedSending } from './use-prepared-sending.ts';
import { WithKnowledge } from './with-knowledge.tsx';
import { WithSubmission } from './with-submission.tsx';

export default function PreparePage() {
  return <WithSubmission title="Prepare the clinic’s files">{(submission) => <Prepare submission={submission} />}</WithSubmission>;
}

function Prepare({ submission }: { readonly submission: Submission }) {
  const { id, site, status } = submission;
  const account = useAccount();
  const month = formatMonth(submission.month);
  const isOpen = status === 'open' || status === 'checked';
  return (
    <Page
      title={`Prepare ${month}`}
      kicker={
        <>
          {site.name} ({site.code}), <TextLink to={`/submit/${id}`}>back to the submission</TextLink>
        </>
      }
      lead={
        <p>Names, record numbers and dates are taken out here, in your browser. What is left is shown to you, and only that is sent.</p>
      }
      note={
        <>
          <p>The part of this page that reads your files can connect to nothing and keeps nothing. Close it, and what it held is gone.</p>
          <p>
            It can also be had as a file that works <TextLink to="/prepare-without-the-server">without the server</TextLink>.
          </p>
        </>
      }
    >
      {account !== undefined && !maySubmit(account, site) ? (
        <Section>
          <NoPermission detail={`Only a coordinator of ${site.name} can prepare its files.`} />
        </Section>
      ) : isOpen ? (
        <WithKnowledge siteId={site.id}>{(knowledge) => <PrepareOpen submission={submission} knowledge={knowledge} />}</WithKnowledge>
      ) : (
        <Section>
          <Notice title={status === 'checking' ? 'The files of this month are being checked.' : 'This submission is settled.'}>
            <p>
              {status === 'checking'
                ? 'Files can be replaced as soon as the check has ended.'
                : 'To correct the month, begin a correction from the months of the site.'}
            </p>
            <div className="mt-3">
              <LinkButton to={status === 'checking' ? `/submit/${id}` : `/month?site=${site.code}`}>
                {status === 'checking' ? 'Go to the submission' : 'Go to the months of the site'}
              </LinkButton>
            </div>
          </Notice>
        </Section>
      )}
    </Page>
  );
}

function PrepareOpen({ submission, knowledge }: { readonly submission: Submission; readonly knowledge: SiteKnowledge }) {
  const { id, site, month } = submission;
  const navigate = useNavigate();
  const check = useCheck(id);
  const { sending, isUnderWay, send } = usePreparedSending(submission);
  const [isUnsaved, setUnsaved] = useState(false);
  const [isFinished, setFinished] = useState(false);

  async function act(said: PreparingAct): Promise<void> {
    if (said.kind === 'send') return send(said.tables, said.replacedCodes);
    if (said.kind !== 'finished') return;
    setFinished(true);
    // A check that does not begin is offered again, with its reason, where it belongs.
    await check.mutateAsync().catch(() => undefined);
    void navigate(`/submit/${id}`);
  }

  return (
    <>
      <PreparingFrame
        title={`Preparing the files of ${formatMonth(month)}`}
        task={{ view: 'prepare', site, month, ...knowledge }}
        sending={sending}
        onUnsaved={setUnsaved}
        onAct={(said) => void act(said)}
      />
      <LeaveQuestion
        isNeeded={(isUnsaved || isUnderWay) && !isFinished}
        title="Leave the preparing?"
        consequence="What was read and matched is kept nowhere. When you leave, it is gone, and so is a key file that you have not saved."
        leave="Leave and forget it"
        stay="Stay"
      />
    </>
  );
}
