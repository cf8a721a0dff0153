/** The worker's own code without a worker, for tests. Never part of the built client. */
import { serve } from './worker/serve.ts';
import type { FromWorker, ToWorker } from './worker/protocol.ts';
import { workshop } from './worker/workshop.ts';
import { openWorkroom } from './worker-client.ts';
import type { Workroom } from './worker-client.ts';

export interface InProcessWorkroom extends Workroom {
  /** Everything that the worker told the page. */
  readonly told: readonly FromWorker[];
}

export function inProcessWorkroom(): InProcessWorkroom {
  const told: FromWorker[] = [];
  let take: (message: FromWorker) => void = () => undefined;
  const toWorker = serve(workshop(), (message) => {
    told.push(message);
    take(message);
  });
  const workroom = openWorkroom({
    postMessage: (message: ToWorker) => toWorker(message),
    onMessage: (listener) => (take = listener),
    onEnd: () => undefined,
  });
  return { ...workroom, told };
}
