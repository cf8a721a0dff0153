import { formatCount } from '../lib/format.ts';
import { Button } from '../ui/button.tsx';
import { Progress } from '../ui/progress.tsx';
import { KeyRefusal } from './key/key-refusal.tsx';
import { Outcome } from './outcome.tsx';
import type { Surroundings } from './surroundings.ts';
import { useAct } from './use-act.ts';
import type { Month } from './use-month.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface SendTablesProps {
  readonly month: Month;
  readonly prepared: PreparedPicture;
  readonly surroundings: Surroundings;
  /** What has to be done first; null when nothing has. */
  readonly obstacle: string | null;
}

/** Gives what was prepared to the page around, which sends it, and follows how far that has come. */
export function SendTables({ month, prepared: { tables }, surroundings, obstacle }: SendTablesProps) {
  const { sending, picture } = month.state;
  const giving = useAct();
  const rows = tables.reduce((sum, table) => sum + table.rows, 0);
  const what = `${formatCount(rows, 'row')} in ${formatCount(tables.length, 'table')}`;
  const isDone = sending?.state === 'done';

  const send = () =>
    void giving.run(async () => {
      const given = await month.ask('tables-to-send', null);
      month.sendingIs({ kind: 'sending', state: 'under-way', done: 0, of: given.tables.length, message: null });
      surroundings.tell({ kind: 'send', ...given });
    });

  return (
    <>
      <div className="grid justify-items-start gap-2">
        <Button
          variant={picture?.key?.isUnsaved === true ? 'secondary' : 'primary'}
          isDisabled={obstacle !== null || isDone}
          isPending={giving.isPending || sending?.state === 'under-way'}
          onPress={send}
        >
          {sending?.state === 'failed' ? `Send ${what} again` : `Send ${what}`}
        </Button>
        {obstacle !== null && !isDone && <p className="text-quiet">{obstacle}</p>}
        <KeyRefusal refusal={giving.refusal} />
      </div>
      {sending?.state === 'under-way' && (
        <Progress
          label="Sending"
          part={sending.of === 0 ? null : sending.done / sending.of}
          words={`${Math.floor(sending.done)} of ${formatCount(sending.of, 'table')} sent`}
        />
      )}
      {sending?.state === 'failed' && (
        <Outcome kind="error" title={sending.message ?? 'The sending failed.'}>
          <p>What was prepared is still here, and the key file is saved. You can send again.</p>
        </Outcome>
      )}
      {isDone && (
        <Outcome kind="success" title={`${what} were sent.`}>
          <Button variant="primary" onPress={() => surroundings.tell({ kind: 'finished' })}>
            Go on to the check
          </Button>
        </Outcome>
      )}
    </>
  );
}
