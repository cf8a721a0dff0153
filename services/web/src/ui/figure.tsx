/** Single numbers to read at a glance, on one ruled line: number, then what it counts. */
import type { ReactNode } from 'react';
import { formatNumber } from '../lib/format.ts';
import { HiddenMark } from './hidden-mark.tsx';

export interface FigureItem {
  readonly label: string;
  /** Null: may not be shown. */
  readonly value: number | null;
  readonly decimals?: number;
  readonly unit?: string;
  readonly remark?: ReactNode;
}

export function Figures({ items }: { readonly items: readonly FigureItem[] }) {
  return (
    <dl className="grid grid-cols-2 gap-x-6 border-y border-hairline md:grid-cols-4">
      {items.map(({ label, value, decimals = 0, unit, remark }) => (
        <div key={label} className="flex flex-col-reverse justify-end py-3">
          <dt className="text-small text-quiet">
            {label}
            {remark !== undefined && <span className="block">{remark}</span>}
          </dt>
          <dd className="text-title font-semibold">
            {value === null ? <HiddenMark /> : formatNumber(value, decimals)}
            {value !== null && unit !== undefined && <span className="text-base font-normal"> {unit}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
