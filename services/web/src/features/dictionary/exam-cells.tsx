/** The 132 cells of the neurological exam, folded by segment. */
import type { Variable } from '@cairnstep/dictionary';
import { cellPlaces } from '@cairnstep/scoring';
import type { Modality } from '@cairnstep/scoring';
import { Fragment, useId, useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { variableAddress } from './addresses.ts';

const places = new Map<string, (typeof cellPlaces)[number]>(cellPlaces.map((place) => [place.key, place]));
const modalityWords: Readonly<Record<Modality, string>> = { lightTouch: 'Light touch', pinPrick: 'Pin prick', motor: 'Key muscle' };

export function isExamCell({ table, key }: Variable): boolean {
  return table === 'exams' && places.has(key);
}

/** The cells of the same segment, both sides and every modality; empty for any other variable. */
export function cellsOfSegment({ key }: Variable): readonly string[] {
  const segment = places.get(key)?.segment;
  return segment === undefined ? [] : cellPlaces.filter((place) => place.segment === segment).map((place) => place.key);
}

export interface ExamCellsProps {
  readonly cells: readonly Variable[];
  /** Unfolded from the start: when a search found them. */
  readonly isOpen: boolean;
}

export function ExamCells({ cells, isOpen }: ExamCellsProps) {
  const [open, setOpen] = useState(isOpen);
  const [followed, setFollowed] = useState(isOpen);
  // A search that begins or ends folds the list as it should be then.
  if (followed !== isOpen) {
    setFollowed(isOpen);
    setOpen(isOpen);
  }
  const listId = useId();
  const segments = [...new Set(cells.map(({ key }) => places.get(key)?.segment ?? ''))];
  return (
    <div className="border-b border-hairline py-2">
      <Button variant="quiet" aria-expanded={open} aria-controls={listId} onPress={() => setOpen(!open)}>
        {open ? 'Fold' : 'Show'} {cells.length === cellPlaces.length ? 'all' : 'the'} {cells.length} cells of the exam, by segment
      </Button>
      <dl id={listId} className={`${open ? 'grid' : 'hidden print:grid'} gap-y-1 pt-2`}>
        {segments.map((segment) => (
          <div key={segment} className="grid grid-cols-[3.5rem_minmax(0,1fr)] border-t border-hairline py-1">
            <dt className="numbers font-semibold">{segment.replace('_', '-')}</dt>
            <dd className="flex flex-wrap gap-x-6">
              <CellsOf segment={segment} cells={cells} />
            </dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

function CellsOf({ segment, cells }: { readonly segment: string; readonly cells: readonly Variable[] }) {
  return (Object.keys(modalityWords) as Modality[]).map((modality) => {
    const here = cells.filter(({ key }) => places.get(key)?.segment === segment && places.get(key)?.modality === modality);
    if (here.length === 0) return null;
    return (
      <span key={modality}>
        <span className="text-small text-quiet">{modalityWords[modality]} </span>
        {here.map((cell, index) => (
          <Fragment key={cell.key}>
            {index > 0 && ' '}
            <TextLink to={variableAddress(cell)}>
              {/* The line under a link would hide the underscores; this one stands below them. */}
              <code className="inline-block border-b border-current leading-5">{cell.key}</code>
            </TextLink>
          </Fragment>
        ))}
      </span>
    );
  });
}
