import { normaliseText } from './normalise-text.ts';

/** Headers are not looked at beyond this many characters; no column name is as long. */
const longestHeader = 200;

/**
 * The words of a header in lower case, without accents: split at camel case, digits, underscores and punctuation. Rules compare whole
 * words, never parts: `hip_flexion` holds no `ip`. The sign # stands for the word `no`.
 */
export function headerTokens(header: string): string[] {
  return normaliseText(header.slice(0, longestHeader))
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .replaceAll('#', ' no ')
    .replace(/['’]s\b/g, '')
    .replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2')
    .replace(/(\p{Lu})(\p{Lu}\p{Ll})/gu, '$1 $2')
    .replace(/(\p{L})(\p{N})/gu, '$1 $2')
    .replace(/(\p{N})(\p{L})/gu, '$1 $2')
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((token) => token !== '');
}
