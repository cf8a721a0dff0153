import type { Variable } from '@cairnstep/dictionary';

/** The header of a column in the template: its name, with the unit that its numbers are in. */
export function templateHeader({ name, unit, measuredBy }: Variable): string {
  return unit === undefined || measuredBy ? name : `${name} (${unit})`;
}
