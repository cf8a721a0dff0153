/** The API and a worker as processes, on a PostgreSQL server of their own that writes as safely as in service. */
import { startOwnCluster, type OwnCluster } from '../../tests/support/own-cluster.ts';
import { startApiProcess, startWorkerProcess, type ApiProcess, type TestProcess } from '../../tests/support/processes.ts';
import { startTestServer, type TestServer } from '../../tests/support/server.ts';

export interface RunningProduct {
  readonly cluster: OwnCluster;
  readonly api: ApiProcess;
  readonly worker: TestProcess;
  /** For making sites and people, whose sessions the API knows too. */
  readonly people: TestServer;
}

export async function withProduct<T>(work: (product: RunningProduct) => Promise<T>): Promise<T> {
  const cluster = await startOwnCluster();
  const ends: (() => Promise<void>)[] = [() => cluster.close()];
  try {
    const database = await cluster.openDatabase();
    ends.push(() => database.close());
    const people = await startTestServer({}, database);
    ends.push(() => people.close());
    const api = await startApiProcess(people.config);
    ends.push(() => api.stop());
    const worker = await startWorkerProcess(people.config);
    ends.push(() => worker.stop());
    return await work({ cluster, api, worker, people });
  } finally {
    for (const end of ends.reverse()) await end();
  }
}
