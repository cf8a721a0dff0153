/** The files that the registry has of the month, and the tables it has none of. */
import type { Submission } from '@cairnstep/contract';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { formatBytes, formatCount } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { lossWords } from './send-files.tsx';
import { useRemoveFile } from './submissions.queries.ts';
import type { FileKey, SentFile } from './submissions.queries.ts';
import { tableName, tables } from './table-names.ts';

export interface SentFilesProps {
  readonly submission: Submission;
  /** Files may come and go now. */
  readonly isOpen: boolean;
  /** Files chosen, not sent yet. */
  readonly unsent: number;
  readonly onChoose: (files: readonly File[], table: FileKey) => void;
}

/** The tables in their order, the workbook before them. */
const inOrder = (files: readonly SentFile[]): readonly SentFile[] =>
  [null, ...tables.map(({ key }) => key)].flatMap((key) => files.filter(({ table }) => table === key));

export function SentFiles({ submission: { id, files }, isOpen, unsent, onChoose }: SentFilesProps) {
  const remove = useRemoveFile(id);
  async function takeOut(file: FileKey, name: string): Promise<void> {
    await remove.mutateAsync(file);
    announce(`${name.slice(0, 1).toUpperCase()}${name.slice(1)} was taken out.`);
  }
  const held = new Set(files.flatMap(({ table, tables: of }) => of ?? (table === null ? [] : [table])));
  const missing = tables.filter(({ key }) => !held.has(key)).map(({ name }) => name.toLowerCase());
  // What a workbook holds is known after the check.
  const isKnown = files.every(({ tables: of }) => of !== null);
  return (
    <div className="grid gap-3">
      {files.length > 0 && (
        <ul aria-label="Files sent">
          {inOrder(files).map((file) => {
            const key = file.table ?? 'workbook';
            const name = key === 'workbook' ? 'the workbook' : `the file of ${tableName(key).toLowerCase()}`;
            return (
              <li
                key={key}
                className="grid gap-x-4 border-t border-hairline py-2 last:border-b sm:grid-cols-[140px_minmax(0,1fr)_auto] sm:items-center"
              >
                <span className="font-semibold">{tableName(file.table)}</span>
                <FileFacts file={file} />
                {isOpen && (
                  <span className="flex flex-wrap gap-x-4">
                    <FileTrigger
                      acceptedFileTypes={key === 'workbook' ? ['.xlsx'] : ['.csv']}
                      onSelect={(chosen) => onChoose([...(chosen ?? [])], key)}
                    >
                      <Button variant="quiet" aria-label={`Replace ${name}`}>
                        Replace
                      </Button>
                    </FileTrigger>
                    <TakeOut
                      name={name}
                      mended={file.mended}
                      isPending={remove.isPending && remove.variables === key}
                      onTakeOut={() => takeOut(key, name)}
                    />
                  </span>
                )}
              </li>
            );
          })}
        </ul>
      )}
      {files.length === 0 && unsent === 0 && <p className="text-quiet">No file yet.</p>}
      {files.length > 0 && isKnown && missing.length > 0 && <p className="text-quiet">No file sent yet for: {missing.join(', ')}.</p>}
      {remove.isError && <ErrorNotice error={remove.error} />}
    </div>
  );
}

interface TakeOutProps {
  readonly name: string;
  /** Cells mended on screen, which go with the file. */
  readonly mended: number;
  readonly isPending: boolean;
  readonly onTakeOut: () => Promise<unknown>;
}

function TakeOut({ name, mended, isPending, onTakeOut }: TakeOutProps) {
  const shared = { variant: 'quiet', isPending, 'aria-label': `Take out ${name}`, children: 'Take out' } as const;
  if (mended === 0) return <Button {...shared} onPress={() => void onTakeOut().catch(() => undefined)} />;
  return (
    <ConfirmDialog
      trigger={<Button {...shared} />}
      title={`Take out ${name}?`}
      consequence={<p>{lossWords(mended)}</p>}
      confirm="Take it out"
      danger
      onConfirm={onTakeOut}
    />
  );
}

function FileFacts({ file: { table, tables: of, fileName, bytes, rows, sha256, mended, refused } }: { readonly file: SentFile }) {
  if (refused) {
    return (
      <span className="grid">
        <span className="break-all">{fileName}</span>
        <span className="font-semibold text-oxide">
          Not kept: it held something that identifies a person, or could not be read to its end. Send it again or take it out.
        </span>
      </span>
    );
  }
  return (
    <span className="grid">
      <span className="break-all">{fileName}</span>
      {table === null && of !== null && <span>{of.map(tableName).join(', ')}</span>}
      <span className="numbers text-small text-quiet">
        {formatBytes(bytes)}, {rows === null ? 'rows not counted yet' : formatCount(rows, 'row')}
        {mended > 0 && `, ${formatCount(mended, 'cell')} mended on screen`}, SHA-256{' '}
        <code>
          {sha256.slice(0, 12)}
          <span aria-hidden="true">…</span>
        </code>
      </span>
    </span>
  );
}
