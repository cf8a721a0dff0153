import { formatCount } from '../../../lib/format.ts';
import { Section } from '../../../ui/page.tsx';
import { TextLink } from '../../../ui/text-link.tsx';
import type { Decision } from '../decision.ts';
import { examWindowDays } from '../policy.ts';

export const baselineAndEnd: Decision = {
  slug: 'baseline-and-end-of-course',
  title: 'Which values count as baseline and end of course',
  summary:
    'A person may have several examinations, visits and trials. These rules choose one value for each, the same for everybody, before anything is computed.',
  note: 'Days are counted from the first training day. Values are chosen again whenever a submission changes a person’s rows.',
  Body,
};

function Body() {
  return (
    <>
      <Section title="Course" id="course">
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>Figures of groups rest on each person’s first course, so that nobody counts twice.</li>
          <li>The course begins with the first session that was attended, in full or shortened, and ends with the last.</li>
          <li>Dose is what was walked: the sum over the walking bouts of its sessions. Time since injury is taken at its first session.</li>
          <li>A person without any session or result is still a person of the registry: counted as missing, not overlooked.</li>
        </ul>
      </Section>
      <Section
        title="Baseline exam"
        id="exam"
        note={
          <p>
            Level and grade of a person are those of this exam. See{' '}
            <TextLink to="/methods/classification">how injuries are classified</TextLink>.
          </p>
        }
      >
        <p className="max-w-2xl">
          The last exam on or before the first attended session, at most {formatCount(examWindowDays, 'day')} earlier. Without one, level
          and grade are “not determinable”.
        </p>
      </Section>
      <Section
        title="Results"
        id="results"
        note={
          <p>
            Missing values stay missing: none is carried forward or filled in. See{' '}
            <TextLink to="/methods/description">description</TextLink>.
          </p>
        }
      >
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>
            The clinic says of each assessment whether it is baseline or end of course. Of several of one timepoint the latest counts; of
            several trials on that day, the first.
          </li>
          <li>Results in the training device and without it are two outcomes. They never meet in one statistic.</li>
          <li>“Unable” is a result without a number: counted apart, never taken as zero.</li>
          <li>Change is end of course minus baseline, of people who have both. Whether up or down is better is stored with the measure.</li>
        </ul>
      </Section>
    </>
  );
}
