import { regionGroups } from '@cairnstep/scoring';
import { Section } from '../../../ui/page.tsx';
import { Table } from '../../../ui/table.tsx';
import type { Column } from '../../../ui/table.tsx';
import { TextLink } from '../../../ui/text-link.tsx';
import type { Decision } from '../decision.ts';
import { largestPercentLeftOut, smallestExportClass, tenYearEdges, threeBandEdges } from '../policy.ts';

export const exportProtection: Decision = {
  slug: 'export-protection',
  title: 'How exports protect people',
  summary: `Rows leave the registry only for an approved purpose, of people whose consent allows it, and coarsened until nobody stands out: each person shares level group, grade, age band and sex with at least ${smallestExportClass - 1} others.`,
  note: `k = ${smallestExportClass}, under an agreement that forbids finding out who anyone is. Sweeney (2002) Int J Uncertainty Fuzziness Knowl-Based Syst 10:557-570; Samarati (2001) IEEE Trans Knowl Data Eng 13:1010-1027.`,
  Body,
};

interface Step {
  readonly variable: string;
  readonly levels: readonly string[];
}

/** "under 20, 20–29, …, 70 and over", from the first years of all bands but the youngest. */
function bandWords(edges: readonly number[]): string {
  const [first] = edges;
  const between = edges.slice(0, -1).map((from, at) => `${from}–${(edges[at + 1] ?? 0) - 1}`);
  return [`under ${first}`, ...between, `${edges.at(-1)} and over`].join(', ');
}

const edgesOf = (id: string): string => {
  const group = regionGroups.groups.find((one) => one.id === id);
  return group === undefined ? '' : `${group.first}–${group.last}`;
};

const steps: readonly Step[] = [
  {
    variable: 'Level of injury',
    levels: [
      'level groups as on screen',
      `cervical (${edgesOf('cervical')}), thoracic (${edgesOf('thoracic')}), lumbosacral (L1–S3), other`,
      'left out',
    ],
  },
  { variable: 'AIS grade', levels: ['A to E', 'A or B, and C to E', 'left out'] },
  { variable: 'Age', levels: [bandWords(tenYearEdges), bandWords(threeBandEdges), 'left out'] },
  { variable: 'Sex', levels: ['as recorded', 'left out'] },
];

function Body() {
  return (
    <>
      <Section
        title="Coarsened as far as needed"
        id="coarsened"
        note={
          <p>
            Among all combinations of these steps, the one that loses least is taken. The readme of an export states each step, the smallest
            class, how many people are in classes below 11, and the average risk.
          </p>
        }
      >
        <div className="grid gap-4">
          <Table
            id="steps"
            caption="What is coarsened, from the finest form to the coarsest"
            columns={columns}
            rows={steps}
            rowKey={({ variable }) => variable}
            empty="Nothing is coarsened."
            isSortable={false}
          />
          <p className="max-w-2xl">
            At most {largestPercentLeftOut}% of the people may be left out instead of coarsening everybody’s rows for them. If even the
            coarsest form does not protect, there is no export.
          </p>
        </div>
      </Section>
      <Section title="In every export" id="always">
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>Codes of people are new in each export and drawn at random: two exports cannot be joined.</li>
          <li>Study days become four-week blocks and the order of sessions.</li>
          <li>Clinic, cause and time since injury are left out.</li>
          <li>Measurements are exported as they are, from the release named in the readme.</li>
          <li>
            Consent is read anew at the moment of the build: see <TextLink to="/methods/consent-matching">how consent is matched</TextLink>.
          </li>
        </ul>
      </Section>
    </>
  );
}

const columns: readonly Column<Step>[] = [
  { key: 'variable', header: 'Variable', value: ({ variable }) => variable, isRowHeader: true },
  {
    key: 'levels',
    header: 'Steps',
    value: ({ levels }) => levels.join('; '),
    cell: ({ levels }) => (
      <ol className="grid list-decimal gap-1 pl-5">
        {levels.map((level) => (
          <li key={level}>{level}</li>
        ))}
      </ol>
    ),
  },
];
