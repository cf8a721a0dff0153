import type { ReactNode } from 'react';

/** Nothing here yet: says so, and what to do next. */
export function EmptyState({ children, action }: { readonly children: ReactNode; readonly action?: ReactNode }) {
  return (
    <div className="grid justify-items-start gap-3 py-4">
      <p className="max-w-2xl text-quiet">{children}</p>
      {action}
    </div>
  );
}
