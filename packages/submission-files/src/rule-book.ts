import { rules } from '@cairnstep/dictionary';
import { fileRules } from './file-rules.ts';
import type { RuleText } from './finding.ts';

/** The text of every rule that a submission can break: the dictionary's and those about files. */
const book: ReadonlyMap<string, RuleText> = new Map(
  [...rules, ...fileRules].map(({ id, severity, statement, why, mend }) => [id, { id, severity, statement, why, mend }]),
);

/** @throws RangeError when no rule has this id. */
export function ruleText(id: string): RuleText {
  const text = book.get(id);
  if (!text) throw new RangeError(`there is no rule ${id}`);
  return text;
}
