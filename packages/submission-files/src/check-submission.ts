import { FindingLog } from './finding-log.ts';
import { RuleReport } from './checking/rule.ts';
import { Submission } from './checking/submission.ts';
import type { RegistryContext, TypedTables } from './registry-context.ts';
import { submissionRules } from './rules/index.ts';

/**
 * Checks the tables of one submission row by row, against each other and against what the registry holds of the site.
 *
 * @param tables What was read from the files, by table; a table without a file is left out.
 * @param context What the registry holds for the participants that occur in the files.
 * @param findings The log that reading the files has already written to; a new one when left out.
 */
export function checkSubmission(tables: TypedTables, context: RegistryContext, findings = new FindingLog()): FindingLog {
  const submission = new Submission(tables, context);
  for (const { id, evaluate } of submissionRules) evaluate(submission, new RuleReport(id, findings));
  return findings;
}
