/** The month being prepared: the worker's answers as state, and everything a person can do. */
import type { ColumnMatch, IsoDate } from '@cairnstep/deidentification';
import type { TableKey } from '@cairnstep/dictionary';
import { startTransition, useCallback, useEffect, useMemo, useReducer, useRef } from 'react';
import { saveFile } from '../lib/save-file.ts';
import { announce } from '../ui/announcer.tsx';
import type { Sending } from './messages.ts';
import { isOfAnotherMonth, obstacleOf, reduceMonth, startState } from './month-state.ts';
import type { MonthState } from './month-state.ts';
import { WorkRefused } from './worker-client.ts';
import type { Workroom } from './worker-client.ts';
import type { Asks, Circumstances, Picture, SavedFile, SourceChange } from './worker/protocol.ts';

/** Everything but the state is the same as long as the page lives. */
export interface Month {
  readonly state: MonthState;
  readonly ask: Workroom['ask'];
  /** @throws WorkRefused */
  readonly openKey: (file: File, passphrase: string) => Promise<void>;
  /** @throws WorkRefused */
  readonly makeKey: (settings: Asks['make-key']['input']) => Promise<void>;
  /** @throws WorkRefused */
  readonly saveKey: () => Promise<void>;
  /** Takes over what an act on the key has changed, and works the month out again. */
  readonly keyChanged: (picture: Picture) => Promise<void>;
  /** The registry was told of the codes that were replaced. */
  readonly codesReplaced: () => Promise<void>;
  readonly addFiles: (files: readonly File[]) => Promise<void>;
  readonly changeSource: (change: SourceChange) => Promise<void>;
  readonly leaveOut: (id: number) => Promise<void>;
  readonly matchColumn: (source: number, match: ColumnMatch) => Promise<void>;
  readonly stateFirstDay: (place: { readonly table: TableKey; readonly line: number }, date: IsoDate | null) => Promise<void>;
  /** Works the month out from what there is. */
  readonly workOut: () => Promise<void>;
  /** Stops the reading or working out that is under way. */
  readonly stop: () => void;
  readonly sendingIs: (sending: Sending) => void;
}

export function useMonth(workroom: Workroom, circumstances: Circumstances): Month {
  const [state, dispatch] = useReducer(reduceMonth, startState);
  /** The long work under way: newer work takes the place of older. */
  const underWay = useRef<AbortController | null>(null);

  const ask: Workroom['ask'] = useCallback(
    (name, input, options = {}) =>
      workroom.ask(name, input, { onProgress: (progress) => dispatch({ kind: 'progress', progress }), ...options }),
    [workroom],
  );
  const refuse = useCallback((error: unknown) => {
    if (!(error instanceof WorkRefused)) throw error;
    dispatch({ kind: 'refused', message: error.message });
  }, []);
  const look = useCallback(() => ask('begin', circumstances), [ask, circumstances]);

  useEffect(() => {
    look().then((picture) => dispatch({ kind: 'picture', picture }), refuse);
  }, [look, refuse]);

  /** Does something that changes what would be sent, and works that out again. */
  const change = useCallback(
    async (act: (signal: AbortSignal) => Promise<Picture>) => {
      underWay.current?.abort();
      const control = new AbortController();
      const { signal } = control;
      underWay.current = control;
      dispatch({ kind: 'changed' });
      try {
        const picture = await act(signal);
        dispatch({ kind: 'picture', picture });
        if (signal.aborted) return;
        if (picture.key === null || picture.sources.every(({ table }) => table === null) || obstacleOf(picture.sources) !== null) {
          dispatch({ kind: 'nothing-to-prepare' });
          return;
        }
        const worked = await ask('prepare', null, { signal });
        // The preview is large: drawn in slices, the page stays answerable meanwhile.
        startTransition(() => dispatch({ kind: 'prepared', ...worked }));
        const { rowsInMonth } = worked.prepared;
        const isWrongMonth = rowsInMonth !== null && isOfAnotherMonth(rowsInMonth);
        announce(`The preview is ready.${isWrongMonth ? ' Take care: the files look like those of another month.' : ''}`);
      } catch (error) {
        if (underWay.current !== control) return;
        refuse(error);
        // Some of the files may have been taken in.
        await look().then((picture) => dispatch({ kind: 'picture', picture }), refuse);
      }
    },
    [ask, look, refuse],
  );

  const acts = useMemo((): Omit<Month, 'state'> => {
    const keep = ({ file, picture }: { readonly file: SavedFile; readonly picture: Picture }) => {
      saveFile(file.name, file.text, 'application/json');
      dispatch({ kind: 'key-saved', picture, fileName: file.name });
      announce(`The key file is saved as ${file.name}.`);
    };
    return {
      ask,
      openKey: async (file, passphrase) => {
        const picture = await ask('open-key', { file, passphrase });
        announce('The key is open.');
        await change(() => Promise.resolve(picture));
      },
      makeKey: async (settings) => {
        const made = await ask('make-key', settings);
        keep(made);
        await change(() => Promise.resolve(made.picture));
      },
      saveKey: async () => keep(await ask('save-key', null)),
      keyChanged: (picture) => change(() => Promise.resolve(picture)),
      codesReplaced: async () => dispatch({ kind: 'picture', picture: await ask('codes-replaced', null) }),
      addFiles: (files) => change((signal) => ask('add-files', { files }, { signal })),
      changeSource: (source) => change((signal) => ask('change-source', source, { signal })),
      leaveOut: (id) => change(() => ask('leave-out', { id })),
      matchColumn: (source, match) => change(() => ask('match-column', { source, match })),
      stateFirstDay: (place, date) => change(() => ask('state-first-day', { ...place, date })),
      workOut: () => change(look),
      stop: () => underWay.current?.abort(),
      sendingIs: (sending) => dispatch({ kind: 'sending', sending }),
    };
  }, [ask, look, change]);
  return useMemo(() => ({ state, ...acts }), [state, acts]);
}
