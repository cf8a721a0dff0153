import type { ReplacedCode } from '@cairnstep/deidentification';

/** Replacements one after the other as one: a code that was replaced twice leads straight to the last one. */
export function chainCodes(earlier: readonly ReplacedCode[], later: readonly ReplacedCode[]): ReplacedCode[] {
  const next = new Map(later.map(({ from, to }) => [from, to]));
  const led = earlier.map(({ from, to }) => ({ from, to: next.get(to) ?? to }));
  return [...led, ...later].filter(({ from, to }) => from !== to);
}
