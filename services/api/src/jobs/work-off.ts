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
  /** Looks at a queue now. */
  wake(queue: string): void;
  /** Takes no more jobs and resolves when those under way are done. */
  stop(): Promise<void>;
}

export function workOff(boss: PgBoss, leases: Leases, work: Work, log: Logger): WorkingOff {
  const stopping = new AbortController();
  const wakes = new Map<string, AbortController>();
  /** Rung for while they were being looked at: perhaps a moment too early. */
  const rung = new Set<string>();
  const pause = async (ms: number, name: string): Promise<void> => {
    if (rung.delete(name)) return;
    const wake = new AbortController();
    wakes.set(name, wake);
    await wait(ms, undefined, { signal: AbortSignal.any([stopping.signal, wake.signal]) }).catch(() => undefined);
    wakes.delete(name);
  };

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
  async function untilStopped(name: string, everyMs: number, step: () => Promise<'again' | 'pause'>): Promise<void> {
    while (!stopping.signal.aborted) {
      const next = await step().catch((error: unknown) => {
        log.error(errorFacts(error), 'queue fault');
        return 'pause' as const;
      });
      if (next === 'pause') await pause(everyMs, name);
    }
  }

  const loops = queues.map((queue) =>
    untilStopped(queue, lookEveryMs, async () => {
      const [job] = await boss.fetch<object>(queue);
      if (!job) return 'pause';
      await leases.hold(job.id, () => doJob(queue, job));
      return 'again';
    }),
  );
  loops.push(
    untilStopped('lost jobs', takeBackEveryMs, async () => {
      const lost = await leases.takeBack(boss);
      if (lost > 0) log.warn({ lost }, 'took back jobs of a lost worker');
      return 'pause';
    }),
  );
  return {
    wake: (queue) => {
      const sleeping = wakes.get(queue);
      if (sleeping) sleeping.abort();
      else rung.add(queue);
    },
    stop: async () => {
      stopping.abort();
      await Promise.all(loops);
    },
  };
}
