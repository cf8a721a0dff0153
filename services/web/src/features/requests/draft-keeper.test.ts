import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { ProblemError, UnreachableError } from '../../lib/problem-error.ts';
import { DraftKeeper } from './draft-keeper.ts';

interface Draft {
  readonly title: string;
  readonly months: number;
}

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

const refused = () =>
  new ProblemError({ type: '/problems/request-not-in-state', status: 409, title: 'Moved on', detail: 'It was handed in.', instance: '/x' });

function keeper(save: (draft: Draft) => Promise<unknown>) {
  return new DraftKeeper<Draft>({ title: '', months: 1 }, save, { quietMs: 800, retryMs: 5000 });
}

describe('keeping a draft', () => {
  it('waits for a pause and then keeps the newest wording once', async () => {
    const save = vi.fn(() => Promise.resolve());
    const draft = keeper(save);
    draft.change({ title: 'W' });
    await vi.advanceTimersByTimeAsync(500);
    draft.change({ title: 'Wa' });
    expect(draft.standing().state).toBe('waiting');
    await vi.advanceTimersByTimeAsync(799);
    expect(save).not.toHaveBeenCalled();
    await vi.advanceTimersByTimeAsync(1);
    expect(save.mock.calls).toEqual([[{ title: 'Wa', months: 1 }]]);
    expect(draft.standing()).toMatchObject({ state: 'kept', at: expect.any(String) as string });
    expect(draft.isBehind).toBe(false);
  });

  it('builds changes of one moment on each other', () => {
    const draft = keeper(() => Promise.resolve());
    draft.change({ months: 12 });
    draft.change({ title: 'Walking' });
    expect(draft.current()).toEqual({ title: 'Walking', months: 12 });
  });

  it('saves one at a time, and what was typed meanwhile after that', async () => {
    const finish: (() => void)[] = [];
    const save = vi.fn((_draft: Draft) => new Promise<void>((resolve) => finish.push(resolve)));
    const draft = keeper(save);
    draft.change({ title: 'first' });
    const kept = draft.flush();
    draft.change({ title: 'second' });
    await vi.advanceTimersByTimeAsync(2000);
    expect(save).toHaveBeenCalledTimes(1);
    finish[0]?.();
    await vi.advanceTimersByTimeAsync(0);
    expect(save.mock.calls.map(([saved]) => saved.title)).toEqual(['first', 'second']);
    finish[1]?.();
    await kept;
    expect(draft.standing().state).toBe('kept');
  });

  it('keeps what could not be sent, says so, and tries again by itself', async () => {
    const save = vi.fn<(draft: Draft) => Promise<unknown>>().mockRejectedValueOnce(new UnreachableError()).mockResolvedValue(undefined);
    const draft = keeper(save);
    draft.change({ title: 'Walking' });
    await vi.advanceTimersByTimeAsync(800);
    expect(draft.standing()).toMatchObject({ state: 'failed', willTryAgain: true });
    expect(draft.isBehind).toBe(true);
    await vi.advanceTimersByTimeAsync(5000);
    expect(save).toHaveBeenCalledTimes(2);
    expect(draft.standing().state).toBe('kept');
  });

  it('does not repeat what was refused until something is changed', async () => {
    const save = vi.fn<(draft: Draft) => Promise<unknown>>().mockRejectedValueOnce(refused()).mockResolvedValue(undefined);
    const draft = keeper(save);
    draft.change({ title: 'Walking' });
    await vi.advanceTimersByTimeAsync(60_000);
    expect(save).toHaveBeenCalledTimes(1);
    expect(draft.standing()).toMatchObject({ state: 'failed', willTryAgain: false });
    draft.change({ title: 'Walking on' });
    await vi.advanceTimersByTimeAsync(800);
    expect(draft.standing().state).toBe('kept');
  });

  it('tells whoever hands the draft in that it is not kept', async () => {
    const draft = keeper(() => Promise.reject(refused()));
    await expect(draft.flush()).resolves.toBeUndefined();
    draft.change({ title: 'Walking' });
    await expect(draft.flush()).rejects.toBeInstanceOf(ProblemError);
  });
});
