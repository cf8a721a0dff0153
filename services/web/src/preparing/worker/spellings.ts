import { passphraseWords } from '@cairnstep/deidentification';

/**
 * Ways in which a passphrase may have been meant, as typed first. Drawn words are one thing however they are spaced and capitalised: a
 * telephone begins them with a capital letter, and one from a list pasted brings a line break.
 */
export function spellingsOf(typed: string): string[] {
  const spaced = typed.trim().replace(/\s+/g, ' ');
  const small = spaced.toLowerCase();
  const drawn = new Set(passphraseWords());
  const isDrawn = small.split(' ').every((word) => drawn.has(word));
  return [...new Set([typed, spaced, ...(isDrawn ? [small] : [])])];
}
