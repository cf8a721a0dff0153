/** A draft as it is typed, and the keeping of it. */
import type { AccessRequest, RequestForm } from '@cairnstep/contract';
import { useEffect, useState, useSyncExternalStore } from 'react';
import { useSearchParams } from 'react-router-dom';
import { useAddressChange } from '../../lib/address-state.ts';
import { cohortIn } from '../../lib/cohort.ts';
import { withoutCohort } from './cohort-address.ts';
import { DraftKeeper } from './draft-keeper.ts';
import type { Keeping } from './draft-keeper.ts';
import { useSaveRequest } from './requests.queries.ts';

export interface Draft {
  readonly form: RequestForm;
  readonly change: (changes: Partial<RequestForm>) => void;
  readonly keeping: Keeping;
  /** Resolves when all that was typed is on the server. */
  readonly keepNow: () => Promise<void>;
  /** Set when the cohort has just been brought from the grid. */
  readonly cohortBrought: boolean;
}

/** Drafts left while something was still to be kept: whoever comes back finds what they typed, and one keeper alone writes a draft. */
const left = new Map<string, DraftKeeper<RequestForm>>();

function keeperOf({ id, form }: AccessRequest, save: (draft: RequestForm) => Promise<unknown>): DraftKeeper<RequestForm> {
  const before = left.get(id);
  left.delete(id);
  return before?.isBehind === true ? before : new DraftKeeper(form, save);
}

export function useDraft(request: AccessRequest): Draft {
  const save = useSaveRequest(request.id);
  const [keeper] = useState(() => keeperOf(request, (draft) => save.mutateAsync(draft)));
  const [search] = useSearchParams();
  const [brought] = useState(() => cohortIn(search));
  const changeAddress = useAddressChange();

  useEffect(() => {
    if (brought === null) return;
    keeper.change({ cohort: brought });
    changeAddress(withoutCohort);
    // Once, on arriving from the grid.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);

  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (keeper.isBehind) event.preventDefault();
    };
    window.addEventListener('beforeunload', warn);
    return () => {
      window.removeEventListener('beforeunload', warn);
      if (keeper.isBehind) left.set(request.id, keeper);
      void keeper.flush().catch(() => undefined);
    };
  }, [keeper, request.id]);

  return {
    form: useSyncExternalStore(keeper.subscribe, keeper.current),
    change: (changes) => keeper.change(changes),
    keeping: useSyncExternalStore(keeper.subscribe, keeper.standing),
    keepNow: () => keeper.flush(),
    cohortBrought: brought !== null,
  };
}
