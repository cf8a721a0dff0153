import { RuleReport } from './checking/rule.ts';
import { Submission } from './checking/submission.ts';
import { FindingLog } from './finding-log.ts';
import type { RegistryContext, TypedTables } from './registry-context.ts';
import { cellRules, submissionRules } from './rules/index.ts';

/**
 * Checks the tables of one submission row by row, against each other and against what the registry holds of the site.
 * Where a file could not be read to its end, only single cells are checked: against rows that are missing, all others
 * would look wrong.
 *
 * @param tables What was read from the files, by table; a table without a file is left out.
 * @param context What the registry holds for the participants that occur in the files.
 * @param findings The log that reading the files has already written to; a new one when left out.
 */
export function checkSubmission(tables: TypedTables, context: RegistryContext, findings = new FindingLog()): FindingLog {
  for (const _ of checkSteps(tables, context, findings));
  return findings;
}

/** The same one rule after the other, for callers that do something else in between. Each step says how many of how many rules are through. */
export function* checkSteps(
  tables: TypedTables,
  context: RegistryContext,
  findings: FindingLog,
): Generator<{ readonly done: number; readonly of: number }> {
  const submission = new Submission(tables, context);
  const rules = findings.incomplete.size > 0 ? cellRules : submissionRules;
  for (const [index, { id, evaluate }] of rules.entries()) {
    evaluate(submission, new RuleReport(id, findings));
    yield { done: index + 1, of: rules.length };
  }
}
