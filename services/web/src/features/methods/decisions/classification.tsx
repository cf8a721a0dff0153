import { openReadings } from '@cairnstep/scoring';
import { Section } from '../../../ui/page.tsx';
import { TextLink } from '../../../ui/text-link.tsx';
import type { Decision } from '../decision.ts';

export const classification: Decision = {
  slug: 'classification',
  title: 'How injuries are classified',
  summary:
    'Level and grade are worked out from the cells of each examination by the published standard, the same way for every clinic. Where the standard can be read in two ways, the choice stands here.',
  note: 'International Standards for Neurological Classification of Spinal Cord Injury, 2019 revision: Rupp et al., Top Spinal Cord Inj Rehabil 2021;27(2):1-22.',
  Body,
};

function Body() {
  return (
    <>
      <Section
        title="From the cells to the class"
        id="cells"
        note={
          <p>
            <TextLink to="/exam">Type an exam</TextLink> to see every step to its level and grade.
          </p>
        }
      >
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>The registry classifies every examination itself when it arrives, whatever the clinic recorded.</li>
          <li>A level or grade recorded by the clinic that differs is reported back to it. Neither is changed silently.</li>
          <li>
            A cell that was not tested stands for every score it can have. A result is then every value that comes of it: if that is one
            value, it counts; if there are several, level or grade is “not determinable” and counted apart.
          </li>
          <li>
            A score marked as affected by another condition is read as the clinic classified it: with one star as not normal, with two as
            normal.
          </li>
        </ul>
      </Section>
      <Section
        title="Open points of the standard"
        id="open-points"
        note={<p>Each choice is held by a test, so that it cannot change unnoticed.</p>}
      >
        <dl className="grid max-w-2xl gap-5">
          {openReadings.map(({ question, choice, why }) => (
            <div key={question} className="break-inside-avoid border-l-3 border-hairline pl-4">
              <dt className="font-semibold">{question}</dt>
              <dd>{choice}</dd>
              <dd className="text-small text-quiet">{why}</dd>
            </div>
          ))}
        </dl>
      </Section>
    </>
  );
}
