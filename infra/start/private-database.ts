/** The start's own cluster, kept running: a server that dies is started again on the port that everything knows. */
import { setTimeout as wait } from 'node:timers/promises';
import { startCluster } from '../database/cluster.ts';
import type { ClusterOptions } from '../database/cluster.ts';

export interface PrivateDatabase {
  readonly adminUrl: string;
  readonly port: number;
  stop(): Promise<void>;
}

const firstWait = 1000;
const longestWait = 30_000;

/** @param report told, in a sentence, about every unexpected end */
export async function startPrivateDatabase(options: ClusterOptions, report: (sentence: string) => void): Promise<PrivateDatabase> {
  let cluster = await startCluster(options);
  const { adminUrl, port } = cluster;
  const stopping = new AbortController();
  const isStopping = (): boolean => stopping.signal.aborted;

  async function restart(): Promise<void> {
    for (let waitFor = firstWait; !isStopping(); waitFor = Math.min(waitFor * 2, longestWait)) {
      report(`The database ended unexpectedly and is started again in ${waitFor / 1000} s. Its log: ${options.logFile}`);
      await wait(waitFor, undefined, { signal: stopping.signal }).catch(() => undefined);
      if (isStopping()) return;
      try {
        cluster = await startCluster({ ...options, preferredPort: port });
        if (cluster.port === port) return;
        await cluster.stop();
      } catch {
        // The next round says so.
      }
    }
  }
  async function watch(): Promise<void> {
    while (!isStopping()) {
      await cluster.exited;
      await restart();
    }
  }
  const watching = watch();

  return {
    adminUrl,
    port,
    async stop() {
      stopping.abort();
      await cluster.stop();
      await watching;
      // A restart under way when the order came may have finished after it.
      await cluster.stop();
    },
  };
}
