import { Neighbours } from '../../ui/neighbours.tsx';
import { methodAddress } from './addresses.ts';
import { entries } from './entries.ts';

const inOrder = entries.map(({ slug, title }) => ({ to: methodAddress(slug), name: title }));

export function EntryNeighbours({ slug }: { readonly slug: string }) {
  return <Neighbours entries={inOrder} at={methodAddress(slug)} />;
}
