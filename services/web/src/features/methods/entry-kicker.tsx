import { TextLink } from '../../ui/text-link.tsx';
import { topicWords } from './entries.ts';
import type { Topic } from './entries.ts';

/** Where an entry stands: the index, and the question it belongs to. */
export function EntryKicker({ topic }: { readonly topic: Topic }) {
  return (
    <>
      <TextLink to="/methods">Methods</TextLink>, <TextLink to={`/methods?question=${topic}`}>{topicWords[topic]}</TextLink>
    </>
  );
}
