import type { Account, Grid } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { hasRole, sitesOf, useAccount } from '../../lib/account.ts';
import { cohortPhrases } from '../../lib/cohort.ts';
import { formatDate } from '../../lib/format.ts';
import { saveFile } from '../../lib/save-file.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { CohortStrip } from './cohort-strip.tsx';
import { gridQuery, outcomesQuery } from './explore.queries.ts';
import { downloadGrid, fileNameOf, GridAsTable } from './grid-as-table.tsx';
import { gridPicture } from './grid-picture.ts';
import { GridChoice } from './grid-choice.tsx';
import { GridWithLevels } from './grid-with-levels.tsx';
import { cohortCount, gridInWords, sourceOf, statisticNames, unitText } from './grid-words.ts';
import { intervalScale } from './interval-scale.ts';
import { LeftOut } from './left-out.tsx';
import { useGridAddress } from './use-grid-address.ts';
import type { GridAddress } from './use-grid-address.ts';

export default function ExplorePage() {
  const account = useAccount();
  return (
    <Page
      title="Explore"
      lead={
        <p>People like these, trained like that: what happened? Choose what was measured, then read it by level and grade of injury.</p>
      }
      note={
        <p>
          Group statistics describe groups. They do not choose or dose treatment for one person; that stays with licensed clinicians, the
          device’s own instructions and local protocols.
        </p>
      }
    >
      {account !== undefined && <Explorer account={account} />}
    </Page>
  );
}

function Explorer({ account }: { readonly account: Account }) {
  const address = useGridAddress(sitesOf(account).map(({ id }) => id));
  // Asked for side by side: neither waits for the other.
  const known = useQuery(outcomesQuery());
  const grid = useQuery(gridQuery(address.question));
  if (known.data?.releases.length === 0 && address.question.siteId === undefined) return <NothingReleased account={account} />;
  return (
    <>
      <div className="not-printed">
        <Section>
          <div className="min-h-64 sm:min-h-60">
            <Answer query={known} waiting="Reading which outcomes can be explored.">
              {(outcomes) => <GridChoice account={account} known={outcomes} address={address} />}
            </Answer>
          </div>
        </Section>
      </div>
      {grid.data === undefined ? (
        <Section wide>
          <div className="min-h-[960px]">
            <Answer query={grid} waiting="Reading the figures.">
              {() => null}
            </Answer>
          </div>
        </Section>
      ) : (
        <GridSection grid={grid.data} isOld={grid.isPlaceholderData} address={address} mayRequest={hasRole(account, 'researcher')} />
      )}
    </>
  );
}

interface GridSectionProps {
  readonly grid: Grid;
  /** Figures asked for before, in sight until the new ones are there. */
  readonly isOld: boolean;
  readonly address: GridAddress;
  readonly mayRequest: boolean;
}

function GridSection({ grid, isOld, address: { cells, asTable, draft, chooseCells, showAs }, mayRequest }: GridSectionProps) {
  const titleId = useId();
  const unit = unitText(grid.outcome);
  return (
    <Section wide note={<GridNotes grid={grid} />}>
      <div aria-busy={isOld} className="grid gap-5">
        <div className="grid gap-3">
          <h2 id={titleId} className="text-section font-semibold">
            {statisticNames[grid.statistic]}: {grid.outcome.name}
            {unit !== '' && <span className="font-normal text-quiet">, {unit}</span>}
          </h2>
          <p className="max-w-3xl">{isOld ? 'Reading the figures; those shown were asked for before.' : gridInWords(grid)}</p>
          <div className="not-printed flex flex-wrap gap-x-6">
            <Button variant="quiet" onPress={() => showAs(asTable ? 'grid' : 'table')}>
              {asTable ? 'Show as grid' : 'Show as table'}
            </Button>
            {!asTable && (
              <>
                <Button variant="quiet" onPress={() => downloadGrid(grid)}>
                  Download CSV
                </Button>
                <Button variant="quiet" onPress={() => saveFile(`${fileNameOf(grid)}.svg`, gridPicture(grid), 'image/svg+xml')}>
                  Download as picture (SVG)
                </Button>
              </>
            )}
            <Button variant="quiet" onPress={() => window.print()}>
              Print the cohort sheet
            </Button>
          </div>
        </div>
        {asTable ? (
          <GridAsTable grid={grid} />
        ) : (
          <GridWithLevels grid={grid} scale={intervalScale(grid)} labelledBy={titleId} chosen={cells} onChoose={chooseCells} />
        )}
        <CohortSheet grid={grid} cells={cells} />
      </div>
      <CohortStrip grid={grid} cells={cells} mayRequest={mayRequest} draft={draft} onClear={() => chooseCells(() => [])} />
    </Section>
  );
}

/** The cohort in words, on the screen and on paper. */
function CohortSheet({ grid, cells }: { readonly grid: Grid; readonly cells: GridAddress['cells'] }) {
  return (
    <div>
      <h3 className="font-semibold">The cohort</h3>
      {cells.length === 0 ? (
        <p>Everyone in {sourceOf(grid)}. Choose cells, a row, a grade or levels to make it smaller.</p>
      ) : (
        <ul className="list-disc pl-5">
          {cohortPhrases(cells).map((phrase) => (
            <li key={phrase}>{phrase}</li>
          ))}
        </ul>
      )}
      <p className="hidden print:block">
        {cohortCount(grid, cells)}, from {sourceOf(grid)}.
      </p>
    </div>
  );
}

function GridNotes({ grid }: { readonly grid: Grid }) {
  const { release, method, notes } = grid;
  return (
    <>
      {release !== null ? (
        <p>
          Release {release.number}, made on {formatDate(release.madeAt)}: {release.note}. A release never changes.
        </p>
      ) : (
        <p>Figures of {sourceOf(grid)}: they change with every month that is accepted, and nothing is hidden.</p>
      )}
      <p>{method}</p>
      <LeftOut grid={grid} />
      {notes.map((note) => (
        <p key={note}>{note}</p>
      ))}
      <p>
        AIS grades: A, nothing is felt or moved in the lowest segments; B, felt but not moved; C and D, moved, in D with half or more of the
        key muscles below the level strong enough to move against gravity; E, normal again. A level chosen in the column chooses the whole
        level group it belongs to.
      </p>
      <p>
        The cohort is made of all people in the chosen groups, whether or not they have a value of this outcome. “n of N” counts those who
        have.
      </p>
    </>
  );
}

function NothingReleased({ account }: { readonly account: Account }) {
  return (
    <Section>
      <EmptyState action={hasRole(account, 'steward') && <TextLink to="/releases">Make the first release</TextLink>}>
        No release has been made yet, so there are no figures to explore. They appear here as soon as a data steward freezes the registry
        for the first time.
      </EmptyState>
    </Section>
  );
}
