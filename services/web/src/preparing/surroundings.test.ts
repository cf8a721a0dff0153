import { afterEach, describe, expect, it, vi } from 'vitest';
import type { ToPreparing } from './messages.ts';
import { surroundingPage } from './surroundings.ts';

const sending: ToPreparing = { kind: 'sending', state: 'done', done: 1, of: 1, message: null };

afterEach(() => vi.restoreAllMocks());

function arrive(from: Partial<MessageEventInit>): void {
  window.dispatchEvent(new MessageEvent('message', { data: sending, source: window.parent, origin: location.origin, ...from }));
}

describe('the page around', () => {
  it('is heard, and nobody else', () => {
    const heard: ToPreparing[] = [];
    const end = surroundingPage().listen((message) => heard.push(message));
    arrive({ origin: 'https://elsewhere.example' });
    arrive({ source: null });
    expect(heard).toEqual([]);
    arrive({});
    expect(heard).toEqual([sending]);
    end();
    arrive({});
    expect(heard).toHaveLength(1);
  });

  it('is told things at its own address only, and given the bytes instead of a copy', () => {
    const post = vi.spyOn(window.parent, 'postMessage').mockImplementation(() => undefined);
    const csv = new ArrayBuffer(4);
    const send = { kind: 'send' as const, tables: [{ table: 'bouts' as const, rows: 1, csv }], replacedCodes: [] };
    surroundingPage().tell(send);
    surroundingPage().tell({ kind: 'ready' });
    expect(post.mock.calls).toEqual([
      [send, location.origin, [csv]],
      [{ kind: 'ready' }, location.origin, []],
    ]);
  });
});
