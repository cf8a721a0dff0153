/** Formulae are plain text in which `_` lowers and `^` raises the letters or the number that follow, or what braces hold. */

export interface Piece {
  readonly text: string;
  readonly place: 'line' | 'below' | 'above';
}

const offLine = /([_^])(?:\{([^{}]+)\}|(\d+(?:\.\d+)?|[A-Za-z]+))/g;

/** A line of a formula, cut where it leaves the line. */
export function typeset(line: string): readonly Piece[] {
  const pieces: Piece[] = [];
  let end = 0;
  for (const { 0: marked, 1: mark, 2: braced, 3: bare, index } of line.matchAll(offLine)) {
    if (index > end) pieces.push({ text: line.slice(end, index), place: 'line' });
    pieces.push({ text: braced ?? bare ?? '', place: mark === '_' ? 'below' : 'above' });
    end = index + marked.length;
  }
  if (end < line.length) pieces.push({ text: line.slice(end), place: 'line' });
  return pieces;
}

const symbols: readonly { readonly mark: RegExp; readonly meaning: string }[] = [
  { mark: /\u0304|ȳ|Ū/u, meaning: 'A bar: the mean.' },
  { mark: /Σ/, meaning: 'Σ: the sum, over people, groups or cells.' },
  { mark: /Π/, meaning: 'Π: the product.' },
  { mark: /(?<![A-Za-z])t\(/, meaning: 't(p, v): quantile of Student’s t distribution with v degrees of freedom.' },
  { mark: /[±∓] ?z/, meaning: 'z: quantile of the normal distribution, 1.96 for 95%.' },
  { mark: /P\(/, meaning: 'P(…): probability.' },
  { mark: /Σ\(t\^3/, meaning: 't in Σ(t³ − t): how many values share one rank.' },
  { mark: /Γ/, meaning: 'Γ: the gamma function.' },
  { mark: /⌊/, meaning: '⌊h⌋: the largest whole number not above h.' },
  { mark: /MS[BW]|SS[BTW]/, meaning: 'SS and MS: sum of squares and mean square; B between groups, W within, T in all.' },
  { mark: /′/, meaning: 'X′: X transposed.' },
];

/** What the signs of a formula stand for, those that occur. */
export function symbolMeanings(lines: readonly string[]): readonly string[] {
  return symbols.filter(({ mark }) => lines.some((line) => mark.test(line))).map(({ meaning }) => meaning);
}
