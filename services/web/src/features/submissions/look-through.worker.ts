/** The way into the worker: one file, one answer; `null` when the file could not be read or the reading broke. */
import { lookThrough } from './look-through.ts';
import type { LookQuestion } from './look-through.ts';

const scope = self as unknown as DedicatedWorkerGlobalScope;
scope.addEventListener('message', ({ data }: MessageEvent<LookQuestion>) => {
  void lookThrough(data)
    .catch(() => null)
    .then((looked) => scope.postMessage(looked));
});
