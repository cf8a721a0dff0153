/** The last step: the key file saved, then what was prepared sent, or saved as files where there is no page around this one. */
import { useState } from 'react';
import { formatCount } from '../lib/format.ts';
import { saveFile } from '../lib/save-file.ts';
import { announce } from '../ui/announcer.tsx';
import { Button } from '../ui/button.tsx';
import { Checkbox } from '../ui/checkbox.tsx';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { Progress } from '../ui/progress.tsx';
import { KeyRefusal } from './key/key-refusal.tsx';
import { obstacleToSending } from './month-state.ts';
import type { PreparedTable, ReplacedCodes } from './messages.ts';
import { preparedFiles } from './prepared-files.ts';
import type { Surroundings } from './surroundings.ts';
import { useAct } from './use-act.ts';
import type { Month } from './use-month.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface SendSectionProps {
  readonly month: Month;
  readonly prepared: PreparedPicture;
  readonly site: string;
  /** `2026-11` */
  readonly calendarMonth: string;
  /** Null: nobody to give it to, so it is saved as files. */
  readonly surroundings: Surroundings | null;
}

export function SendSection({ month, prepared, site, calendarMonth, surroundings }: SendSectionProps) {
  const { picture, savedAs, sending } = month.state;
  /** The problems that were looked at: new ones have to be looked at anew. */
  const [lookedAt, setLookedAt] = useState<PreparedPicture['problems'] | null>(null);
  const saving = useAct();
  const giving = useAct();
  const { problems, tables } = prepared;
  const isLookedAt = lookedAt === problems;

  const isKeyUnsaved = picture?.key?.isUnsaved === true;
  const obstacle = obstacleToSending(month.state, isLookedAt);
  const what = `${formatCount(
    tables.reduce((sum, { rows }) => sum + rows, 0),
    'row',
  )} in ${formatCount(tables.length, 'table')}`;
  const isUnderWay = sending?.state === 'under-way';
  const isDone = sending?.state === 'done';

  const give = (to: (tables: PreparedTable[], replacedCodes: ReplacedCodes) => void) =>
    void giving.run(async () => {
      const { tables: files, replacedCodes } = await month.ask('tables-to-send', null);
      to(files, replacedCodes);
    });
  const send = (to: Surroundings) => {
    month.sendingIs({ kind: 'sending', state: 'under-way', done: 0, of: tables.length, message: null });
    give((files, replacedCodes) => to.tell({ kind: 'send', tables: files, replacedCodes }));
  };
  const saveFiles = () =>
    give((files, replacedCodes) => {
      for (const { name, content, type } of preparedFiles({ site, calendarMonth, prepared, files, replacedCodes }))
        saveFile(name, content, type);
      month.sendingIs({ kind: 'sending', state: 'done', done: files.length, of: files.length, message: null });
      void month.codesReplaced();
      announce('The cleaned files are saved.');
    });

  return (
    <Section
      title={surroundings === null ? 'Save' : 'Save and send'}
      id="send"
      note={
        <>
          <p>The key file comes first: what it does not hold yet could never be linked again, once it has been sent.</p>
          <p>If you work in turns with another coordinator, put the new key file where both of you find it.</p>
        </>
      }
    >
      <div className="grid max-w-2xl gap-6">
        {problems.length > 0 && (
          <Checkbox id="looked-at" value={isLookedAt} onChange={(isTicked) => setLookedAt(isTicked ? problems : null)}>
            I have looked at the {formatCount(problems.length, 'thing')} to mend or to know. What cannot be read stays at the clinic.
          </Checkbox>
        )}
        <div className="grid justify-items-start gap-2">
          <Button
            variant={isKeyUnsaved ? 'primary' : 'secondary'}
            isPending={saving.isPending}
            onPress={() => void saving.run(month.saveKey)}
          >
            {isKeyUnsaved ? 'Save the key file' : 'Save the key file again'}
          </Button>
          <p className="text-quiet">
            {isKeyUnsaved
              ? 'This month has added to the key. Save it before anything is sent, on your site’s own storage, twice.'
              : savedAs === null
                ? 'The key file holds everything already.'
                : `Saved as ${savedAs}. Move it to your site’s own storage, and keep a second copy there.`}
          </p>
          <KeyRefusal refusal={saving.refusal} />
        </div>
        <div className="grid justify-items-start gap-2">
          {surroundings === null ? (
            <Button
              variant={isKeyUnsaved ? 'secondary' : 'primary'}
              isDisabled={obstacle !== null}
              isPending={giving.isPending}
              onPress={saveFiles}
            >
              Save {formatCount(tables.length, 'cleaned file')}
            </Button>
          ) : (
            <Button
              variant={isKeyUnsaved ? 'secondary' : 'primary'}
              isDisabled={obstacle !== null || isDone}
              isPending={isUnderWay}
              onPress={() => send(surroundings)}
            >
              {sending?.state === 'failed' ? `Send ${what} again` : `Send ${what}`}
            </Button>
          )}
          {obstacle !== null && !isDone && <p className="text-quiet">{obstacle}</p>}
          <KeyRefusal refusal={giving.refusal} />
        </div>
        {isUnderWay && (
          <Progress
            label="Sending"
            part={sending.of === 0 ? null : sending.done / sending.of}
            words={`${Math.floor(sending.done)} of ${formatCount(sending.of, 'table')} sent`}
          />
        )}
        {sending?.state === 'failed' && (
          <Notice kind="error" title={sending.message ?? 'The sending failed.'} urgent>
            <p>What was prepared is still here, and the key file is saved. You can send again.</p>
          </Notice>
        )}
        {isDone &&
          (surroundings === null ? (
            <Notice kind="success" title="The cleaned files are saved.">
              <p>
                Your browser has put them where it puts downloads; it may have asked whether several are allowed. Send the files of the
                tables on the month’s page of the registry. The text beside them says what was prepared.
              </p>
            </Notice>
          ) : (
            <Notice kind="success" title={`${what} were sent.`}>
              <Button variant="primary" onPress={() => surroundings.tell({ kind: 'finished' })}>
                Go on to the check
              </Button>
            </Notice>
          ))}
      </div>
    </Section>
  );
}
