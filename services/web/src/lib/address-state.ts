/** State that lives in the address, so that back, reload and a mailed link show the same. */
import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';

/** One search parameter as state. An empty or `null` value leaves the address. */
export function useAddressParam(name: string): readonly [value: string | null, set: (value: string | null) => void] {
  const [search, setSearch] = useSearchParams();
  const set = useCallback(
    (value: string | null) =>
      setSearch(
        (before) => {
          const after = new URLSearchParams(before);
          if (value === null || value === '') after.delete(name);
          else after.set(name, value);
          return after;
        },
        { replace: true, preventScrollReset: true },
      ),
    [name, setSearch],
  );
  return [search.get(name), set];
}

/** The `page` parameter: a whole number from 1. */
export function usePageNumber(name = 'page'): number {
  const [value] = useAddressParam(name);
  const page = Number(value ?? '1');
  return Number.isInteger(page) && page >= 1 ? page : 1;
}
