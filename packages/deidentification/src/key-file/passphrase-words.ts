import { wordSet } from '../word-set.ts';

/**
 * 7,776 words (6⁵) for passphrases, built by rule: consonant, vowel, consonant, vowel. No two are alike in four letters because a word
 * has no more, all are written in lower case, and none has a letter that is spoken or spelt in two ways (c, q, x).
 */
const consonants = 'bdfghjklmnprstvwyz';
const vowels = 'aeiou';
const words = 7_776;

/** Syllables said twice are nursery words in many languages, and some are rude. */
const isDoubled = (one: string, other: string): boolean => one === other;
/** Pairs that a voice on the telephone does not keep apart. */
const soundAlike = ['jy', 'yj', 'vw', 'wv'];
/** Slurs and rude words of several languages. */
const unwelcome = wordSet('bite foda fode homo hore jude kike nazi niga nigu paki puta pute puto rape');

/** The list, in alphabetical order. */
export function passphraseWords(): string[] {
  const syllables = [...consonants].flatMap((consonant) => [...vowels].map((vowel) => consonant + vowel));
  return syllables
    .flatMap((one) =>
      syllables
        .filter((other) => !isDoubled(one, other) && !soundAlike.includes(one.charAt(0) + other.charAt(0)))
        .map((other) => one + other),
    )
    .filter((word) => !unwelcome.has(word))
    .slice(0, words);
}
