/** Answers what the page asks, one thing after the other, and lets it change its mind. */
import type { AskName, Asks, FromWorker, Progress, ToWorker } from './protocol.ts';
import { Refusal, refusalOf } from './refusal.ts';

/** Given to work that takes long: tells how far it is, and stops it when the page has changed its mind. */
export interface Watch {
  readonly tell: (progress: Progress) => void;
  /** Lets messages arrive. @throws Refusal when the work is not wanted any more. */
  readonly pause: () => Promise<void>;
}

export type Answers = { readonly [Name in AskName]: (input: Asks[Name]['input'], watch: Watch) => Promise<Asks[Name]['answer']> };

/** Milliseconds; each pause costs some. */
const pauseEvery = 50;

/** @returns what takes each message of the page */
export function serve(answers: Answers, post: (message: FromWorker, transfer: Transferable[]) => void): (message: ToWorker) => void {
  const cancelled = new Set<number>();
  let answered = 0;
  let queue = Promise.resolve();

  async function answer(message: Exclude<ToWorker, { cancel: number }>): Promise<void> {
    const { id, ask, input } = message;
    let paused = performance.now();
    const check = () => {
      if (cancelled.has(id)) throw new Refusal('cancelled', 'Stopped.');
    };
    const watch: Watch = {
      tell: (progress) => post({ id, kind: 'progress', progress }, []),
      pause: async () => {
        if (performance.now() - paused < pauseEvery) return;
        await nextTask();
        paused = performance.now();
        check();
      },
    };
    try {
      check();
      const work = answers[ask] as (input: unknown, watch: Watch) => Promise<Asks[AskName]['answer']>;
      const given = await work(input, watch);
      post({ id, kind: 'answer', answer: given }, buffersIn(given));
    } catch (error) {
      const { code, message: words } = refusalOf(error);
      post({ id, kind: 'refusal', code, message: words }, []);
    } finally {
      cancelled.delete(id);
      answered = id;
    }
  }

  return (message) => {
    if (!('cancel' in message)) queue = queue.then(() => answer(message));
    else if (message.cancel > answered) cancelled.add(message.cancel);
  };
}

/** A message waits for its turn among tasks; a resolved promise would not let it in. */
const nextTask = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

/** The bytes of an answer change hands instead of being copied. */
function buffersIn(answer: Asks[AskName]['answer']): Transferable[] {
  return answer !== null && typeof answer === 'object' && 'tables' in answer ? answer.tables.map(({ csv }) => csv) : [];
}
