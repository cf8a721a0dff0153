/** What is to be done with each column of one file, once its matches have been looked over. */
import type { Variable } from '@cairnstep/dictionary';
import type { DateFormat } from '../dates/date-format.ts';
import { fittingFormats } from '../dates/fitting-formats.ts';
import { valueCleaner } from './clean-value.ts';
import type { ValueCleaner } from './clean-value.ts';
import type { ColumnMatch } from './column-match.ts';
import type { DroppedColumn, RawTable } from './month.ts';
import type { ProblemLog } from './problem-log.ts';
import type { ResolvedMatch } from './resolve-matches.ts';

export interface ValueColumn {
  readonly position: number;
  readonly variable: Variable;
  readonly clean: ValueCleaner;
}

export interface DateColumn {
  readonly position: number;
  readonly format: DateFormat;
}

export interface DayColumn extends DateColumn {
  readonly variable: Variable;
}

export interface TablePlan {
  readonly raw: RawTable;
  /** Position of the record numbers; null when nobody said where they are. */
  readonly participant: number | null;
  readonly values: readonly ValueColumn[];
  readonly days: readonly DayColumn[];
  readonly birthDate: DateColumn | undefined;
  readonly injuryDate: DateColumn | undefined;
  readonly indexDate: DateColumn | undefined;
  /** Whether rows can be prepared: everything that a row must have is known. */
  readonly isReady: boolean;
  readonly dropped: readonly DroppedColumn[];
}

/** @param withheld positions of columns that seem to identify people */
export function planTable(raw: RawTable, resolved: readonly ResolvedMatch[], withheld: ReadonlySet<number>, log: ProblemLog): TablePlan {
  const { table, decimalMark = '.' } = raw;
  let isReady = true;

  function dateColumn(as: ColumnMatch['as']): DateColumn | undefined {
    const found = resolved.find(({ match }) => match.as === as);
    return found && withFormat(found);
  }

  function withFormat({ match, position }: ResolvedMatch): DateColumn | undefined {
    const cells = raw.rows.map((row) => row[position] ?? '');
    // How nothing is written needs no answer.
    if (cells.every((cell) => cell.trim() === '')) return { position, format: 'iso' };
    const stated = 'dateFormat' in match ? match.dateFormat : undefined;
    const format = stated ?? onlyFormat(cells);
    if (format !== undefined) return { position, format };
    log.add('ambiguous-date-format', { table, columnNumber: position + 1 }, 'Say how the dates of this column are written.');
    isReady = false;
    return undefined;
  }

  const values = resolved.flatMap(({ match, position, variable }): ValueColumn[] => {
    if (match.as !== 'value' || variable === undefined) return [];
    if (!withheld.has(position)) return [{ position, variable, clean: valueCleaner(variable, { ...match, decimalMark }) }];
    const place = { table, columnNumber: position + 1, variable: variable.key };
    log.add('identifiers-in-column', place, 'The cells of this column seem to identify people. The column stays behind.');
    return [];
  });
  const days = resolved.flatMap((each): DayColumn[] => {
    const column = each.match.as === 'study-day' ? withFormat(each) : undefined;
    return column && each.variable ? [{ ...column, variable: each.variable }] : [];
  });
  const participant = resolved.find(({ match }) => match.as === 'participant')?.position ?? null;
  if (participant === null) {
    isReady = false;
    log.add('no-participant-column', { table }, 'Say which column holds the record number of the participant.');
  }
  const birthDate = dateColumn('birth-date');
  const injuryDate = dateColumn('injury-date');
  const indexDate = dateColumn('index-date');
  return {
    raw,
    participant,
    values,
    days,
    birthDate,
    injuryDate,
    indexDate,
    isReady,
    dropped: droppedColumns(raw, resolved, values),
  };
}

function onlyFormat(cells: readonly string[]): DateFormat | undefined {
  const fitting = fittingFormats(cells);
  return fitting.length === 1 ? fitting[0] : undefined;
}

function droppedColumns({ table, headers }: RawTable, resolved: readonly ResolvedMatch[], values: readonly ValueColumn[]): DroppedColumn[] {
  return headers.flatMap((_, position): DroppedColumn[] => {
    const found = resolved.find((each) => each.position === position);
    const dropped = { table, columnNumber: position + 1 };
    if (found === undefined) return [{ ...dropped, reason: 'not-in-the-dictionary' }];
    if (found.match.as === 'left-out') return [{ ...dropped, reason: 'left-out' }];
    const isWithheld = found.match.as === 'value' && !values.some((value) => value.position === position);
    return isWithheld ? [{ ...dropped, reason: 'holds-identifiers' }] : [];
  });
}
