/**
 * Holds a draft while it is typed, and keeps it on the server as it is typed: a moment after the last change, one save at a time, the newest wording last.
 * What could not be kept stays here and is tried again.
 */
import { ProblemError } from '../../lib/problem-error.ts';

export type Keeping =
  /** `at`: when it was kept from here; null for what was kept before. */
  | { readonly state: 'kept'; readonly at: string | null }
  | { readonly state: 'waiting' }
  | { readonly state: 'keeping' }
  /** `willTryAgain`: the registry was out of reach; otherwise it refused, and only another change can help. */
  | { readonly state: 'failed'; readonly error: unknown; readonly willTryAgain: boolean };

export interface DraftKeeperOptions {
  readonly quietMs?: number;
  readonly retryMs?: number;
}

export class DraftKeeper<Draft extends object> {
  private keeping: Keeping = { state: 'kept', at: null };
  private pending: { readonly draft: Draft } | null = null;
  private running: Promise<void> | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private readonly listeners = new Set<() => void>();

  constructor(
    private draft: Draft,
    private readonly save: (draft: Draft) => Promise<unknown>,
    private readonly options: DraftKeeperOptions = {},
  ) {}

  readonly current = (): Draft => this.draft;

  readonly standing = (): Keeping => this.keeping;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Whether leaving now could lose something. */
  get isBehind(): boolean {
    return this.keeping.state !== 'kept';
  }

  /** Two changes at one moment, such as a number read on leaving its field and the box ticked by leaving it, build on each other. */
  change(changes: Partial<Draft>): void {
    this.draft = { ...this.draft, ...changes };
    this.pending = { draft: this.draft };
    this.tell({ state: 'waiting' });
    this.saveIn(this.options.quietMs ?? 800);
  }

  /** Keeps what is waiting now; rejects when it cannot be kept. */
  async flush(): Promise<void> {
    clearTimeout(this.timer);
    while (this.pending !== null) {
      this.running ??= this.saveNow(this.pending).finally(() => (this.running = null));
      await this.running;
    }
  }

  private async saveNow(waiting: { readonly draft: Draft }): Promise<void> {
    this.tell({ state: 'keeping' });
    try {
      await this.save(waiting.draft);
    } catch (error) {
      const willTryAgain = !(error instanceof ProblemError && error.status < 500);
      this.tell({ state: 'failed', error, willTryAgain });
      if (willTryAgain) this.saveIn(this.options.retryMs ?? 5000);
      throw error;
    }
    // What was typed meanwhile is still to be kept.
    if (this.pending !== waiting) return this.tell({ state: 'waiting' });
    this.pending = null;
    this.tell({ state: 'kept', at: new Date().toISOString() });
  }

  private saveIn(milliseconds: number): void {
    clearTimeout(this.timer);
    // What went wrong is told by the state.
    this.timer = setTimeout(() => void this.flush().catch(() => undefined), milliseconds);
  }

  private tell(keeping: Keeping): void {
    this.keeping = keeping;
    for (const listener of this.listeners) listener();
  }
}
