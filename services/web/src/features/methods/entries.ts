/** All pages of the Methods, decisions first, and how they are found. */
import { methodPages, questions } from '@cairnstep/statistics';
import type { QuestionKey } from '@cairnstep/statistics';
import { foldText, wordMatcher } from '../../lib/word-match.ts';
import { decisions } from './decisions.ts';

export type Topic = 'registry' | QuestionKey;

export const topicWords: Readonly<Record<Topic, string>> = { registry: 'What does the registry decide itself?', ...questions };

export const topics = Object.keys(topicWords) as readonly Topic[];

export interface Entry {
  readonly slug: string;
  readonly title: string;
  /** A decision in short, or when a method is used. */
  readonly summary: string;
  readonly topic: Topic;
}

export const entries: readonly Entry[] = [
  ...decisions.map(({ slug, title, summary }): Entry => ({ slug, title, summary, topic: 'registry' })),
  // By question, in the order of the questions.
  ...topics.flatMap((topic) =>
    methodPages
      .filter(({ question }) => question === topic)
      .map(({ slug, title, whenUsed }): Entry => ({ slug, title, summary: whenUsed, topic })),
  ),
];

const searched = entries.map((entry) => {
  const source = methodPages.find(({ slug }) => slug === entry.slug)?.source ?? '';
  return { entry, text: foldText([entry.slug, entry.title, entry.summary, topicWords[entry.topic], source].join('\n')) };
});

/** Entries of a topic, or of all, that hold every word of the query. */
export function findEntries(query: string, topic: Topic | 'all'): readonly Entry[] {
  const holds = wordMatcher(query);
  return searched.filter(({ entry, text }) => (topic === 'all' || topic === entry.topic) && holds(text)).map(({ entry }) => entry);
}
