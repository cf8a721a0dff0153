/** Escapes, character classes and counted repeats hold no unbounded repeat; what is left must not hold one either. */
const harmless = /\\.|\[(?:\\.|[^\]\\])*\]|\{\d+(?:,\d+)?\}|\(\?/gs;

/**
 * A regular expression whose every repeat has an upper limit, so that the work on a cell grows in proportion to its length.
 *
 * @throws RangeError when the source has a repeat without limit
 */
export function boundedPattern(source: string, flags = ''): RegExp {
  if (/[*+]|\{\d+,\}/.test(source.replace(harmless, ''))) throw new RangeError('a detector may not repeat without limit');
  return new RegExp(source, `${flags}gu`);
}
