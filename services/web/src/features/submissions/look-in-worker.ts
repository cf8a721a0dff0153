/** Has a file looked through off the main thread. */
import type { Looked, LookQuestion } from './look-through.ts';

/** Nobody knows what is in the file, so it is not sent. */
export class NotLookedThrough extends Error {
  constructor() {
    super('The file could not be looked through.');
    this.name = 'NotLookedThrough';
  }
}

let last: Promise<unknown> = Promise.resolve();

/** One file at a time, each in a worker of its own: the memory that a large one took is given back. */
export function lookInWorker(question: LookQuestion): Promise<Looked> {
  const looked = last.then(() => ask(question));
  last = looked.catch(() => undefined);
  return looked;
}

function ask(question: LookQuestion): Promise<Looked> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./look-through.worker.ts', import.meta.url), { type: 'module' });
    worker.addEventListener('message', ({ data }: MessageEvent<Looked | null>) => {
      worker.terminate();
      if (data === null) reject(new NotLookedThrough());
      else resolve(data);
    });
    worker.addEventListener('error', () => {
      worker.terminate();
      reject(new NotLookedThrough());
    });
    worker.postMessage(question);
  });
}
