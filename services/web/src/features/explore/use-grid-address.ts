/** What is asked and which cells are chosen, as the address holds it. */
import { useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router-dom';
import { useAddressChange } from '../../lib/address-state.ts';
import { formatCells, parseCells } from '../../lib/cohort.ts';
import type { CohortCell } from '../../lib/cohort.ts';
import type { GridQuestion } from './explore.queries.ts';

/** Comfortable walking speed over ten metres: what most people ask first, and measured almost everywhere. */
const firstOutcome = 'tmwt_ss';

const statistics = ['change', 'baseline', 'end'] as const;

export type ChooseCells = (change: (before: readonly CohortCell[]) => readonly CohortCell[]) => void;

export interface GridAddress {
  readonly question: GridQuestion;
  readonly cells: readonly CohortCell[];
  readonly asTable: boolean;
  /** The draft request that the choice is to go back to. */
  readonly draft: string | null;
  readonly ask: (changes: Partial<Record<'outcome' | 'inDevice' | 'statistic' | 'release' | 'site', string | null>>) => void;
  /** Told as a change, so that quick presses build on each other although the address follows a moment later. */
  readonly chooseCells: ChooseCells;
  readonly showAs: (view: 'grid' | 'table') => void;
}

/** `ownSites`: ids of sites whose own figures this person may see; any other site in the address is passed over. */
export function useGridAddress(ownSites: readonly string[]): GridAddress {
  const [search] = useSearchParams();
  const change = useAddressChange();
  const release = Number(search.get('release'));
  const cells = parseCells(search.get('cells'));
  const written = formatCells(cells);
  const latest = useRef(written);
  useEffect(() => {
    latest.current = written;
  }, [written]);
  const siteId = ownSites.find((id) => id === search.get('site'));
  return {
    question: {
      outcome: search.get('outcome') ?? firstOutcome,
      inDevice: search.get('in-device') === 'yes' ? 'yes' : 'no',
      statistic: statistics.find((one) => one === search.get('statistic')) ?? 'change',
      ...(siteId === undefined && Number.isInteger(release) && release >= 1 && { release }),
      ...(siteId !== undefined && { siteId }),
    },
    cells,
    asTable: search.get('view') === 'table',
    draft: search.get('draft'),
    ask: ({ inDevice, ...others }) => change({ ...others, ...(inDevice !== undefined && { 'in-device': inDevice }) }),
    chooseCells: (changeCells) => {
      latest.current = formatCells(changeCells(parseCells(latest.current)));
      change({ cells: latest.current });
    },
    showAs: (view) => change({ view: view === 'table' ? 'table' : null }),
  };
}
