import { useCallback, useState } from 'react';
import { announce } from '../ui/announcer.tsx';
import { WorkRefused } from './worker-client.ts';

export interface Act {
  readonly isPending: boolean;
  readonly refusal: WorkRefused | null;
  readonly run: (work: () => Promise<void>) => Promise<void>;
}

/** One thing that a person asked for: under way, done, or refused with its reason. */
export function useAct(): Act {
  const [isPending, setPending] = useState(false);
  const [refusal, setRefusal] = useState<WorkRefused | null>(null);
  const run = useCallback(async (work: () => Promise<void>) => {
    setPending(true);
    setRefusal(null);
    try {
      await work();
    } catch (error) {
      if (!(error instanceof WorkRefused)) throw error;
      setRefusal(error);
      // The refusal speaks for itself; nothing is under way any more.
      announce('');
    } finally {
      setPending(false);
    }
  }, []);
  return { isPending, refusal, run };
}
