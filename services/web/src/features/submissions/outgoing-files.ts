/** Files chosen in this browser that the registry does not have yet. */
import type { Submission } from '@cairnstep/contract';
import { showableFileName } from '@cairnstep/deidentification';
import { useCallback, useRef, useState } from 'react';
import { useStayOnPage } from '../../lib/use-stay-on-page.ts';
import { recogniseFile } from './recognise-table.ts';
import { useSendFile } from './submissions.queries.ts';
import type { FileKey, TableKey } from './submissions.queries.ts';

export interface OutgoingFile {
  readonly id: number;
  readonly file: File;
  /** `null`: its name does not tell; the reader has to. */
  readonly table: FileKey | null;
  /** How much has left, from 0 to 1; `null` while it waits. */
  readonly sent: number | null;
  readonly error: unknown;
}

export interface Outgoing {
  readonly files: readonly OutgoingFile[];
  readonly isSending: boolean;
  /** `table`: what the reader said the files are of; without it their names decide. */
  readonly add: (files: readonly File[], table?: FileKey) => void;
  readonly move: (id: number, table: TableKey) => void;
  readonly leaveOut: (id: number) => void;
  /** One after the other; a file that fails stays here with its reason. Resolves to how many arrived. */
  readonly send: () => Promise<number>;
  readonly stop: () => void;
}

export function useOutgoingFiles({ id: submissionId, site, month }: Pick<Submission, 'id' | 'site' | 'month'>): Outgoing {
  const [files, setFiles] = useState<readonly OutgoingFile[]>([]);
  const [control, setControl] = useState<AbortController | null>(null);
  const nextId = useRef(0);
  const { mutateAsync } = useSendFile(submissionId);

  const add = useCallback((chosen: readonly File[], table?: FileKey) => {
    const added = chosen.map((file) => ({
      id: nextId.current++,
      file,
      table: table ?? recogniseFile(file.name),
      sent: null,
      error: null,
    }));
    // The same file chosen again takes the place of its earlier self.
    setFiles((before) => [...before.filter(({ file }) => !chosen.some(({ name }) => name === file.name)), ...added]);
  }, []);
  const change = useCallback(
    (id: number, to: Partial<OutgoingFile>) => setFiles((before) => before.map((file) => (file.id === id ? { ...file, ...to } : file))),
    [],
  );
  const leaveOut = useCallback((id: number) => setFiles((before) => before.filter((file) => file.id !== id)), []);

  useStayOnPage(control !== null);

  async function send(): Promise<number> {
    const sending = new AbortController();
    setControl(sending);
    let arrived = 0;
    for (const { id, table, file } of files) {
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
    move: (id, table) => change(id, { table, error: null }),
    leaveOut,
    send,
    stop: () => control?.abort(),
  };
}

/** What keeps these files from being sent, in words; `null` when nothing does. */
export function obstacleOf(files: readonly OutgoingFile[]): string | null {
  const without = files.find(({ table }) => table === null);
  if (without !== undefined) return `Choose the table of ${without.file.name}.`;
  const twice = files.find(({ id, table }) => files.some((other) => other.id !== id && other.table === table));
  if (twice === undefined) return null;
  return twice.table === 'workbook'
    ? 'A month has one workbook. Leave out one of the two.'
    : 'Two files are for the same table. Move one of them, or leave it out.';
}
