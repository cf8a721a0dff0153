/** The files about to be sent: each with the table it is of, what was found in it, and how far it has come. */
import type { Submission } from '@cairnstep/contract';
import { useEffect, useRef } from 'react';
import { formatBytes, formatCount } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Progress } from '../../ui/progress.tsx';
import { Select } from '../../ui/select.tsx';
import { beginCheckId } from './check-section.tsx';
import { NotLookedThrough } from './look-in-worker.ts';
import { LookOutcome } from './look-outcome.tsx';
import { heldAs, isLookedAt, isStopped, obstacleOf } from './outgoing-file.ts';
import type { OutgoingFile } from './outgoing-file.ts';
import type { Outgoing } from './outgoing-files.ts';
import { lossWords, SendFiles } from './send-files.tsx';
import type { SentFile, TableKey } from './submissions.queries.ts';
import { tables } from './table-names.ts';

const options = tables.map(({ key, name }) => ({ value: key, label: name }));

export interface OutgoingListProps {
  readonly submission: Submission;
  readonly outgoing: Outgoing;
}

export function OutgoingList({ submission: { id: submissionId, files: held }, outgoing }: OutgoingListProps) {
  const { files, isSending } = outgoing;
  const obstacle = obstacleOf(files);
  const stopped = files.filter(isStopped).length;
  const mayCheck = files.length === 0 && held.length > 0;
  const goesOn = useRef(false);
  useEffect(() => {
    if (!mayCheck || !goesOn.current) return;
    goesOn.current = false;
    // The button just pressed is gone with the last file: go on where the work goes on.
    document.getElementById(beginCheckId)?.focus();
  }, [mayCheck]);
  useAnnouncedLook(files);
  if (files.length === 0) return null;

  async function send(): Promise<void> {
    goesOn.current = true;
    const arrived = await outgoing.send();
    announce(`${formatCount(arrived, 'file')} of ${formatCount(files.length, 'file')} arrived.`);
    if (arrived < files.length) goesOn.current = false;
  }

  return (
    <div className="grid gap-3 border-l-4 border-lichen pl-4">
      <h3 className="font-semibold">Not sent yet: each file and its table</h3>
      <ul aria-label="Files not sent yet">
        {files.map((file) => (
          <OneFile key={file.id} submissionId={submissionId} file={file} outgoing={outgoing} replaced={heldAs(file.table, held)} />
        ))}
      </ul>
      {obstacle !== null && <p className="font-semibold text-amber">{obstacle}</p>}
      {stopped > 0 && (
        <p className="font-semibold text-oxide">
          {stopped === 1 ? 'One file stays' : `${stopped} files stay`} in this browser. Prepare {stopped === 1 ? 'it' : 'them'}, or leave{' '}
          {stopped === 1 ? 'it' : 'them'} out.
        </p>
      )}
      <div className="flex flex-wrap gap-3">
        <SendFiles outgoing={outgoing} held={held} isDisabled={obstacle !== null} onSend={send} />
        {isSending && <Button onPress={outgoing.stop}>Stop sending</Button>}
      </div>
    </div>
  );
}

/** Says once what came of looking through, when the last of the files has been. */
function useAnnouncedLook(files: readonly OutgoingFile[]): void {
  const wasLooking = useRef(false);
  const isLooking = files.some(isLookedAt);
  const stopped = files.filter(isStopped).length;
  useEffect(() => {
    if (wasLooking.current && !isLooking)
      announce(
        stopped === 0
          ? 'The files have been looked through.'
          : `${formatCount(stopped, 'file')} cannot be sent: read the problem beside it.`,
      );
    wasLooking.current = isLooking;
  }, [isLooking, stopped]);
}

interface OneFileProps {
  readonly submissionId: string;
  readonly file: OutgoingFile;
  readonly outgoing: Outgoing;
  /** The file in whose place it would come. */
  readonly replaced: SentFile | undefined;
}

function OneFile({ submissionId, file: outgoingFile, outgoing, replaced }: OneFileProps) {
  const { id, file, table, looked, sent, error } = outgoingFile;
  const size = formatBytes(file.size);
  return (
    <li className="grid gap-2 border-t border-hairline py-3">
      {sent === null ? (
        <div className="flex flex-wrap items-end gap-x-4 gap-y-2">
          <div className="w-full max-w-72">
            {table === 'workbook' ? (
              <p className="grid">
                <span className="font-semibold break-all">{file.name}</span>
                <span className="text-small text-quiet">
                  {size}, a workbook: each of its sheets is a table{replaced !== undefined && '. It replaces the one sent before'}
                </span>
              </p>
            ) : (
              <Select
                id={`table-of-${id}`}
                label={file.name}
                hint={replaced === undefined ? size : `${size}, replaces the file sent before`}
                placeholder="Choose its table"
                value={table}
                options={options}
                onChange={(key) => outgoing.move(id, key as TableKey)}
              />
            )}
          </div>
          <Button variant="quiet" onPress={() => outgoing.leaveOut(id)} aria-label={`Leave out ${file.name}`}>
            Leave out
          </Button>
        </div>
      ) : (
        <Progress
          label={`Sending ${file.name}`}
          part={sent}
          words={`${file.name}: ${formatBytes(Math.round(file.size * sent))} of ${size}`}
        />
      )}
      {replaced !== undefined && replaced.mended > 0 && !isStopped(outgoingFile) && (
        <p className="max-w-2xl text-amber">{lossWords(replaced.mended)}</p>
      )}
      {isLookedAt(outgoingFile) && <p className="text-quiet">Looking through {file.name}, here in your browser.</p>}
      {looked !== null && <LookOutcome submissionId={submissionId} looked={looked} />}
      {error !== null && <Failure error={error} lookAgain={() => outgoing.lookAgain(id)} />}
    </li>
  );
}

function Failure({ error, lookAgain }: { readonly error: unknown; readonly lookAgain: () => void }) {
  if (!(error instanceof NotLookedThrough)) return <ErrorNotice error={error} retry={lookAgain} />;
  return (
    <Notice kind="error" title="Not sent: the file could not be looked through." urgent>
      <p>
        It may have been changed, moved or deleted since it was chosen, or be too large for this browser. Leave it out and choose it again.
      </p>
    </Notice>
  );
}
