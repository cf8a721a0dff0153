/** The worker that looks through files as component tests need it: its own code, without a thread. Never part of the built client. */
import { afterEach, vi } from 'vitest';
import { lookThrough } from './look-through.ts';
import type { LookQuestion } from './look-through.ts';

afterEach(() => vi.unstubAllGlobals());

export function fakeLookWorker(): void {
  vi.stubGlobal('Worker', FakeWorker);
}

class FakeWorker extends EventTarget {
  postMessage(question: LookQuestion): void {
    void lookThrough(question)
      .catch(() => null)
      .then((data) => this.dispatchEvent(new MessageEvent('message', { data })));
  }

  terminate(): void {
    // Nothing runs on.
  }
}
