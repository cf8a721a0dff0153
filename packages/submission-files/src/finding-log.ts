import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import type { Finding, RuleFindings } from './finding.ts';
import { ruleText } from './rule-book.ts';

/** A finding as a rule reports it; severity and the usual mend come with the rule. */
export interface Report {
  readonly rule: string;
  readonly table: TableKey | null;
  readonly line: number | null;
  readonly column: string | null;
  readonly found: string;
  /** Only where this case is mended otherwise than the rule's text says. */
  readonly mend?: string;
}

/**
 * Findings kept for reading. Counts are exact beyond these limits: a wrong unit in a whole column gives as many
 * findings as rows, of which nobody reads more than the first, and a hostile file must not fill the memory.
 */
export interface KeptFindings {
  readonly perRule: number;
  readonly inAll: number;
}

const defaultKept: KeptFindings = { perRule: 50_000, inAll: 200_000 };

/** Collects the findings of a submission, from reading its files to checking them against each other. */
export class FindingLog {
  private readonly rules = new Map<string, { count: number; kept: Finding[] }>();
  private readonly stopped = new Set<TableKey>();
  private keptInAll = 0;
  private errors = 0;
  private warnings = 0;

  constructor(private readonly limits: KeptFindings = defaultKept) {}

  /** @throws RangeError when no rule has this id. */
  add(report: Report): void {
    const { severity, mend } = ruleText(report.rule);
    if (severity === 'error') this.errors += 1;
    else this.warnings += 1;
    let entry = this.rules.get(report.rule);
    if (!entry) this.rules.set(report.rule, (entry = { count: 0, kept: [] }));
    entry.count += 1;
    if (entry.kept.length >= this.limits.perRule || this.keptInAll >= this.limits.inAll) return;
    this.keptInAll += 1;
    entry.kept.push({
      rule: report.rule,
      severity,
      table: report.table,
      line: report.line,
      column: report.column,
      found: report.found,
      mend: report.mend ?? mend,
    });
  }

  /** Adds a finding that ended the reading of a file before its end; of a whole workbook: of all tables. */
  addStopping(report: Report): void {
    for (const table of report.table === null ? tableKeys : [report.table]) this.stopped.add(table);
    this.add(report);
  }

  /** Tables whose file could not be read to its end. */
  get incomplete(): ReadonlySet<TableKey> {
    return this.stopped;
  }

  /** Findings of one rule so far, kept or not. */
  count(rule: string): number {
    return this.rules.get(rule)?.count ?? 0;
  }

  /** Exact numbers, kept or not. */
  get counts(): { readonly errors: number; readonly warnings: number } {
    return { errors: this.errors, warnings: this.warnings };
  }

  /** By rule: errors before warnings, then by id. Within a rule by table and line; findings about a whole file come first. */
  byRule(): RuleFindings[] {
    return [...this.rules]
      .map(([id, { count, kept }]) => ({ ...ruleText(id), count, kept: [...kept].sort(byPlace) }))
      .sort((a, b) => a.severity.localeCompare(b.severity) || a.id.localeCompare(b.id));
  }
}

/** What is about a whole workbook comes first. */
const tableOrder = new Map<TableKey | null, number>([null, ...tableKeys].map((key, index) => [key, index]));

function byPlace(a: Finding, b: Finding): number {
  const byTable = (tableOrder.get(a.table) ?? 0) - (tableOrder.get(b.table) ?? 0);
  return byTable || (a.line ?? 0) - (b.line ?? 0) || (a.column ?? '').localeCompare(b.column ?? '');
}
