/** The encrypted part of a key file as JSON, and back. */
import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { dateFormats } from '../dates/date-format.ts';
import type { DateFormat } from '../dates/date-format.ts';
import type { ColumnMatch } from '../preparation/column-match.ts';
import { fromBase64, toBase64 } from './base64.ts';
import { canonicalJson } from './canonical-json.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';
import type { KeyGeneration, KnownPerson, SiteKey } from './site-key.ts';

const generationContent = ({ secret, codes, replacedBy }: KeyGeneration) => ({
  secret: toBase64(secret),
  codes: [...codes],
  replacedBy: [...replacedBy],
});

export function contentOf(key: SiteKey): string {
  const { revision, mode, idType, normalisation, generations, people, matches, idLengths } = key;
  const [current, ...earlier] = generations;
  return canonicalJson({
    ...generationContent(current),
    revision,
    mode,
    idType,
    normalisation,
    people: [...people],
    matches: [...matches],
    idLengths: [...idLengths],
    earlier: earlier.map((generation) => ({ keyId: generation.keyId, ...generationContent(generation) })),
  });
}

type Fields = Readonly<Record<string, unknown>>;

function refuse(): never {
  throw new KeyFileRefusal('not-a-key-file');
}

const fields = (value: unknown): Fields =>
  typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Fields) : refuse();
const text = (value: unknown): string => (typeof value === 'string' ? value : refuse());
const flag = (value: unknown): boolean => (typeof value === 'boolean' ? value : refuse());
const count = (value: unknown): number => (Number.isSafeInteger(value) && Number(value) >= 0 ? Number(value) : refuse());
const list = <T>(value: unknown, read: (each: unknown) => T): T[] => (Array.isArray(value) ? value.map(read) : refuse());

/** A list of pairs; a part that is missing is empty. */
function pairs<K, V>(value: unknown, readKey: (each: unknown) => K, readValue: (each: unknown) => V): Map<K, V> {
  return new Map(
    list(value ?? [], (pair): [K, V] => {
      const [key, held] = list(pair, (each) => each);
      return [readKey(key), readValue(held)];
    }),
  );
}

function oneOf<T extends string>(value: unknown, known: readonly T[]): T {
  return known.find((each) => each === value) ?? refuse();
}

function columnMatch(value: unknown): ColumnMatch {
  const match = fields(value);
  const header = text(match['header']);
  const as = oneOf(match['as'], ['participant', 'value', 'birth-date', 'injury-date', 'index-date', 'study-day', 'left-out']);
  const dateFormat = match['dateFormat'] === undefined ? {} : { dateFormat: oneOf<DateFormat>(match['dateFormat'], dateFormats) };
  switch (as) {
    case 'participant':
    case 'left-out':
      return { header, as };
    case 'study-day':
      return { header, as, variable: text(match['variable']), ...dateFormat };
    case 'value': {
      const unit = match['unit'] === undefined ? {} : { unit: text(match['unit']) };
      const codes =
        match['codes'] === undefined
          ? {}
          : { codes: Object.fromEntries(Object.entries(fields(match['codes'])).map(([word, code]) => [word, text(code)])) };
      return { header, as, variable: text(match['variable']), ...unit, ...codes };
    }
    default:
      return { header, as, ...dateFormat };
  }
}

function person(value: unknown): KnownPerson {
  const { indexDate, age, lastDay } = fields(value);
  if (lastDay !== undefined && !Number.isSafeInteger(lastDay)) refuse();
  return {
    ...(indexDate === undefined ? {} : { indexDate: text(indexDate) }),
    ...(age === undefined ? {} : { age: count(age) }),
    ...(lastDay === undefined ? {} : { lastDay: Number(lastDay) }),
  };
}

function generation(content: Fields, keyId: string): KeyGeneration {
  return {
    keyId,
    secret: fromBase64(text(content['secret'])),
    codes: pairs(content['codes'], text, text),
    replacedBy: pairs(content['replacedBy'], text, text),
  };
}

/**
 * The key that a content describes. Parts that are missing are empty; a content of nothing but a secret and a normalisation is that of a
 * site whose codes follow from its record numbers.
 *
 * @throws KeyFileRefusal when the content is none that this version writes
 */
export function keyFromContent(content: string, site: string, keyId: string): SiteKey {
  try {
    const parsed = fields(JSON.parse(content));
    const { stripSeparators, upper, stripLeadingZeros } = fields(parsed['normalisation']);
    return {
      site,
      revision: count(parsed['revision'] ?? 0),
      mode: oneOf(parsed['mode'] ?? 'hmac', ['random', 'hmac']),
      idType: text(parsed['idType'] ?? 'mrn'),
      normalisation: { stripSeparators: flag(stripSeparators), upper: flag(upper), stripLeadingZeros: flag(stripLeadingZeros) },
      generations: [
        generation(parsed, keyId),
        ...list(parsed['earlier'] ?? [], (each) => generation(fields(each), text(fields(each)['keyId']))),
      ],
      people: pairs(parsed['people'], text, person),
      matches: pairs(
        parsed['matches'],
        (table) => oneOf<TableKey>(table, tableKeys),
        (matches) => list(matches, columnMatch),
      ),
      idLengths: pairs(parsed['idLengths'], count, count),
    };
  } catch {
    throw new KeyFileRefusal('not-a-key-file');
  }
}
