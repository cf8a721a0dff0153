import { FEWEST_SITES, LARGEST_SITE_PERCENT, SMALLEST_SHOWN } from '@cairnstep/disclosure';
import { Section } from '../../../ui/page.tsx';
import { TextLink } from '../../../ui/text-link.tsx';
import type { Decision } from '../decision.ts';

const largestHidden = SMALLEST_SHOWN - 1;

export const disclosure: Decision = {
  slug: 'what-is-hidden',
  title: 'What is hidden, and why',
  summary: `No figure may tell about one person. Outside a person’s own clinic, counts of 1 to ${largestHidden} are hidden, and with them whatever would give them back.`,
  note: 'Everything hidden has one mark. It does not say whether a count is small or protects another.',
  Body,
};

function Body() {
  return (
    <>
      <Section title="Small counts" id="small" note={<p>Source of the threshold: US CMS cell size suppression policy.</p>}>
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>
            Counts of 1 to {largestHidden} are hidden. Zero is shown; {SMALLEST_SHOWN} is the smallest count shown.
          </li>
          <li>
            So is everything computed from fewer than {SMALLEST_SHOWN} people: means, standard deviations, intervals, bars, tables and files
            alike.
          </li>
          <li>No smallest or largest value, and no line or point of a single person, is ever shown.</li>
        </ul>
      </Section>
      <Section
        title="What would give them back"
        id="complementary"
        note={
          <p>
            Worked out exactly, as flows through the table of rows, columns and totals; of all patterns that hold, one that hides few
            people.
          </p>
        }
      >
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>A single hidden cell could be found by subtracting the others from the total. So further cells are hidden with it.</li>
          <li>
            The table is then read as an attacker would: from everything shown, the least and the most that each hidden cell can hold. The
            two must lie at least {largestHidden} apart and reach {SMALLEST_SHOWN}, for the further cells as well.
          </li>
          <li>Where no choice of cells does it, totals are hidden too, and in the end the whole table.</li>
        </ul>
      </Section>
      <Section title="Groups from few clinics" id="sites">
        <p className="max-w-2xl">
          A group is shown only if it comes from at least {FEWEST_SITES} clinics and none of them has more than {LARGEST_SITE_PERCENT}% of
          its people: otherwise its figure would be that clinic’s own.
        </p>
      </Section>
      <Section
        title="Precision and differences"
        id="precision"
        note={
          <p>
            Rounding for reading is another matter: <TextLink to="/methods/rounding">rounding and wording</TextLink>.
          </p>
        }
      >
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>Public counts are rounded to the nearest 5; totals are rounded from the true totals, so lines need not add up.</li>
          <li>Means, standard deviations and limits have one decimal more than the measure is recorded with, not more.</li>
          <li>
            Baseline, end and change of an outcome rest on the same people, those with both values: figures over sets that differ by a few
            people would tell about these few.
          </li>
          <li>Figures come from numbered releases that never change, so the same question has the same answer.</li>
        </ul>
      </Section>
      <Section title="Who sees more" id="who">
        <p className="max-w-2xl">
          A clinic sees its own people exactly, as it holds their records anyway. Data stewards see exact counts where they decide about a
          request; that is logged.
        </p>
      </Section>
    </>
  );
}
