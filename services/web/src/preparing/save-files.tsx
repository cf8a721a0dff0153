import { useState } from 'react';
import { formatCount } from '../lib/format.ts';
import { saveFile } from '../lib/save-file.ts';
import { Button } from '../ui/button.tsx';
import { KeyRefusal } from './key/key-refusal.tsx';
import { Outcome } from './outcome.tsx';
import { preparedFiles } from './prepared-files.ts';
import type { PreparedFile } from './prepared-files.ts';
import { useAct } from './use-act.ts';
import type { Month } from './use-month.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface SaveFilesProps {
  readonly month: Month;
  readonly prepared: PreparedPicture;
  readonly site: string;
  /** `2026-11` */
  readonly calendarMonth: string;
  /** What has to be done first; null when nothing has. */
  readonly obstacle: string | null;
}

const save = ({ name, content, type }: PreparedFile): void => saveFile(name, content, type);

/** Saves what was prepared as files, all at once; a browser that stops after the first lets them be saved one by one. */
export function SaveFiles({ month, prepared, site, calendarMonth, obstacle }: SaveFilesProps) {
  const { sending, picture } = month.state;
  const giving = useAct();
  const [saved, setSaved] = useState<readonly PreparedFile[]>([]);
  const isDone = sending?.state === 'done';

  const saveAll = () =>
    void giving.run(async () => {
      const { tables, replacedCodes } = await month.ask('tables-to-send', null);
      const files = preparedFiles({ site, calendarMonth, prepared, tables, replacedCodes });
      files.forEach(save);
      setSaved(files);
      month.sendingIs({ kind: 'sending', state: 'done', done: tables.length, of: tables.length, message: null });
      await month.codesReplaced();
    });

  return (
    <>
      <div className="grid justify-items-start gap-2">
        <Button
          variant={picture?.key?.isUnsaved === true ? 'secondary' : 'primary'}
          isDisabled={obstacle !== null}
          isPending={giving.isPending}
          onPress={saveAll}
        >
          Save {formatCount(prepared.tables.length, 'cleaned file')}
        </Button>
        {obstacle !== null && <p className="text-quiet">{obstacle}</p>}
        <KeyRefusal refusal={giving.refusal} />
      </div>
      {isDone && (
        <Outcome kind="success" title="The cleaned files are saved.">
          <p>
            Your browser has put them where it puts downloads. Send the files of the tables on the month’s page of the registry; the text
            beside them says what was prepared. If your browser saved only the first, save the others one by one:
          </p>
          <ul>
            {saved.map((file) => (
              <li key={file.name}>
                <Button variant="quiet" onPress={() => save(file)}>
                  Save {file.name} again
                </Button>
              </li>
            ))}
          </ul>
        </Outcome>
      )}
    </>
  );
}
