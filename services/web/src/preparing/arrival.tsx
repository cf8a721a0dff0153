import { useEffect, useRef } from 'react';

/** Where the keyboard and a screen reader go on when a part of the page has appeared because of what they did. Stands first in it. */
export function Arrival({ label }: { readonly label: string }) {
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => place.current?.focus({ preventScroll: true }), []);
  return <div ref={place} tabIndex={-1} role="group" aria-label={label} className="outline-none" />;
}
