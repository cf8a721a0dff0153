import { useState } from 'react';
import { formatCount } from '../../lib/format.ts';
import { Outcome } from '../outcome.tsx';
import type { Month } from '../use-month.ts';
import { OpenKeyForm } from './open-key-form.tsx';
import { replacedWords } from './replaced-words.ts';

/** Two coordinators went on with copies of the same key. */
export function MergeKeys({ month }: { readonly month: Month }) {
  const [merged, setMerged] = useState<{ readonly replaced: number; readonly firstDaysMoved: readonly string[] } | null>(null);

  async function merge(file: File, passphrase: string): Promise<void> {
    const { picture, ...result } = await month.ask('merge-key', { file, passphrase });
    setMerged(result);
    await month.keyChanged(picture);
  }

  return (
    <>
      <p>
        When two coordinators went on with copies of the same key, make one out of them: open the other copy here as well. Where both gave a
        person a code, one of the two is kept. From then on, both coordinators use the file saved below. Better still: one of you saves, the
        other opens what was saved.
      </p>
      <OpenKeyForm id="merge-key" label="The other copy of the key file" act="Make one key of both" onOpen={merge} />
      {merged !== null && (
        <Outcome kind="success" title="The two copies are one now. Save the key file.">
          <p>{replacedWords(merged.replaced)}</p>
          {merged.firstDaysMoved.length > 0 && (
            <p>
              The first training day of {formatCount(merged.firstDaysMoved.length, 'person', 'people')} differed between the copies; the
              earlier one counts. Send all rows of these people again:{' '}
              <span className="font-mono wrap-anywhere">{merged.firstDaysMoved.join(', ')}</span>
            </p>
          )}
        </Outcome>
      )}
    </>
  );
}
