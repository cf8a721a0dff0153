import { ruleOf } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import type { CheckedTable } from './checked-table.ts';
import type { Submission } from './submission.ts';

/** One check. Its text, limits and source stand in the dictionary (C, E, T, A, R) or in `fileRules` (F) under the same id. */
export interface Rule {
  readonly id: string;
  readonly evaluate: (submission: Submission, report: RuleReport) => void;
}

/** Takes the findings of one rule. Rows that come from the registry are passed over: they were judged when they arrived. */
export class RuleReport {
  constructor(
    private readonly rule: string,
    private readonly findings: FindingLog,
  ) {}

  /** @param column Column key, or null when the whole row is meant. */
  add(table: CheckedTable, row: number, column: string | null, found: string, mend?: string): void {
    if (!table.isInFile(row)) return;
    const place = { rule: this.rule, table: table.key, line: table.lineOf(row), column, found };
    this.findings.add(mend === undefined ? place : { ...place, mend });
  }

  /** For a contradiction between rows: told at the first of them that is in the file. */
  addToOneOf(table: CheckedTable, rows: readonly number[], column: string | null, found: string): void {
    const row = rows.find((candidate) => table.isInFile(candidate));
    if (row !== undefined) this.add(table, row, column, found);
  }
}

/**
 * A number that the dictionary sets for a rule.
 * @throws Error when the rule has no limit of this name.
 */
export function limitOf(rule: string, name: string): number {
  const limit = ruleOf(rule).limits?.[name];
  if (limit === undefined) throw new Error(`The rule ${rule} has no limit ${name}.`);
  return limit;
}
