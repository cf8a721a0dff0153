/** All tables of a month, with the file the registry has of each. */
import type { Submission } from '@cairnstep/contract';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { formatBytes, formatCount } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { useRemoveFile } from './submissions.queries.ts';
import type { TableKey } from './submissions.queries.ts';
import { tables } from './table-names.ts';

type SentFile = Submission['files'][number];

export interface SentFilesProps {
  readonly submission: Submission;
  /** Files may come and go now. */
  readonly isOpen: boolean;
  readonly onChoose: (files: readonly File[], table: TableKey) => void;
}

export function SentFiles({ submission, isOpen, onChoose }: SentFilesProps) {
  const remove = useRemoveFile(submission.id);
  const takeOut = (table: TableKey, name: string) =>
    remove.mutate(table, { onSuccess: () => announce(`The file of ${name.toLowerCase()} was taken out.`) });
  return (
    <div className="grid gap-3">
      <ul aria-label="Tables of the month">
        {tables.map(({ key, name }) => {
          const sent = submission.files.find(({ table }) => table === key);
          return (
            <li
              key={key}
              className="grid gap-x-4 border-t border-hairline py-2 last:border-b sm:grid-cols-[140px_minmax(0,1fr)_auto] sm:items-center"
            >
              <span className="font-semibold">{name}</span>
              {sent === undefined ? <span className="text-quiet">no file</span> : <FileFacts file={sent} />}
              {isOpen && (
                <span className="flex flex-wrap gap-x-4">
                  <FileTrigger acceptedFileTypes={['.csv']} onSelect={(files) => onChoose([...(files ?? [])], key)}>
                    <Button
                      variant="quiet"
                      aria-label={
                        sent === undefined ? `Choose the file of ${name.toLowerCase()}` : `Replace the file of ${name.toLowerCase()}`
                      }
                    >
                      {sent === undefined ? 'Choose' : 'Replace'}
                    </Button>
                  </FileTrigger>
                  {sent !== undefined && (
                    <Button
                      variant="quiet"
                      isPending={remove.isPending && remove.variables === key}
                      onPress={() => takeOut(key, name)}
                      aria-label={`Take out the file of ${name.toLowerCase()}`}
                    >
                      Take out
                    </Button>
                  )}
                </span>
              )}
            </li>
          );
        })}
      </ul>
      {remove.isError && <ErrorNotice error={remove.error} />}
    </div>
  );
}

function FileFacts({ file: { fileName, bytes, rows, sha256 } }: { readonly file: SentFile }) {
  return (
    <span className="grid">
      <span className="break-all">{fileName}</span>
      <span className="numbers text-small text-quiet">
        {formatBytes(bytes)}, {rows === null ? 'rows not counted yet' : formatCount(rows, 'row')}, SHA-256{' '}
        <code>
          {sha256.slice(0, 12)}
          <span aria-hidden="true">…</span>
        </code>
      </span>
    </span>
  );
}
