import { TextLink } from './text-link.tsx';

interface Entry {
  readonly to: string;
  readonly name: string;
}

/** Ways to the entries before and after, for reading through. `at`: the address of the entry shown. */
export function Neighbours({ entries, at }: { readonly entries: readonly Entry[]; readonly at: string }) {
  const index = entries.findIndex(({ to }) => to === at);
  const before = entries[index - 1];
  const after = entries[index + 1];
  return (
    <nav
      aria-label="Entries before and after"
      className="not-printed flex flex-wrap justify-between gap-4 border-t border-hairline px-4 py-6 md:px-8 lg:mr-60"
    >
      <span>{before && <TextLink to={before.to}>Before: {before.name}</TextLink>}</span>
      <span>{after && <TextLink to={after.to}>After: {after.name}</TextLink>}</span>
    </nav>
  );
}
