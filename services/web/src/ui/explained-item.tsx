/** An item of a list: its name on the left, what it is on the right; under each other on narrow screens. */
import type { ReactNode } from 'react';

export function ExplainedItem({ name, children }: { readonly name: ReactNode; readonly children: ReactNode }) {
  return (
    <li className="grid gap-x-6 border-b border-hairline py-2 break-inside-avoid sm:grid-cols-[minmax(0,15rem)_minmax(0,1fr)]">
      <div>{name}</div>
      <p className="text-small">{children}</p>
    </li>
  );
}
