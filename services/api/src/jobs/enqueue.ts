/** Jobs are written in the caller's transaction: they exist exactly when what caused them does. */
import PgBoss from 'pg-boss';
import type { Tx } from '../database/as-actor.ts';
import { bell } from './bell.ts';
import type { Payloads, QueueName } from './queues.ts';

/** Never started: it only composes the insert that `executeSql` of the caller's transaction runs. */
const composer = new PgBoss({ db: { executeSql: () => Promise.reject(new Error('Jobs are sent inside a transaction.')) } });

export async function enqueue<Name extends QueueName>(tx: Tx, queue: Name, payload: Payloads[Name]): Promise<void> {
  const executeSql = async (text: string, values: unknown[]): Promise<{ rows: unknown[] }> => {
    const rows: unknown = await tx.query(text, values);
    return { rows: Array.isArray(rows) ? rows : [] };
  };
  const id = await composer.send(queue, payload, { db: { executeSql } });
  if (id === null) throw new Error(`The queue ${queue} does not exist.`);
  await tx.query('select pg_notify($1, $2)', [bell, queue]);
}
