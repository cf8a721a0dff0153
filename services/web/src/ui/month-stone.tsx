/** A site's month as a stone. Shape and line tell the states apart, colour only adds to them; the word always stands beside it or in a table. */
import type { MonthState } from '@cairnstep/contract';

const looks: Readonly<Record<MonthState, string>> = {
  accepted: 'fill-lichen stroke-lichen',
  'nothing-to-report': 'fill-transparent stroke-lichen',
  checking: 'fill-transparent stroke-lichen stroke-2',
  'in-progress': 'fill-chosen stroke-lichen stroke-2',
  due: 'fill-transparent stroke-ink stroke-2',
  overdue: 'fill-transparent stroke-oxide stroke-2',
  'not-yet-due': 'fill-transparent stroke-edge [stroke-dasharray:2_2]',
};

export function MonthStone({ state }: { readonly state: MonthState }) {
  return (
    <svg aria-hidden="true" width="20" height="12" viewBox="0 0 20 12" className="shrink-0">
      <rect x="1" y="1" width="18" height="10" rx="5" className={looks[state]} />
      {state === 'checking' && <path d="M10 1v10H6A5 5 0 0 1 6 1Z" className="fill-lichen" />}
      {state === 'nothing-to-report' && <path d="M6 6h8" className="stroke-lichen stroke-2" />}
      {state === 'overdue' && <path d="M10 3v3.5M10 8v1.5" className="stroke-oxide stroke-2" />}
    </svg>
  );
}
