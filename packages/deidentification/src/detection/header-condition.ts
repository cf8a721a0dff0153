import { numberWords } from './header-words.ts';
import { wordSet } from '../word-set.ts';

/** When the words of a header meet a rule. Lists are words with blanks between them. */
export interface HeaderCondition {
  /** One of these is enough. */
  readonly any?: string;
  /** One word of each list of a group is enough. */
  readonly together?: readonly (readonly string[])[];
  /** One of `words`, and nothing else besides words of `beside`, digits and words for a number. */
  readonly alone?: readonly { readonly words: string; readonly beside?: string }[];
  /** None of these may be there. */
  readonly unless?: string;
}

const numbering = wordSet(numberWords);

/** The condition as a function of a header's words. */
export function headerCondition({
  any = '',
  together = [],
  alone = [],
  unless = '',
}: HeaderCondition): (words: readonly string[]) => boolean {
  const enough = wordSet(any);
  const groups = together.map((group) => group.map(wordSet));
  const closed = alone.map(({ words, beside = '' }) => ({ needed: wordSet(words), allowed: wordSet(`${words} ${beside}`) }));
  const excluded = wordSet(unless);
  return (words) => {
    if (words.some((word) => excluded.has(word))) return false;
    if (words.some((word) => enough.has(word))) return true;
    if (groups.some((group) => group.every((list) => words.some((word) => list.has(word))))) return true;
    return closed.some(
      ({ needed, allowed }) =>
        words.some((word) => needed.has(word)) && words.every((word) => allowed.has(word) || numbering.has(word) || /^\d/.test(word)),
    );
  };
}
