/** Tells assistive technology about work that finished elsewhere on the page. */
import { useSyncExternalStore } from 'react';

let message = '';
const listeners = new Set<() => void>();

/** Said politely, once. The same words again are said again. */
export function announce(words: string): void {
  message = message === words ? `${words}\u00A0` : words;
  for (const listener of listeners) listener();
}

/** The region the words are put into; the frame holds the only one. */
export function Announcer() {
  const words = useSyncExternalStore(subscribe, () => message);
  return (
    <div role="status" aria-live="polite" className="sr-only">
      {words}
    </div>
  );
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
