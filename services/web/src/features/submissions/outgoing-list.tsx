/** The files about to be sent: each with the table it is of, and how far it has come. */
import { useEffect, useRef } from 'react';
import { formatBytes, formatCount } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Progress } from '../../ui/progress.tsx';
import { Select } from '../../ui/select.tsx';
import { beginCheckId } from './check-section.tsx';
import { obstacleOf } from './outgoing-files.ts';
import type { Outgoing, OutgoingFile } from './outgoing-files.ts';
import type { FileKey, TableKey } from './submissions.queries.ts';
import { tables } from './table-names.ts';

const options = tables.map(({ key, name }) => ({ value: key, label: name }));

export interface OutgoingListProps {
  readonly outgoing: Outgoing;
  /** Files the registry has. */
  readonly held: readonly FileKey[];
}

export function OutgoingList({ outgoing, held }: OutgoingListProps) {
  const { files, isSending } = outgoing;
  const obstacle = obstacleOf(files);
  const mayCheck = files.length === 0 && held.length > 0;
  const goesOn = useRef(false);
  useEffect(() => {
    if (!mayCheck || !goesOn.current) return;
    goesOn.current = false;
    // The button just pressed is gone with the last file: go on where the work goes on.
    document.getElementById(beginCheckId)?.focus();
  }, [mayCheck]);
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
          <OneFile key={file.id} file={file} outgoing={outgoing} replaces={file.table !== null && held.includes(file.table)} />
        ))}
      </ul>
      {obstacle !== null && <p className="font-semibold text-amber">{obstacle}</p>}
      <div className="flex flex-wrap gap-3">
        <Button variant="primary" isPending={isSending} isDisabled={obstacle !== null && !isSending} onPress={() => void send()}>
          {isSending ? 'Sending' : `Send ${formatCount(files.length, 'file')}`}
        </Button>
        {isSending && <Button onPress={outgoing.stop}>Stop sending</Button>}
      </div>
    </div>
  );
}

interface OneFileProps {
  readonly file: OutgoingFile;
  readonly outgoing: Outgoing;
  readonly replaces: boolean;
}

function OneFile({ file: { id, file, table, sent, error }, outgoing, replaces }: OneFileProps) {
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
                  {size}, a workbook: each of its sheets is a table{replaces && '. It replaces the one sent before'}
                </span>
              </p>
            ) : (
              <Select
                id={`table-of-${id}`}
                label={file.name}
                hint={replaces && table !== null ? `${size}, replaces the file sent before` : size}
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
      {error !== null && <ErrorNotice error={error} />}
    </li>
  );
}
