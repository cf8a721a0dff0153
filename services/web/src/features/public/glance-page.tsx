import { useQuery } from '@tanstack/react-query';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { publicFiguresQuery } from './figures.queries.ts';
import { PublicFigureSections } from './public-figures.tsx';

export default function GlancePage() {
  const figures = useQuery(publicFiguresQuery());
  return (
    <Page
      title="Walking training after spinal cord injury, recorded together"
      lead={
        <p>
          Each clinic that trains walking with body-weight support or powered devices sees few people. In Cairnstep many clinics put their
          records side by side, so that what helped, for whom and how much can be read from all of them.
        </p>
      }
      note={
        <>
          <p>A cairn is raised by many walkers, one stone each.</p>
          <p>
            Is your own training part of this? <TextLink to="/participants">What is held and how to withdraw</TextLink>
          </p>
        </>
      }
    >
      {figures.data === undefined ? (
        <Section title="The registry in numbers" id="figures">
          <Answer query={figures} waiting="Reading the figures of the latest release.">
            {() => null}
          </Answer>
        </Section>
      ) : (
        <PublicFigureSections figures={figures.data} />
      )}
      <Section
        title="How it works"
        id="how"
        note={<p>Researchers never see a name, a date of birth or a record number. Clinics do not send them.</p>}
      >
        <ol className="grid max-w-2xl list-decimal gap-2 pl-5">
          <li>
            Every month a clinic takes names, record numbers and dates out of its training records, in its own browser, and submits the
            rest.
          </li>
          <li>The registry checks each row and tells the clinic what to mend. Only whole, checked months are taken in.</li>
          <li>Each injury is classified by the same published standard, so that groups mean the same everywhere.</li>
          <li>A data steward freezes the registry into numbered releases. Figures always name the release they come from.</li>
          <li>
            Researchers explore group figures. Rows leave the registry only for an approved purpose that each participant’s consent allows.
          </li>
        </ol>
      </Section>
    </Page>
  );
}
