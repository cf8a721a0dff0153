/** The table of a bench run. */
import type { Measured } from './scenario.ts';

export interface Row extends Measured {
  readonly name: string;
}

/** Three significant digits, without an exponent. */
const figure = (value: number): string => String(Number(value.toPrecision(3)));

export const missesGoal = ({ ours, goal }: Measured): boolean => goal !== undefined && ours > goal;

function cellsOf(row: Row): string[] {
  const { name, ours, peer, unit, peerName, goal } = row;
  const verdict = goal === undefined ? '' : `${figure(goal)} ${unit}${missesGoal(row) ? ', missed' : ''}`;
  return [name, `${figure(ours)} ${unit}`, `${figure(peer)} ${unit}`, figure(ours / peer), verdict, peerName];
}

/** One line a scenario; the ratio is ours divided by the peer's. Notes follow. */
export function benchTable(rows: readonly Row[]): string {
  const lines = [['scenario', 'ours', 'peer', 'ratio', 'goal', 'the peer'], ...rows.map(cellsOf)];
  const widths = lines[0]?.map((_, column) => Math.max(...lines.map((line) => line[column]?.length ?? 0))) ?? [];
  const table = lines.map((line) =>
    line
      .map((cell, column) => cell.padEnd(widths[column] ?? 0))
      .join('  ')
      .trimEnd(),
  );
  const notes = rows.flatMap(({ name, note }) => (note === undefined ? [] : [`${name}: ${note}`]));
  return [...table, ...(notes.length > 0 ? ['', ...notes] : [])].join('\n');
}
