import { Refusal, type LocatedIssue } from '../../http/refusal.ts';

export interface ReplacedCode {
  readonly from: string;
  readonly to: string;
}

/** A batch says of every code once what becomes of it, in one step: then the order of its pairs means nothing. */
export function requireClearPairs(codes: readonly ReplacedCode[]): void {
  const seen = new Set<string>();
  const froms = new Set(codes.map((pair) => pair.from));
  const issues: LocatedIssue[] = [];
  for (const [index, { from, to }] of codes.entries()) {
    const tell = (part: 'from' | 'to', detail: string) => issues.push({ pointer: `/body/codes/${index}/${part}`, detail });
    if (from === to) tell('to', 'The new code is the old one.');
    else if (froms.has(to)) tell('to', 'The new code is replaced itself in this batch. Send each code with the one it finally gets.');
    if (seen.has(from)) tell('from', 'The code is replaced twice in this batch.');
    seen.add(from);
  }
  if (issues.length > 0)
    throw new Refusal('invalid-input', 'Nothing was changed. Mend what is listed and send the whole batch again.', issues);
}
