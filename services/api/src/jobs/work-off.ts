/** Works off the queues: one job of each at a time, held while it is worked on, completed or failed before it is let go. */
import { setTimeout as wait } from 'node:timers/promises';
import type { Logger } from 'pino';
import type PgBoss from 'pg-boss';
import { errorFacts } from '../http/log.ts';
import type { Leases } from './leases.ts';
import { queues, type Payloads, type QueueName } from './queues.ts';

export type Work = { readonly [Name in QueueName]: (payload: Payloads[Name]) => Promise<void> };

const lookEveryMs = 500;
const takeBackEveryMs = 2_000;

export interface WorkingOff {
  /** Takes no more jobs and resolves when those under way are done. */
  stop(): Promise<void>;
}

export function workOff(boss: PgBoss, leases: Leases, work: Work, log: Logger): WorkingOff {
  const stopping = new AbortController();
  const pause = (ms: number): Promise<void> => wait(ms, undefined, { signal: stopping.signal }).catch(() => undefined);

  async function doJob(queue: QueueName, job: PgBoss.Job<object>): Promise<void> {
    try {
      await (work[queue] as (payload: object) => Promise<void>)(job.data);
    } catch (error) {
      log.error({ ...errorFacts(error), queue, job: job.id }, 'job failed');
      // The queue keeps what it is told; only the kind of an error may be kept, for its words may quote a participant's value.
      await boss.fail(queue, job.id, { message: errorFacts(error).kind });
      return;
    }
    await boss.complete(queue, job.id);
  }

  /** Goes on whatever happens: when the database is away, the queue is looked at again a moment later. */
  async function untilStopped(everyMs: number, step: () => Promise<'again' | 'pause'>): Promise<void> {
    while (!stopping.signal.aborted) {
      const next = await step().catch((error: unknown) => {
        log.error(errorFacts(error), 'queue fault');
        return 'pause' as const;
      });
      if (next === 'pause') await pause(everyMs);
    }
  }

  const loops = queues.map((queue) =>
    untilStopped(lookEveryMs, async () => {
      const [job] = await boss.fetch<object>(queue);
      if (!job) return 'pause';
      await leases.hold(job.id, () => doJob(queue, job));
      return 'again';
    }),
  );
  loops.push(
    untilStopped(takeBackEveryMs, async () => {
      const lost = await leases.takeBack(boss);
      if (lost > 0) log.warn({ lost }, 'took back jobs of a lost worker');
      return 'pause';
    }),
  );
  return {
    stop: async () => {
      stopping.abort();
      await Promise.all(loops);
    },
  };
}
