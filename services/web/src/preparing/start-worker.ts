import PrepareWorker from './worker/prepare.worker.ts?worker';
import type { FromWorker } from './worker/protocol.ts';
import type { WorkerPort } from './worker-client.ts';

/** The built page carries its worker inside itself (build/one-file.ts): in a sandbox and from a disk no script may be fetched. */
export const startWorker = (): Promise<WorkerPort> => Promise.resolve(portOf(new PrepareWorker()));

function portOf(worker: Worker): WorkerPort {
  return {
    postMessage: (message) => worker.postMessage(message),
    onMessage: (take) => worker.addEventListener('message', ({ data }: MessageEvent<FromWorker>) => take(data)),
    onEnd: (take) => worker.addEventListener('error', () => take()),
  };
}
