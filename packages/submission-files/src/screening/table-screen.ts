/** Screens a table for what identifies a person while it is read: in the browser before it is sent, and again on the server. */
import { identifierClasses, IdentifierScreen, identifierWords, showableHeader } from '@cairnstep/deidentification';
import type { IdentifierFinding } from '@cairnstep/deidentification';
import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import { columnLetters } from '../table/header-row.ts';
import type { CellWatch } from '../table/table-options.ts';

/**
 * Only rows are screened in which a cell is not just what the dictionary allows in its column: a code of a list, a participant code of the
 * registry's form, or a number within hard limits identifies nobody beyond what the dictionary has weighed (ages end at 90, days are study days).
 */
export class TableScreen implements CellWatch {
  private screen: IdentifierScreen | null = null;
  private shown: readonly string[] = [];

  constructor(
    private readonly table: TableKey,
    /** Headers that a steward has marked as safe for this site. */
    private readonly safeHeaders: ReadonlySet<string>,
  ) {}

  header(names: readonly string[], shown: readonly string[]): void {
    this.shown = shown;
    this.screen = new IdentifierScreen(
      names.map((name) => name.trim()),
      { table: this.table, dictionaryTable: this.table, safeHeaders: this.safeHeaders },
    );
  }

  row(cells: readonly string[], line: number): void {
    this.screen?.row(cells, line);
  }

  mayShowHeader(header: string): boolean {
    return this.safeHeaders.has(header.trim()) || showableHeader(header) !== null;
  }

  /** Writes down what was found. True when the file must not be kept. */
  report(log: FindingLog): boolean {
    const found = this.screen?.findings() ?? [];
    for (const finding of found) {
      log.add({
        rule: finding.strength === 'block' ? 'F50' : 'F51',
        table: this.table,
        line: finding.line,
        column: this.shown[finding.columnNumber - 1] ?? columnLetters(finding.columnNumber - 1),
        found: wordsOf(finding),
      });
    }
    return found.some(({ strength }) => strength === 'block');
  }
}

/** What was found and how often, never the thing itself. */
function wordsOf({ class: name, strength, line, count }: IdentifierFinding): string {
  const paragraph = identifierClasses[name];
  const what = `${identifierWords[name]}${paragraph === null ? '' : ` (45 CFR 164.514(b)(2)(i), ${paragraph})`}`;
  const sure = strength === 'block' ? 'Holds' : 'May hold';
  if (count === 0) return `The header announces ${what}.`;
  const cells = count === 1 ? 'one cell' : `${count.toLocaleString('en')} cells`;
  return `${sure} ${what}, in ${cells} of this column${line !== null && count > 1 ? ', of which this is the first' : ''}.`;
}
