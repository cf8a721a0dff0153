/** Removes what has had its day: ended browser sessions and the staged rows of settled submissions. */
import { tableKeys } from '@cairnstep/dictionary';
import { registry } from '../authority/actor.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';

export async function tidyUp({ database }: Context): Promise<void> {
  await asActor(database, registry, async (tx) => {
    await tx.query('select prune_web_sessions()');
    for (const table of tableKeys) {
      await tx.query(
        `delete from staged_${table} s using submissions m where m.id = s.submission_id and m.status in ('accepted', 'superseded', 'discarded')`,
      );
    }
  });
}
