/** Searching lists that the client holds: every word of what was typed begins one of the words of an entry. */

/**
 * As words are compared: case, the form of apostrophes, hyphens and underscores do not count, so that "S4-5" finds `lt_r_s4_5`. Begins
 * with a space.
 */
export function foldText(text: string): string {
  return ` ${text
    .toLowerCase()
    .replaceAll('’', "'")
    .replace(/[\s_-]+/g, ' ')}`;
}

/** Whether a folded text holds every word of the query at the beginning of one of its own. An empty query is held by every text. */
export function wordMatcher(query: string): (folded: string) => boolean {
  const words = query.split(/\s+/).filter(Boolean).map(foldText);
  return (folded) => words.every((word) => folded.includes(word));
}
