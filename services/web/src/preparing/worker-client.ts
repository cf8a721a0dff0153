/** The page's side of the worker: each question gets its answer, its refusal, or is taken back. */
import type { AskName, Asks, FromWorker, Progress, RefusalCode, ToWorker } from './worker/protocol.ts';

/** Why something was not done; the words may be shown as they are. */
export class WorkRefused extends Error {
  constructor(
    readonly code: RefusalCode,
    message: string,
  ) {
    super(message);
    this.name = 'WorkRefused';
  }
}

export interface AskOptions {
  readonly signal?: AbortSignal;
  readonly onProgress?: (progress: Progress) => void;
}

export interface Workroom {
  readonly ask: <Name extends AskName>(name: Name, input: Asks[Name]['input'], options?: AskOptions) => Promise<Asks[Name]['answer']>;
}

/** As much of a worker as is used; tests stand in for it. */
export interface WorkerPort {
  postMessage: (message: ToWorker) => void;
  onMessage: (take: (message: FromWorker) => void) => void;
  /** The worker ended on its own: its memory is gone, and the key with it. */
  onEnd: (take: () => void) => void;
}

interface Waiting {
  readonly resolve: (answer: never) => void;
  readonly reject: (error: WorkRefused) => void;
  readonly onProgress: ((progress: Progress) => void) | undefined;
}

const ended = () =>
  new WorkRefused(
    'failed',
    'The part of this page that works on the files has stopped, perhaps for want of memory. Nothing was sent. Load the page again and open the key file again.',
  );

export function openWorkroom(port: WorkerPort): Workroom {
  const waiting = new Map<number, Waiting>();
  let lastId = 0;
  let hasEnded = false;

  port.onMessage((message) => {
    const asked = waiting.get(message.id);
    if (asked === undefined) return;
    if (message.kind === 'progress') {
      asked.onProgress?.(message.progress);
      return;
    }
    waiting.delete(message.id);
    if (message.kind === 'answer') asked.resolve(message.answer as never);
    else asked.reject(new WorkRefused(message.code, message.message));
  });
  port.onEnd(() => {
    hasEnded = true;
    for (const { reject } of waiting.values()) reject(ended());
    waiting.clear();
  });

  return {
    ask: (name, input, { signal, onProgress } = {}) =>
      new Promise((resolve, reject) => {
        if (hasEnded) {
          reject(ended());
          return;
        }
        lastId += 1;
        const id = lastId;
        waiting.set(id, { resolve, reject, onProgress });
        signal?.addEventListener(
          'abort',
          () => {
            if (!waiting.delete(id)) return;
            port.postMessage({ cancel: id });
            reject(new WorkRefused('cancelled', 'Stopped.'));
          },
          { once: true },
        );
        port.postMessage({ id, ask: name, input });
      }),
  };
}
