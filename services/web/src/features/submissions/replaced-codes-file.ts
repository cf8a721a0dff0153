/** The file that the edition without the server saves when codes were replaced: `from,to`, then two participant codes a line. */
import { CodePairs, mostReplacedCodes } from '@cairnstep/contract';
import type { ReplacedCodes } from '../../preparing/messages.ts';

/** A full batch with Windows line ends, and some air. */
export const largestReplacedCodesFile = mostReplacedCodes * 50;

const header = 'from,to';
const notTheFile = 'This is not the file of replaced codes, whose first line is “from,to”';

/** Pairs in their order, or why there are none: by line, never with what stands there. */
export type ReadCodes = { readonly codes: ReplacedCodes } | { readonly fault: string };

export function readReplacedCodes(text: string): ReadCodes {
  const [first, ...lines] = text
    .replace(/^\uFEFF/, '')
    .replace(/(\r?\n)+$/, '')
    .split(/\r?\n/);
  if (first !== header) return { fault: `${notTheFile}.` };
  const pairs = lines.map((line) => line.split(','));
  const wrong = pairs.findIndex(({ length }) => length !== 2);
  if (wrong >= 0) return { fault: `Line ${wrong + 2} does not hold two codes with a comma between them.` };
  const parsed = CodePairs.safeParse(pairs.map(([from, to]) => ({ from, to })));
  if (parsed.success) return { codes: parsed.data };
  const [issue] = parsed.error.issues;
  const pair = issue?.path[0];
  return {
    fault: typeof pair === 'number' ? `Line ${pair + 2} holds something other than participant codes.` : `${issue?.message ?? notTheFile}.`,
  };
}
