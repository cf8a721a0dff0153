import { Link, useSearchParams } from 'react-router-dom';
import type { To } from 'react-router-dom';
import { formatCount, formatNumber } from '../lib/format.ts';

export interface PaginationProps {
  /** What is paged: "Findings". */
  readonly label: string;
  readonly page: number;
  readonly pageSize: number;
  readonly total: number;
  /** What one item is called: "finding". */
  readonly one: string;
  readonly many?: string;
  /** Name of the parameter in the address. */
  readonly name?: string;
  /** Id of the section to come to, on a page that holds more than the list. */
  readonly anchor?: string;
}

/** Links to the neighbouring pages, so that each page has an address of its own. */
export function Pagination({ label, page, pageSize, total, one, many, name = 'page', anchor }: PaginationProps) {
  const [search] = useSearchParams();
  const pages = Math.max(1, Math.ceil(total / pageSize));
  const first = total === 0 ? 0 : (page - 1) * pageSize + 1;
  const last = Math.min(total, page * pageSize);
  function to(target: number): To {
    const after = new URLSearchParams(search);
    if (target === 1) after.delete(name);
    else after.set(name, String(target));
    return { search: `?${after}`, ...(anchor !== undefined && { hash: `#${anchor}` }) };
  }
  return (
    <nav aria-label={`Pages of ${label}`} className="flex flex-wrap items-center gap-x-6 gap-y-2 py-2">
      <p className="numbers text-quiet">
        {pages === 1
          ? formatCount(total, one, many)
          : `${formatNumber(first)} to ${formatNumber(last)} of ${formatCount(total, one, many)}, page ${formatNumber(page)} of ${formatNumber(pages)}`}
      </p>
      {page > 1 && (
        <Link className="link not-printed" to={to(Math.min(page - 1, pages))} rel="prev">
          Previous page
        </Link>
      )}
      {page < pages && (
        <Link className="link not-printed" to={to(page + 1)} rel="next">
          Next page
        </Link>
      )}
    </nav>
  );
}
