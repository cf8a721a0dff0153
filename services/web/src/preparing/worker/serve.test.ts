// @vitest-environment node
import { describe, expect, it } from 'vitest';
import { openWorkroom } from '../worker-client.ts';
import type { FromWorker } from './protocol.ts';
import { serve } from './serve.ts';
import type { Answers } from './serve.ts';

const silent = () => Promise.reject(new Error('not asked here'));
const unasked: Answers = {
  begin: silent,
  'suggest-passphrase': silent,
  'make-key': silent,
  'open-key': silent,
  'merge-key': silent,
  'rotate-key': silent,
  'join-numbers': silent,
  'change-passphrase': silent,
  'save-key': silent,
  'codes-to-replace': silent,
  'codes-replaced': silent,
  'add-files': silent,
  'change-source': silent,
  'leave-out': silent,
  'match-column': silent,
  'state-first-day': silent,
  prepare: silent,
  'tables-to-send': silent,
};

function roomOf(answers: Partial<Answers>) {
  let take: (message: FromWorker) => void = () => undefined;
  let end: () => void = () => undefined;
  const transferred: number[] = [];
  const toWorker = serve({ ...unasked, ...answers }, (message, transfer) => {
    transferred.push(transfer.length);
    take(message);
  });
  const room = openWorkroom({
    postMessage: toWorker,
    onMessage: (listener) => (take = listener),
    onEnd: (listener) => (end = listener),
  });
  return { room, transferred, endWorker: () => end() };
}

describe('the worker', () => {
  it('answers one thing after the other', async () => {
    const order: string[] = [];
    const { room } = roomOf({
      'suggest-passphrase': async () => {
        order.push('begun');
        await new Promise((resolve) => setTimeout(resolve, 5));
        order.push('ended');
        return 'words';
      },
    });
    await Promise.all([room.ask('suggest-passphrase', null), room.ask('suggest-passphrase', null)]);
    expect(order).toEqual(['begun', 'ended', 'begun', 'ended']);
  });

  it('tells how far it is, and gives bytes away instead of copying them', async () => {
    const told: unknown[] = [];
    const { room, transferred } = roomOf({
      'tables-to-send': async (_, { tell }) => {
        tell({ what: 'x', bytes: { done: 1, of: 2 } });
        return { tables: [{ table: 'bouts', rows: 1, csv: new ArrayBuffer(8) }], replacedCodes: [] };
      },
    });
    await room.ask('tables-to-send', null, { onProgress: ({ bytes }) => told.push(bytes) });
    expect(told).toEqual([{ done: 1, of: 2 }]);
    expect(transferred).toEqual([0, 1]);
  });

  it('stops what is not wanted any more, before it begins or at its next pause, and goes on with the next', async () => {
    const reached: string[] = [];
    const { room } = roomOf({
      'codes-to-replace': async (_, { pause }) => {
        reached.push('begun');
        for (;;) {
          await new Promise((resolve) => setTimeout(resolve, 60));
          await pause();
        }
      },
      'suggest-passphrase': async () => 'words',
    });
    const [first, second] = [new AbortController(), new AbortController()];
    const asked = [room.ask('codes-to-replace', null, first), room.ask('codes-to-replace', null, second)];
    const next = room.ask('suggest-passphrase', null);
    second.abort();
    first.abort();
    for (const each of asked) await expect(each).rejects.toMatchObject({ code: 'cancelled' });
    expect(await next).toBe('words');
    expect(reached.length).toBeLessThanOrEqual(1);
  });

  it('passes on no text of an error that nobody foresaw', async () => {
    const { room } = roomOf({ prepare: () => Promise.reject(new Error('cell 00482913')) });
    const outcome = room.ask('prepare', null);
    await expect(outcome).rejects.toMatchObject({ code: 'failed' });
    await expect(outcome).rejects.not.toThrow('00482913');
  });

  it('that has ended leaves no question without an answer', async () => {
    const { room, endWorker } = roomOf({ prepare: () => new Promise(() => undefined) });
    const outcome = room.ask('prepare', null);
    endWorker();
    await expect(outcome).rejects.toThrow('has stopped');
    await expect(room.ask('prepare', null)).rejects.toThrow('has stopped');
  });
});
