/**
 * Who is at work. While a worker has a job it holds an advisory lock, which PostgreSQL gives back when the worker's connection ends, however
 * it ends. A job under way that nobody holds has lost its worker: it goes back to the queue at once, not only when its time has run out.
 */
import pg from 'pg';
import type PgBoss from 'pg-boss';
import { queues, type QueueName } from './queues.ts';

/** First keys of the advisory locks: one lock per job under way, one for whoever looks for lost jobs. Any numbers that nothing else uses. */
const jobLock = 7_306_116;
const takeBackLock = 7_306_117;

/** A job is taken from its queue a moment before it is held; a worker busy with another one may be late with it. */
const heldWithin = '3 seconds';

const lostJobs = `select name, id from pgboss.job j
  where name = any($1) and state = 'active' and started_on < now() - interval '${heldWithin}' and not exists (
    select from pg_locks l where l.locktype = 'advisory' and l.granted and l.objsubid = 2 and l.classid = ${jobLock}::oid
      and l.objid = hashtext(j.id::text)::oid and l.database = (select oid from pg_database where datname = current_database()))`;

export interface Leases {
  /** Holds a job while the work is done. Each holds a connection of its own. */
  hold(job: string, work: () => Promise<void>): Promise<void>;
  /** Puts lost jobs back into their queues, as failed attempts, and says how many there were. */
  takeBack(boss: PgBoss): Promise<number>;
  close(): Promise<void>;
}

export function makeLeases(url: string): Leases {
  const pool = new pg.Pool({ connectionString: url, connectionTimeoutMillis: 5_000 });
  // A lost connection shows at the next statement; without a listener it would end the process.
  const ignore = (): void => undefined;
  pool.on('error', ignore);

  async function withConnection<T>(work: (client: pg.PoolClient) => Promise<T>): Promise<T> {
    const client = await pool.connect();
    client.on('error', ignore);
    let sound = false;
    try {
      const result = await work(client);
      sound = true;
      return result;
    } finally {
      client.off('error', ignore);
      // Ending a connection gives back what it held.
      client.release(!sound);
    }
  }

  return {
    hold: (job, work) =>
      withConnection(async (client) => {
        await client.query('select pg_advisory_lock($1, hashtext($2))', [jobLock, job]);
        await work();
        await client.query('select pg_advisory_unlock($1, hashtext($2))', [jobLock, job]);
      }),
    takeBack: (boss) =>
      withConnection(async (client) => {
        await client.query('begin');
        // One worker looks at a time: a job put back and taken up again would seem lost to the next.
        const { rows: turn } = await client.query<{ mine: boolean }>('select pg_try_advisory_xact_lock($1) as mine', [takeBackLock]);
        const { rows: lost } = turn[0]?.mine ? await client.query<{ name: QueueName; id: string }>(lostJobs, [queues]) : { rows: [] };
        const executeSql = (text: string, values: unknown[]) => client.query(text, values);
        for (const { name, id } of lost) await boss.fail(name, id, { message: 'the worker was lost' }, { db: { executeSql } });
        await client.query('commit');
        return lost.length;
      }),
    close: () => pool.end(),
  };
}
