/** The button that sends what may be sent. It asks once where something could be regretted. */
import type { Submission } from '@cairnstep/contract';
import { formatCount } from '../../lib/format.ts';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { PlaceList } from './look-outcome.tsx';
import { heldAs, isLookedAt, mayBeSent } from './outgoing-file.ts';
import type { Outgoing } from './outgoing-files.ts';

export interface SendFilesProps {
  readonly outgoing: Outgoing;
  /** The files that the registry has. */
  readonly held: Submission['files'];
  /** Something else has to be decided first. */
  readonly isDisabled: boolean;
  readonly onSend: () => Promise<void>;
}

export function SendFiles({ outgoing: { files, isSending }, held, isDisabled, onSend }: SendFilesProps) {
  const ready = files.filter(mayBeSent);
  const doubts = ready.flatMap(({ looked }) => looked?.doubts ?? []);
  const lost = ready.reduce((sum, { table }) => sum + (heldAs(table, held)?.mended ?? 0), 0);
  // A file that waits for its table is counted; one that cannot be sent is not.
  const count = files.filter(({ table }) => table === null).length + ready.length;
  const words = `Send ${formatCount(count, 'file')}`;

  if (isSending) return <Pending>Sending</Pending>;
  if (files.some(isLookedAt)) return <Pending>Looking through the files</Pending>;
  if (count === 0) return null;
  if (doubts.length + lost === 0 || isDisabled) {
    return (
      <Button variant="primary" isDisabled={isDisabled} onPress={() => void onSend()}>
        {words}
      </Button>
    );
  }
  return (
    <ConfirmDialog
      trigger={<Button variant="primary">{words}</Button>}
      title={ready.length === 1 ? 'Send this file?' : 'Send these files?'}
      consequence={
        <div className="grid gap-3">
          {doubts.length > 0 && (
            <div>
              <p>Something in what you send might tell who somebody is:</p>
              <PlaceList places={doubts} />
              <p>Send it only when you have looked, and it does not. The check asks for the reason once more.</p>
            </div>
          )}
          {lost > 0 && <p>{lossWords(lost)}</p>}
        </div>
      }
      confirm={words}
      cancel="Not yet"
      // The files tell how far they have come; the question is answered.
      onConfirm={() => {
        void onSend();
        return Promise.resolve();
      }}
    />
  );
}

function Pending({ children }: { readonly children: string }) {
  return (
    <Button variant="primary" isPending>
      {children}
    </Button>
  );
}

/** Mends belong to the file they were typed for. */
export const lossWords = (mended: number): string =>
  `${formatCount(mended, 'cell')} mended on this page ${mended === 1 ? 'is' : 'are'} lost with the old file. The findings workbook holds ${mended === 1 ? 'it' : 'them'}: take what you need from there first.`;
