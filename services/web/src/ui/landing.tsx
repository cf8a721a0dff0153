import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

/** Where a link to `#name` brings the keyboard and a screen reader, not only the eye. Stands first in the section of that id. */
export function Landing({ name, label }: { readonly name: string; readonly label: string }) {
  const { hash, key } = useLocation();
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (hash === `#${name}`) place.current?.focus({ preventScroll: true });
  }, [hash, key, name]);
  return <div ref={place} tabIndex={-1} role="group" aria-label={label} className="outline-none" />;
}
