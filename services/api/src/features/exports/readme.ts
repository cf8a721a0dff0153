/** The README of an export: what is in it, what was changed, how to read it, what is forbidden. */
import { levelGroups } from '@cairnstep/scoring';
import type { Form } from '../requests/requests.repository.ts';
import type { Generalised } from './generalise.ts';
import { smallestClass } from './generalise.ts';

export interface ReadmeFacts {
  readonly exportNumber: string;
  readonly requestNumber: string;
  readonly release: number;
  readonly form: Form;
  readonly accessEndsOn: string;
  readonly generalised: Generalised;
  /** People of the cohort who are not in the files, whatever the reason: told together, since one of two numbers would give the other away. */
  readonly notIncluded: number;
  readonly people: number;
}

/** As printed on screen. */
const labelOf = (levelGroup: string): string => levelGroups.groups.find(({ id }) => id === levelGroup)?.label ?? 'level not determinable';

const hiddenSmall = (count: number): string => (count >= 1 && count <= 10 ? '1 to 10' : String(count));

export function exportReadme({
  exportNumber,
  requestNumber,
  release,
  form,
  accessEndsOn,
  generalised,
  notIncluded,
  people,
}: ReadmeFacts): string {
  const cohort =
    form.cohort.cells.length === 0
      ? 'everyone of the release'
      : form.cohort.cells.map(({ levelGroup, grade }) => `${labelOf(levelGroup)} AIS ${grade}`).join(', ');
  return `# ${exportNumber}

Rows for access request ${requestNumber}, “${form.title}”, from release ${release} of the registry.

## Who is in it
Cohort: ${cohort}; first course of each person. ${people} people whose consent permits this use on the day of the build.
Left out because consent does not permit it, because a person has to look at it first, or so that nobody stands out: ${hiddenSmall(notIncluded)}.

## What was changed to protect people
${generalised.steps.map((step) => `- ${step}`).join('\n')}
- study days: four-week blocks and ordinals
- site, cause, time since injury: left out
- codes of people: new in this export

Every person shares level group, grade, age band and sex with at least ${generalised.risk.smallestClass - 1} others of this export
(k = ${generalised.risk.smallestClass}; the registry asks for ${smallestClass}). ${generalised.risk.inClassesBelow11} people are in groups of fewer than 11.
Average re-identification risk ${generalised.risk.averageRisk.toFixed(3)} (groups / people).

## How to read it
Comma-separated, UTF-8 without byte-order mark, CRLF, point as decimal mark, empty = not recorded; codebook.csv explains each column.
Results in the device and without it never belong in one statistic. Unable is a result, not a missing value.
The on-screen table: in outcomes.csv keep one measure and in_device value, take end_value minus baseline_value of the people with both,
group by level_group and ais of participants.csv, and compute mean, sample SD and the t interval. People named above as left out are missing here.
Check the files with \`sha256sum -c manifest-sha256.txt\`.

## Terms
Re-identifying participants, or trying to, is forbidden. Do not pass the files on. Keep them where the request says: ${form.storage}
Destroy them when access ends on ${accessEndsOn}, or when the registry asks.
Group statistics describe groups. They do not choose or dose treatment for one person; that stays with licensed clinicians, the device's own
instructions and local protocols.
`;
}
