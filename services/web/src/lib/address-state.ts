/** State that lives in the address, so that back, reload and a mailed link show the same. */
import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';

/** One search parameter as state. An empty or `null` value leaves the address. */
export function useAddressParam(name: string): readonly [value: string | null, set: (value: string | null) => void] {
  const [search] = useSearchParams();
  const change = useAddressChange();
  const set = useCallback((value: string | null) => change({ [name]: value }), [name, change]);
  return [search.get(name), set];
}

/** Changes several search parameters at once; an empty or `null` value leaves the address. */
export function useAddressChange(): (changes: Readonly<Record<string, string | null>>) => void {
  const [, setSearch] = useSearchParams();
  return useCallback(
    (changes) =>
      setSearch(
        (before) => {
          const after = new URLSearchParams(before);
          for (const [name, value] of Object.entries(changes)) {
            if (value === null || value === '') after.delete(name);
            else after.set(name, value);
          }
          return after;
        },
        { replace: true, preventScrollReset: true },
      ),
    [setSearch],
  );
}

/** The `page` parameter: a whole number from 1. */
export function usePageNumber(name = 'page'): number {
  const [value] = useAddressParam(name);
  const page = Number(value ?? '1');
  return Number.isInteger(page) && page >= 1 ? page : 1;
}
