/** All findings to work off elsewhere: as a list, or in the cells of the files. */
import { downloadFindings, downloadFindingsWorkbook } from '@cairnstep/contract';
import type { Submission } from '@cairnstep/contract';
import { addressOf } from '../../lib/call.ts';
import { AddressButton } from '../../ui/button.tsx';

export function DownloadFindings({ submission, name }: { readonly submission: Submission; readonly name: string }) {
  const input = { submissionId: submission.id };
  return (
    <div className="grid justify-items-start gap-2">
      <div className="flex flex-wrap gap-3">
        <AddressButton href={addressOf(downloadFindingsWorkbook, input)} download={`${name}.xlsx`}>
          Download the files with the findings in their cells
        </AddressButton>
        <AddressButton href={addressOf(downloadFindings, input)} download={`${name}.csv`}>
          Download the findings as CSV
        </AddressButton>
      </div>
      <p className="max-w-2xl text-small text-quiet">
        The workbook colours each cell that a finding names and tells what is wrong with it. Corrected, it can be sent in place of the
        files.
      </p>
    </div>
  );
}
