import { useEffect } from 'react';

/** The browser asks, in its own words, before the page is closed or loaded again on something that would be lost. */
export function useStayOnPage(isNeeded: boolean): void {
  useEffect(() => {
    if (!isNeeded) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isNeeded]);
}
