/** The chosen cohort in one line, kept in sight below the grid, and what can be done with it. */
import type { Grid } from '@cairnstep/contract';
import type { CohortCell } from '../../lib/cohort.ts';
import { cohortSearch } from '../../lib/cohort.ts';
import { Button, LinkButton } from '../../ui/button.tsx';
import { cohortCount } from './grid-words.ts';

export interface CohortStripProps {
  readonly grid: Grid;
  readonly cells: readonly CohortCell[];
  readonly mayRequest: boolean;
  /** The draft request for which a cohort is being chosen. */
  readonly draft: string | null;
  readonly onClear: () => void;
}

export function CohortStrip({ grid, cells, mayRequest, draft, onClear }: CohortStripProps) {
  return (
    <div className="not-printed sticky bottom-0 z-10 mt-4 flex flex-wrap items-center gap-x-6 gap-y-1 border-t-2 border-lichen bg-sheet py-2 md:py-3">
      <p role="status" className="numbers min-w-0 flex-1 basis-64 text-small font-semibold md:text-base">
        {cohortCount(grid, cells)}
      </p>
      {cells.length > 0 && (
        <Button variant="quiet" onPress={onClear}>
          Clear
        </Button>
      )}
      {mayRequest && (
        <LinkButton
          variant="primary"
          to={`/requests/${draft ?? 'new'}?${cohortSearch({ outcome: grid.outcome.key, inDevice: grid.outcome.inDevice, cells: [...cells] })}`}
        >
          {draft === null ? 'Request these rows' : 'Take these for the draft'}
        </LinkButton>
      )}
    </div>
  );
}
