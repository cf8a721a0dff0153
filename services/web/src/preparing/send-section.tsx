/** The last step: the key file saved, then what was prepared sent, or saved as files where there is no page around this one. */
import { useState } from 'react';
import { Button } from '../ui/button.tsx';
import { Checkbox } from '../ui/checkbox.tsx';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { formatCount, formatNumber } from '../lib/format.ts';
import { changeWords } from './key/change-words.ts';
import { KeyRefusal } from './key/key-refusal.tsx';
import { obstacleToSending, worthALook } from './month-state.ts';
import { SaveFiles } from './save-files.tsx';
import { SendTables } from './send-tables.tsx';
import type { Surroundings } from './surroundings.ts';
import { useAct } from './use-act.ts';
import type { Month } from './use-month.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface SendSectionProps {
  readonly title: string;
  readonly month: Month;
  readonly prepared: PreparedPicture;
  readonly site: string;
  /** `2026-11` */
  readonly calendarMonth: string;
  /** Null: nobody to give it to, so it is saved as files. */
  readonly surroundings: Surroundings | null;
}

export function SendSection({ title, month, prepared, site, calendarMonth, surroundings }: SendSectionProps) {
  /** What was looked at: when it is worked out anew, it has to be looked at anew. */
  const [lookedAt, setLookedAt] = useState<PreparedPicture | null>(null);
  const isLookedAt = lookedAt === prepared;
  const things = worthALook(prepared, month.state.picture?.key ?? null);
  const obstacle = obstacleToSending(month.state, isLookedAt);
  return (
    <Section
      title={title}
      id="send"
      note={
        <>
          <p>The key file comes first: what it does not hold yet could never be linked again, once it has been sent.</p>
          <p>If you work in turns with another coordinator, put the new key file where both of you find it.</p>
        </>
      }
    >
      <div className="grid max-w-2xl gap-6">
        {prepared.newToKey !== null && <UnknownRegistry people={prepared.people} newToKey={prepared.newToKey} />}
        {things.length > 0 && (
          <Checkbox id="looked-at" value={isLookedAt} onChange={(isTicked) => setLookedAt(isTicked ? prepared : null)}>
            I have looked at {things.join('; at ')}.
          </Checkbox>
        )}
        <SaveKey month={month} />
        {surroundings === null ? (
          <SaveFiles month={month} prepared={prepared} site={site} calendarMonth={calendarMonth} obstacle={obstacle} />
        ) : (
          <SendTables month={month} prepared={prepared} surroundings={surroundings} obstacle={obstacle} />
        )}
      </div>
    </Section>
  );
}

/** Without the registry an older key file is not told from the newest. */
function UnknownRegistry({ people, newToKey }: { readonly people: number; readonly newToKey: number }) {
  return (
    <Notice title="This page cannot know which codes the registry holds: use the newest key file.">
      <p>
        The key file that was opened knows {formatNumber(people - newToKey)} of the {formatCount(people, 'person', 'people')} in these
        files. Anybody else gets a new code here, though a newer key file may have one for them.
      </p>
    </Notice>
  );
}

function SaveKey({ month }: { readonly month: Month }) {
  const { picture, savedAs } = month.state;
  const saving = useAct();
  const isUnsaved = picture?.key?.isUnsaved === true;
  const changes = picture?.key == null ? [] : changeWords(picture.key);
  return (
    <div className="grid justify-items-start gap-2">
      <Button variant={isUnsaved ? 'primary' : 'secondary'} isPending={saving.isPending} onPress={() => void saving.run(month.saveKey)}>
        {isUnsaved ? 'Save the key file' : 'Save the key file again'}
      </Button>
      <p className="text-quiet">
        {isUnsaved
          ? `The key holds what its file does not: ${changes.join('; ')}. Save it before anything is sent, on your site’s own storage, twice.`
          : savedAs === null
            ? 'The key file holds everything that later months need.'
            : `Saved as ${savedAs}. Move it to your site’s own storage, and keep a second copy there.`}
      </p>
      <KeyRefusal refusal={saving.refusal} />
    </div>
  );
}
