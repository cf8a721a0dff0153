import type { TypedColumn } from '../table/typed-table.ts';
import type { CheckedTable } from './checked-table.ts';

/** The columns that say what each joint followed in a bout. */
export function jointControls(bouts: CheckedTable, joints: readonly string[] = ['hip', 'knee', 'ankle']): readonly TypedColumn[] {
  return joints.flatMap((joint) => ['r', 'l'].map((side) => bouts.column(`${joint}_${side}_control`)));
}
