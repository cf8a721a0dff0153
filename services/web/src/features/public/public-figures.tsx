/** The figures anyone may see, as parts of the two public pages. */
import type { getPublicFigures, ResponseOf } from '@cairnstep/contract';
import { formatCount, formatDate } from '../../lib/format.ts';
import { BarTable } from '../../ui/bar-table.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Figures } from '../../ui/figure.tsx';
import { HiddenMarkKey } from '../../ui/hidden-mark.tsx';
import { Section } from '../../ui/page.tsx';

type PublicFigures = ResponseOf<typeof getPublicFigures>;

export function PublicFigureSections({ figures }: { readonly figures: PublicFigures }) {
  const { release } = figures;
  if (release === null) {
    return (
      <Section title="Figures" id="figures">
        <EmptyState>
          No release has been made yet, so there are no figures to show. They appear here as soon as a data steward freezes the registry for
          the first time.
        </EmptyState>
      </Section>
    );
  }
  return (
    <>
      <Section
        title="The registry in numbers"
        id="figures"
        note={
          <>
            <p>
              Release {release.number}, made on {formatDate(release.madeAt)}. A release never changes; the next one replaces these figures.
            </p>
            <p>Counts of people, sessions and bouts are rounded to the nearest 5.</p>
            <HiddenMarkKey />
          </>
        }
      >
        <Figures
          items={[
            { label: 'clinics', value: figures.sites },
            { label: 'participants', value: figures.participants },
            { label: 'training sessions', value: figures.sessions },
            { label: 'bouts of walking or movement', value: figures.bouts },
          ]}
        />
        <p className="mt-4 max-w-2xl">{inWords(figures)}</p>
      </Section>
      <Section
        title="Where the injury lies"
        id="levels"
        note={
          <p>
            The neurological level is the lowest segment of the spinal cord with normal feeling and strength on both sides. It is worked out
            from each clinic’s examination by the published standard (ISNCSCI).
          </p>
        }
      >
        <BarTable
          caption="Participants by level of injury"
          rowHeader="Level group"
          counted="Participants"
          rows={rowsOf(figures.levelGroups)}
        />
      </Section>
      <Section
        title="How complete the injury is"
        id="completeness"
        note={
          <p>
            Complete: no feeling or movement is preserved in the lowest segments (AIS grade A). Incomplete: some is preserved (grades B to
            D).
          </p>
        }
      >
        <BarTable
          caption="Participants by completeness"
          rowHeader="Completeness"
          counted="Participants"
          rows={rowsOf(figures.completeness)}
        />
      </Section>
    </>
  );
}

function rowsOf(rows: PublicFigures['levelGroups']) {
  return rows.map(({ label, participants }) => ({ label, count: participants }));
}

/** The same for those who do not look at tables. */
function inWords({ sites, participants, sessions, levelGroups }: PublicFigures): string {
  const clinics = formatCount(sites, 'clinic');
  const people = participants === null ? 'participants whose number is not shown' : `about ${formatCount(participants, 'participant')}`;
  const trained = sessions === null ? '' : ` and about ${formatCount(sessions, 'training session')}`;
  const largest = levelGroups.reduce<(typeof levelGroups)[number] | null>(
    (most, group) => ((group.participants ?? 0) > (most?.participants ?? 0) ? group : most),
    null,
  );
  const where =
    largest?.participants == null
      ? ''
      : ` The largest group is ${largest.label}, with about ${formatCount(largest.participants, 'participant')}.`;
  return `${clinics} together hold ${people}${trained}.${where}`;
}
