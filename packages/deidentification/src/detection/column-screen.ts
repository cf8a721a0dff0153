import type { Variable } from '@cairnstep/dictionary';
import { detectCell } from './cells/detect-cell.ts';
import { ColumnStatistics } from './column-statistics.ts';
import { columnTraits } from './column-traits.ts';
import type { ColumnTraits } from './column-traits.ts';
import { declaredCells, roleOf } from './declared-column.ts';
import type { ColumnRole } from './detection-context.ts';
import { headerHits } from './header-rules.ts';
import type { Hit } from './hit.ts';
import type { IdentifierFinding } from './identifier-finding.ts';
import { hitsInHeader, showableHeader } from './showable-header.ts';

/** How one column is screened. */
export interface ScreenedColumn {
  readonly header: string;
  readonly number: number;
  readonly table: string | null;
  readonly role: ColumnRole;
  /** The variable the header is the key of, in a table of the dictionary. */
  readonly variable?: Variable | undefined;
  /** Marked as safe by a steward. */
  readonly isSafeHeader: boolean;
}

/** Short texts that were met before are not read again; so many are remembered. */
const mostRemembered = 2_000;
const longestRemembered = 100;
const nothing: readonly Hit[] = [];

/** Screens one column, cell by cell, in memory that does not grow with it. */
export class ColumnScreen {
  private readonly traits: ColumnTraits;
  private readonly isAllowed: (cell: string) => boolean;
  private readonly statistics: ColumnStatistics;
  private readonly known = new Map<string, readonly Hit[]>();
  private readonly counts = new Map<string, { readonly hit: Hit; count: number; line: number | null }>();
  private readonly shownHeader: string | null;

  constructor(private readonly column: ScreenedColumn) {
    const { header, variable, role, isSafeHeader } = column;
    this.traits = columnTraits(header, variable === undefined ? role : roleOf(variable));
    this.isAllowed = variable === undefined ? () => false : declaredCells(variable);
    this.statistics = new ColumnStatistics(this.traits);
    const isTrusted = variable !== undefined || isSafeHeader;
    this.shownHeader = isTrusted ? header : showableHeader(header);
    if (!isTrusted) for (const hit of [...headerHits(header), ...hitsInHeader(header)]) this.count(hit, 0, null);
  }

  add(cell: string, line: number): void {
    if (cell === '' || this.isAllowed(cell)) return;
    const isJudgedOverall = this.statistics.add(cell, line);
    for (const hit of this.hitsOf(cell)) if (!(isJudgedOverall && hit.class === 'national_id')) this.count(hit, 1, line);
  }

  private hitsOf(cell: string): readonly Hit[] {
    const known = this.known.get(cell);
    if (known !== undefined) return known;
    const found = detectCell(cell, this.traits);
    const hits = found.length === 0 ? nothing : found;
    if (cell.length <= longestRemembered && this.known.size < mostRemembered) this.known.set(cell, hits);
    return hits;
  }

  private count(hit: Hit, count: number, line: number | null): void {
    const key = `${hit.class}:${hit.strength}`;
    const before = this.counts.get(key);
    if (before === undefined) this.counts.set(key, { hit, count, line });
    else {
      before.count += count;
      before.line ??= line;
    }
  }

  findings(): IdentifierFinding[] {
    const { table, number } = this.column;
    const place = { table, columnNumber: number, column: this.shownHeader };
    const all = new Map(this.counts);
    for (const { count, line, ...hit } of this.statistics.hits()) {
      const key = `${hit.class}:${hit.strength}`;
      const before = all.get(key);
      all.set(key, { hit, count: (before?.count ?? 0) + count, line: before?.line ?? line });
    }
    return [...all.values()].map(({ hit, count, line }) => ({ ...hit, ...place, line, count }));
  }
}
