/** Files chosen in this browser: looked through here as soon as their table is known, and sent when the reader says so. */
import type { Submission } from '@cairnstep/contract';
import { showableFileName } from '@cairnstep/deidentification';
import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import { useStayOnPage } from '../../lib/use-stay-on-page.ts';
import { lookInWorker } from './look-in-worker.ts';
import { mayBeSent } from './outgoing-file.ts';
import type { OutgoingFile } from './outgoing-file.ts';
import { recogniseFile } from './recognise-table.ts';
import { safeHeadersQuery } from './safe-headers.queries.ts';
import { useSendFile } from './submissions.queries.ts';
import type { FileKey, TableKey } from './submissions.queries.ts';

export interface Outgoing {
  readonly files: readonly OutgoingFile[];
  readonly isSending: boolean;
  /** `table`: what the reader said the files are of; without it their names decide. */
  readonly add: (files: readonly File[], table?: FileKey) => void;
  readonly move: (id: number, table: TableKey) => void;
  readonly lookAgain: (id: number) => void;
  readonly leaveOut: (id: number) => void;
  /** Those that may be sent, one after the other; a file that fails stays here with its reason. Resolves to how many arrived. */
  readonly send: () => Promise<number>;
  readonly stop: () => void;
}

export function useOutgoingFiles({ id: submissionId, site, month }: Pick<Submission, 'id' | 'site' | 'month'>): Outgoing {
  const [files, setFiles] = useState<readonly OutgoingFile[]>([]);
  const [control, setControl] = useState<AbortController | null>(null);
  const nextId = useRef(0);
  const { mutateAsync } = useSendFile(submissionId);
  const cache = useQueryClient();

  const change = useCallback(
    (id: number, to: Partial<OutgoingFile>) => setFiles((before) => before.map((file) => (file.id === id ? { ...file, ...to } : file))),
    [],
  );
  const lookAt = useCallback(
    async (id: number, file: File, table: FileKey) => {
      // Moved to another table meanwhile, it has to be looked through as a file of that one.
      const tell = (to: Partial<OutgoingFile>) =>
        setFiles((before) => before.map((one) => (one.id === id && one.table === table ? { ...one, ...to } : one)));
      try {
        const { headers } = await cache.fetchQuery(safeHeadersQuery(site.id));
        tell({ looked: await lookInWorker({ file, table, safeHeaders: headers.map(({ header }) => header) }) });
      } catch (error) {
        tell({ error });
      }
    },
    [cache, site.id],
  );
  const add = useCallback(
    (chosen: readonly File[], table?: FileKey) => {
      const added = chosen.map((file) => ({
        id: nextId.current++,
        file,
        table: table ?? recogniseFile(file.name),
        looked: null,
        sent: null,
        error: null,
      }));
      // The same file chosen again takes the place of its earlier self.
      setFiles((before) => [...before.filter(({ file }) => !chosen.some(({ name }) => name === file.name)), ...added]);
      for (const one of added) if (one.table !== null) void lookAt(one.id, one.file, one.table);
    },
    [lookAt],
  );
  const lookAs = (id: number, table: FileKey | null) => {
    const file = files.find((one) => one.id === id)?.file;
    if (file === undefined || table === null) return;
    change(id, { table, looked: null, error: null });
    void lookAt(id, file, table);
  };
  const leaveOut = (id: number) => setFiles((before) => before.filter((file) => file.id !== id));

  useStayOnPage(control !== null);

  async function send(): Promise<number> {
    const sending = new AbortController();
    setControl(sending);
    let arrived = 0;
    for (const { id, table, file } of files.filter(mayBeSent)) {
      if (table === null || sending.signal.aborted) continue;
      change(id, { sent: 0, error: null });
      try {
        // The name stands in the address of the request, and may be somebody's.
        const named = new File([file], showableFileName(file.name, { table, siteCode: site.code, month }));
        await mutateAsync({ table, file: named, signal: sending.signal, onSent: (sent) => change(id, { sent }) });
        leaveOut(id);
        arrived += 1;
      } catch (error) {
        change(id, { sent: null, error: sending.signal.aborted ? null : error });
      }
    }
    setControl(null);
    return arrived;
  }

  return {
    files,
    isSending: control !== null,
    add,
    move: lookAs,
    lookAgain: (id) => lookAs(id, files.find((one) => one.id === id)?.table ?? null),
    leaveOut,
    send,
    stop: () => control?.abort(),
  };
}
