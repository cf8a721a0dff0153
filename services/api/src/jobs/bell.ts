/** Rings at the workers when a job has been committed, so that nobody waits for the next look at the queue. A ring missed costs only that wait. */
import pg from 'pg';

/** Name of the notifications; their payload is the queue (PostgreSQL documentation, NOTIFY). */
export const bell = 'cairnstep_jobs';

const listenAgainMs = 2_000;

export interface Listening {
  close(): Promise<void>;
}

/** Calls back with each queue that is rung for. Listens again when its connection was lost. */
export function listenForBell(url: string, onRing: (queue: string) => void): Listening {
  let client: pg.Client | null = null;
  let again: NodeJS.Timeout | null = null;
  let isClosed = false;

  async function listen(): Promise<void> {
    const own = new pg.Client({ connectionString: url, connectionTimeoutMillis: 5_000 });
    const lost = (): void => {
      if (client !== own || isClosed) return;
      client = null;
      again = setTimeout(() => void listen(), listenAgainMs);
    };
    client = own;
    own.on('error', lost);
    own.on('end', lost);
    own.on('notification', ({ payload }) => onRing(payload ?? ''));
    try {
      await own.connect();
      await own.query(`listen ${bell}`);
    } catch {
      lost();
    }
  }

  void listen();
  return {
    close: async () => {
      isClosed = true;
      if (again) clearTimeout(again);
      await client?.end().catch(() => undefined);
    },
  };
}
