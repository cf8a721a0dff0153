/** The page around this one: what it says, and what it is told. */
import type { FromPreparing, ToPreparing } from './messages.ts';

export interface Surroundings {
  readonly tell: (message: FromPreparing) => void;
  /** @returns what ends the listening */
  readonly listen: (take: (message: ToPreparing) => void) => () => void;
}

/** Speaks to the same origin only, and hears nobody but the page around it. */
export function surroundingPage(): Surroundings {
  return {
    tell: (message) => window.parent.postMessage(message, location.origin, buffersIn(message)),
    listen: (take) => {
      const hear = (event: MessageEvent<ToPreparing>) => {
        if (event.source === window.parent && event.origin === location.origin) take(event.data);
      };
      window.addEventListener('message', hear);
      return () => window.removeEventListener('message', hear);
    },
  };
}

const buffersIn = (message: FromPreparing): ArrayBuffer[] => (message.kind === 'send' ? message.tables.map(({ csv }) => csv) : []);
