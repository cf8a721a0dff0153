import { useQuery } from '@tanstack/react-query';
import { Answer } from '../../ui/answer.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { publicFiguresQuery } from './figures.queries.ts';
import { PublicFigureSections } from './public-figures.tsx';

export default function ParticipantsPage() {
  const figures = useQuery(publicFiguresQuery());
  return (
    <Page
      title="For participants"
      lead={
        <p>
          If you trained walking at one of the clinics and agreed to take part, some of your records are here. This page says which, what
          they are used for, and how to leave.
        </p>
      }
      note={<p>Questions about your own records go to your clinic. The registry does not know who you are and cannot look you up.</p>}
    >
      <Section
        title="What is held about you"
        id="held"
        note={<p>Days are counted from your first training day. Of calendar dates, only the year of the injury leaves the clinic.</p>}
      >
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>A made-up number in place of your name. Only your clinic can connect it to you.</li>
          <li>
            Your age in years at the first training day (90 stands for everyone of 90 or more) and your sex as the clinic recorded it.
          </li>
          <li>The year and the cause of the injury, whether breathing is supported by a ventilator, and the training planned.</li>
          <li>The neurological examination: feeling and strength by segment, and the level and grade worked out from it.</li>
          <li>
            Each training session: the kind of device, minutes, how far and how fast, how much weight was carried, pauses and their reasons.
          </li>
          <li>Results of tests such as walking speed, walking distance and balance, and any harm that happened during training.</li>
          <li>What you agreed to, and when that changed.</li>
        </ul>
      </Section>
      <Section title="What is not held" id="not-held">
        <p className="max-w-2xl">
          No name, address, telephone number, date of birth, record number, picture or free text. The clinic’s browser takes them out before
          anything is sent, and the registry refuses a file that still holds them.
        </p>
      </Section>
      <Section
        title="Who uses it, and for what"
        id="use"
        note={
          <p>Outside your clinic, counts below 11 are shown to nobody but the data stewards, so that no small group can be recognised.</p>
        }
      >
        <div className="grid max-w-2xl gap-3">
          <p>Your clinic sees your own course of training. Researchers see figures about groups.</p>
          <p>
            A researcher who needs rows asks for them in writing. A data steward decides, and only the records of people whose consent
            allows that very purpose are handed out, under an agreement that forbids trying to find out who anyone is.
          </p>
        </div>
      </Section>
      <Section title="How to withdraw" id="withdraw" note={<p>You need not give a reason, and your care does not change.</p>}>
        <ol className="grid max-w-2xl list-decimal gap-2 pl-5">
          <li>Tell the clinic where you trained that you withdraw from the registry. By word or in writing, both count.</li>
          <li>
            Say how far it should reach: nothing new is added but what is held may still be used; no further use at all; or what is held is
            deleted as far as the law allows.
          </li>
          <li>The clinic enters the withdrawal under your made-up number with its next month.</li>
          <li>
            If you ended further use, every later release and export leaves your records out. Exports that hold them can no longer be
            fetched, and the access agreement obliges researchers to destroy the copies they have.
          </li>
        </ol>
        <p className="mt-3 max-w-2xl">Results that were published before cannot be taken back; they show groups and name nobody.</p>
      </Section>
      {figures.data === undefined ? (
        <Section title="The registry in numbers" id="figures">
          <Answer query={figures} waiting="Reading the figures of the latest release.">
            {() => null}
          </Answer>
        </Section>
      ) : (
        <PublicFigureSections figures={figures.data} />
      )}
      <Section title="Reading these figures" id="cautions">
        <Notice kind="warning" title="Figures about groups say nothing certain about you.">
          <p>
            They describe many people together. What training suits you is for you and your clinicians to decide. If something worries you
            during or after training, turn to your clinic at once.
          </p>
        </Notice>
      </Section>
    </Page>
  );
}
