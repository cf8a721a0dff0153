/** The site key, apart from any month: made, looked at, joined with another copy, renewed. */
import type { Site } from '@cairnstep/contract';
import { useState } from 'react';
import type { Sending } from '../../preparing/messages.ts';
import { announce } from '../../ui/announcer.tsx';
import { LeaveQuestion } from '../../ui/leave-question.tsx';
import { NoPermission } from '../../ui/no-permission.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ForChosenSite, maySubmit } from './chosen-site.tsx';
import { PreparingFrame } from './preparing-frame.tsx';
import type { PreparingAct } from './preparing-frame.tsx';
import { useReplaceCodes } from './preparing.queries.ts';
import type { SiteKnowledge } from './preparing.queries.ts';
import { ReplacedCodesSection } from './replaced-codes-section.tsx';
import { WithKnowledge } from './with-knowledge.tsx';
import { wordsOfFailure } from './words-of-failure.ts';

export default function SiteKeyPage() {
  return (
    <Page
      title="Site key"
      lead={<p>The one file that tells whose code is whose. It belongs to the clinic and never leaves it.</p>}
      note={
        <>
          <p>The registry has no copy and cannot open it. Keep two, on the site’s own storage, and the words on paper.</p>
          <p>
            Without the registry’s page: <TextLink to="/prepare-without-the-server">prepare without the server</TextLink>.
          </p>
        </>
      }
    >
      <ForChosenSite>
        {(site, account) =>
          maySubmit(account, site) ? (
            <WithKnowledge key={site.id} siteId={site.id}>
              {(knowledge) => (
                <>
                  <SiteKey site={site} knowledge={knowledge} />
                  <ReplacedCodesSection site={site} />
                </>
              )}
            </WithKnowledge>
          ) : (
            <Section>
              <NoPermission detail={`Only a coordinator of ${site.name} works with its key.`} />
            </Section>
          )
        }
      </ForChosenSite>
    </Page>
  );
}

function SiteKey({ site, knowledge }: { readonly site: Site; readonly knowledge: SiteKnowledge }) {
  const { mutateAsync: replace } = useReplaceCodes(site.id);
  const [sending, setSending] = useState<Sending | null>(null);
  const [isUnsaved, setUnsaved] = useState(false);
  const isUnderWay = sending?.state === 'under-way';

  async function act(said: PreparingAct): Promise<void> {
    if (said.kind !== 'replace-codes') return;
    const tell = (state: Sending['state'], message: string | null = null) =>
      setSending({ kind: 'sending', state, done: state === 'done' ? 1 : 0, of: 1, message });
    tell('under-way');
    try {
      if (said.replacedCodes.length > 0) await replace(said.replacedCodes);
      tell('done');
      announce('The registry has replaced the codes.');
    } catch (error) {
      tell('failed', wordsOfFailure(error));
    }
  }

  return (
    <>
      <PreparingFrame
        title={`Site key of ${site.name}`}
        task={{ view: 'key', site, month: null, ...knowledge }}
        sending={sending}
        onUnsaved={setUnsaved}
        onAct={(said) => void act(said)}
      />
      <LeaveQuestion
        isNeeded={isUnsaved || isUnderWay}
        title="Leave the site key?"
        consequence="What was changed is kept nowhere but in a file that you save. When you leave, it is gone."
        leave="Leave and forget it"
        stay="Stay"
      />
    </>
  );
}
