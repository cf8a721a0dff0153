import type { TableKey } from '@cairnstep/dictionary';
import type { PreparationProblem, ProblemKind } from './month.ts';

/** Lines that are kept for each problem; the rest are counted. */
const linesKept = 50;

export interface ProblemPlace {
  readonly table: TableKey;
  readonly columnNumber?: number;
  readonly variable?: string;
  readonly line?: number;
}

/** Gathers problems: one for each kind, column and message, with its lines. */
export class ProblemLog {
  private readonly gathered = new Map<string, { problem: PreparationProblem; lines: number[]; count: number }>();

  add(kind: ProblemKind, { table, columnNumber, variable, line }: ProblemPlace, message: string): void {
    const key = [kind, table, columnNumber, variable, message].join('\u0000');
    let entry = this.gathered.get(key);
    if (entry === undefined) {
      const lines: number[] = [];
      const problem = { kind, table, columnNumber: columnNumber ?? null, variable: variable ?? null, lines, count: 0, message };
      entry = { problem, lines, count: 0 };
      this.gathered.set(key, entry);
    }
    if (line === undefined) return;
    entry.count += 1;
    if (entry.lines.length < linesKept) entry.lines.push(line);
  }

  problems(): PreparationProblem[] {
    return [...this.gathered.values()].map(({ problem, count }) => ({ ...problem, count }));
  }
}
