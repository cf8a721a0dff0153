import type { Tx } from './as-actor.ts';

/**
 * For statements that compare what has just arrived with what is there. The planner has not counted new rows yet, expects one where there are
 * hundreds of thousands and would join them row by row, each against all of a site; joins by hash or by merging take no longer than reading both.
 * Where nothing but a loop can be used the planner then expects it to cost so much that it would compile the statement first, for seconds.
 */
export const joinWholeTables = (tx: Tx): Promise<unknown> =>
  tx.query("select set_config('enable_nestloop', 'off', true), set_config('jit', 'off', true)");
