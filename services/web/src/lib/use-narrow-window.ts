/** Whether the window is as narrow as a phone held upright, where a table shows little more than its first two columns. */
import { useSyncExternalStore } from 'react';

const narrow = '(max-width: 479px)';

function subscribe(onChange: () => void): () => void {
  const query = window.matchMedia(narrow);
  query.addEventListener('change', onChange);
  return () => query.removeEventListener('change', onChange);
}

export const useNarrowWindow = (): boolean => useSyncExternalStore(subscribe, () => window.matchMedia(narrow).matches);
