import { formatCount } from '../../lib/format.ts';

/** What an act on the key did to codes, and what follows. */
export const replacedWords = (count: number): string =>
  count === 0
    ? 'No code had to be replaced.'
    : `${formatCount(count, 'code')} ${count === 1 ? 'was' : 'were'} replaced. The registry has to be told: see the end of this page.`;
