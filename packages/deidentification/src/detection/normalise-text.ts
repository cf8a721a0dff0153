/** Zero-width and soft characters, marks of direction, selectors and controls; blanks and line ends are none of them. */
const invisible = /[\p{Cf}\ufe00-\ufe0f]|(?!\s)\p{Cc}/gu;
/** Whole words in one character, up to eighteen long when spelt out: a cell of them would swell, and no identifier has one. */
const wordLigatures = /[\ufdf0-\ufdfd]/g;
const dashes = /[\p{Pd}\u2212]/gu;

/** The text as detectors read it: compatibility forms plain, nothing invisible, every dash a hyphen, single blanks, trimmed. */
export function normaliseText(text: string): string {
  return text.replace(wordLigatures, ' ').normalize('NFKC').replace(invisible, '').replace(dashes, '-').replace(/\s+/g, ' ').trim();
}
