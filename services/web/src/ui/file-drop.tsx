import { useState } from 'react';
import { Button } from 'react-aria-components/Button';
import { DropZone } from 'react-aria-components/DropZone';
import { FileTrigger } from 'react-aria-components/FileTrigger';
import { Text } from 'react-aria-components/Text';

export interface FileDropProps {
  /** What belongs here, for example "Session files of November 2026". */
  readonly label: string;
  readonly hint?: string;
  /** Name endings, with the dot: `['.csv', '.xlsx']`. */
  readonly accept: readonly string[];
  readonly multiple?: boolean;
  readonly isDisabled?: boolean;
  readonly onFiles: (files: readonly File[]) => void;
}

/** Takes files by drop, by paste or through the system's file window. A file of another kind is named and left out. */
export function FileDrop({ label, hint, accept, multiple = false, isDisabled = false, onFiles }: FileDropProps) {
  const [refused, setRefused] = useState<readonly string[]>([]);

  function take(files: readonly File[]): void {
    const fits = (file: File) => accept.some((ending) => file.name.toLowerCase().endsWith(ending));
    const taken = files.filter(fits).slice(0, multiple ? undefined : 1);
    setRefused(files.filter((file) => !taken.includes(file)).map(({ name }) => name));
    if (taken.length > 0) onFiles(taken);
  }

  return (
    <div className="grid gap-2">
      <DropZone
        isDisabled={isDisabled}
        onDrop={async (event) => take(await Promise.all(event.items.filter((item) => item.kind === 'file').map((item) => item.getFile())))}
        className="grid justify-items-start gap-2 rounded-sm border border-dashed border-edge bg-paper p-4 data-[drop-target]:border-solid data-[drop-target]:border-lichen data-[drop-target]:bg-chosen data-[focus-visible]:outline-2 data-[focus-visible]:outline-offset-2 data-[focus-visible]:outline-lake"
      >
        <Text slot="label" className="font-semibold">
          {label}
        </Text>
        {hint !== undefined && <p className="text-small text-quiet">{hint}</p>}
        <FileTrigger acceptedFileTypes={accept} allowsMultiple={multiple} onSelect={(files) => take([...(files ?? [])])}>
          <Button
            isDisabled={isDisabled}
            className="min-h-10 rounded-sm border border-edge bg-sheet px-4 py-1.5 font-semibold hover:border-ink disabled:text-quiet"
          >
            {multiple ? 'Choose files' : 'Choose a file'}
          </Button>
        </FileTrigger>
        <p className="text-small text-quiet">
          or drop {multiple ? 'them' : 'it'} here. Accepted: {accept.join(', ')}
        </p>
      </DropZone>
      {refused.length > 0 && (
        <p role="alert" className="border-l-4 border-oxide pl-2 font-semibold text-oxide">
          Left out: {refused.join(', ')}. {multiple ? 'Files' : 'One file'} ending in {accept.join(' or ')} can be used here.
        </p>
      )}
    </div>
  );
}
