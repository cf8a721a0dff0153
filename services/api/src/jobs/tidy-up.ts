/** Removes what has had its day: ended browser sessions and files of given-up submissions. */
import { registry } from '../authority/actor.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';

export async function tidyUp({ database }: Context): Promise<void> {
  await asActor(database, registry, async (tx) => {
    await tx.query('select prune_web_sessions()');
  });
}
