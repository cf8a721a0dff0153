import type { ReactNode } from 'react';

export interface Fact {
  readonly term: string;
  /** Nothing to say: the fact is left out. */
  readonly value: ReactNode;
}

/** Terms and what they are, one under the other. */
export function Facts({ facts }: { readonly facts: readonly Fact[] }) {
  return (
    <dl className="grid max-w-2xl">
      {facts
        .filter(({ value }) => value !== null && value !== undefined && value !== false && value !== '')
        .map(({ term, value }) => (
          <div key={term} className="gap-x-6 border-b border-hairline py-2 sm:grid sm:grid-cols-[11rem_minmax(0,1fr)]">
            <dt className="text-quiet">{term}</dt>
            <dd className="wrap-anywhere">{value}</dd>
          </div>
        ))}
    </dl>
  );
}
