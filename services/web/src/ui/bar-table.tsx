/** Counts as bars that are a table at the same time: every bar stands beside its number. */
import { formatNumber } from '../lib/format.ts';
import { HiddenMark } from './hidden-mark.tsx';

export interface BarRow {
  readonly label: string;
  /** Null: may not be shown. */
  readonly count: number | null;
}

export interface BarTableProps {
  readonly caption: string;
  /** What the labels are, for example "Level group". */
  readonly rowHeader: string;
  /** What is counted, for example "Participants". */
  readonly counted: string;
  readonly rows: readonly BarRow[];
}

export function BarTable({ caption, rowHeader, counted, rows }: BarTableProps) {
  const largest = Math.max(1, ...rows.map(({ count }) => count ?? 0));
  return (
    <table className="w-full max-w-2xl border-collapse">
      <caption className="pb-2 text-left font-semibold">{caption}</caption>
      <thead className="text-small text-quiet">
        <tr className="border-b border-edge">
          <th scope="col" className="py-1 pr-4 text-left font-normal">
            {rowHeader}
          </th>
          <th scope="col" colSpan={2} className="py-1 text-left font-normal">
            {counted}
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ label, count }) => (
          <tr key={label} className="border-b border-hairline">
            <th scope="row" className="py-2 pr-4 text-left font-normal">
              {label}
            </th>
            <td className="numbers w-16 py-2 pr-3 text-right">{count === null ? <HiddenMark /> : formatNumber(count)}</td>
            <td className="w-1/3 py-2 sm:w-1/2">{count !== null && <Bar share={count / largest} />}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** `share`: length of the bar as a part of the room it has, 0 to 1. */
export function Bar({ share }: { readonly share: number }) {
  return (
    <svg aria-hidden="true" width="100%" height="12" className="block">
      <rect width={`${Math.round(share * 1000) / 10}%`} height="12" className="fill-lichen" />
    </svg>
  );
}
