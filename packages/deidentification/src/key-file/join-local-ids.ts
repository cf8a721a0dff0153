import { CodeBook } from './code-book.ts';
import type { KeyChange } from './rotate-key.ts';
import type { SiteKey } from './site-key.ts';

/**
 * Two record numbers of one person: both lead to the code of the first from now on. The earlier first training day counts; where it
 * changes, the person's rows have to be sent again.
 *
 * @param kept normalised record number whose code stays
 * @param joined normalised record number that is led there
 */
export async function joinLocalIds(key: SiteKey, kept: string, joined: string): Promise<KeyChange> {
  const book = await CodeBook.open(key);
  const { code } = await book.codeOf(kept);
  await book.join(joined, code);
  return { key: book.close(), replaced: book.replacedCodes };
}
