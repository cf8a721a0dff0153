import type { IsoDate } from '../dates/date-format.ts';
import { normaliseLocalId } from '../pseudonyms/normalise-local-id.ts';
import { CodeBook } from './code-book.ts';
import type { KnownPerson, SiteKey } from './site-key.ts';

/** Somebody whose code the registry has already, made before the site had a key file. */
export interface PersonWithCode {
  /** Record number, as the clinic writes it. */
  readonly localId: string;
  readonly code: string;
  /** First training day. */
  readonly indexDate?: IsoDate;
  /** Age on that day. */
  readonly age?: number;
}

/** The key with people whose codes were made elsewhere: their next months arrive under the same codes. */
export async function adoptCodes(key: SiteKey, people: readonly PersonWithCode[]): Promise<SiteKey> {
  const book = await CodeBook.open(key);
  for (const { localId, code, indexDate, age } of people) {
    await book.join(normaliseLocalId(localId, key.normalisation), code);
    const facts: KnownPerson = { ...(indexDate === undefined ? {} : { indexDate }), ...(age === undefined ? {} : { age }) };
    book.remember(code, facts);
  }
  return book.close();
}
