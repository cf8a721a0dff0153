/** Codes that were replaced while the month was prepared without the server: their file is read here, and the registry told. */
import type { ResponseOf, replaceCodes, Site } from '@cairnstep/contract';
import { useState } from 'react';
import { formatBytes, formatCount } from '../../lib/format.ts';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { FileDrop } from '../../ui/file-drop.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';
import { useReplaceCodes } from './preparing.queries.ts';
import { largestReplacedCodesFile, readReplacedCodes } from './replaced-codes-file.ts';
import type { ReadCodes } from './replaced-codes-file.ts';

export function ReplacedCodesSection({ site }: { readonly site: Site }) {
  const { mutateAsync: replace, data: outcome, reset } = useReplaceCodes(site.id);
  const [read, setRead] = useState<ReadCodes | null>(null);

  async function take([file]: readonly File[]): Promise<void> {
    if (file === undefined) return;
    reset();
    setRead(
      file.size > largestReplacedCodesFile
        ? { fault: `The file is larger than ${formatBytes(largestReplacedCodesFile)}, which all codes of a site would not be.` }
        : readReplacedCodes(await file.text()),
    );
  }

  return (
    <Section
      title="Codes replaced without the server"
      id="replaced-codes"
      note={<p>Only participant codes are sent. The file is read in this browser, and anything else in it is refused here.</p>}
    >
      <div className="grid max-w-2xl justify-items-start gap-4">
        <p>
          A month that was prepared without the server may come with a file <code className="whitespace-nowrap">replaced-codes.csv</code>.
          Give it to the registry before the tables of that month.
        </p>
        <FileDrop label="File of replaced codes" accept={['.csv']} onFiles={(files) => void take(files)} />
        {read !== null && 'fault' in read && (
          <Notice kind="error" title={read.fault} urgent>
            <p>Nothing was sent. Choose the file as it was saved when the month was prepared.</p>
          </Notice>
        )}
        {read !== null && 'codes' in read && (
          <>
            <p>The file holds {formatCount(read.codes.length, 'code')} to be replaced.</p>
            <ConfirmDialog
              trigger={<Button variant="primary">Replace {formatCount(read.codes.length, 'code')}</Button>}
              title={`Replace ${formatCount(read.codes.length, 'code')} of ${site.name} (${site.code})?`}
              consequence={
                <p>
                  Every row of these people and its history stands under the new code from then on, and files with an old one are refused.
                  It cannot be taken back. Months that are being checked have to be checked again.
                </p>
              }
              confirm="Replace the codes"
              onConfirm={async () => {
                await replace(read.codes);
                setRead(null);
              }}
            />
          </>
        )}
        {outcome !== undefined && <Notice kind="success" title={outcomeWords(outcome)} urgent />}
      </div>
    </Section>
  );
}

function outcomeWords({ replaced, unknown }: ResponseOf<typeof replaceCodes>): string {
  const words = `The registry has replaced ${formatCount(replaced, 'code')}.`;
  return unknown === 0 ? words : `${words} Of ${formatCount(unknown, 'code')} it held no row.`;
}
