/** The last step where there is only a key: its file saved, and the registry told of the codes that were replaced. */
import { useState } from 'react';
import { formatCount } from '../lib/format.ts';
import { Button } from '../ui/button.tsx';
import { Section } from '../ui/page.tsx';
import { changeWords } from './key/change-words.ts';
import { KeyRefusal } from './key/key-refusal.tsx';
import { Outcome } from './outcome.tsx';
import type { Surroundings } from './surroundings.ts';
import { useAct } from './use-act.ts';
import type { Month } from './use-month.ts';
import type { KeyPicture } from './worker/protocol.ts';

export interface ReplaceCodesSectionProps {
  readonly month: Month;
  readonly keyPicture: KeyPicture;
  readonly surroundings: Surroundings | null;
}

export function ReplaceCodesSection({ month, keyPicture, surroundings }: ReplaceCodesSectionProps) {
  const { isUnsaved, codesToReplace } = keyPicture;
  const { sending, savedAs } = month.state;
  const [isSavedHere, setSavedHere] = useState(false);
  const [told, setTold] = useState(0);
  const saving = useAct();
  const telling = useAct();
  if (!isUnsaved && codesToReplace === 0 && sending === null && !isSavedHere) return null;

  const save = () =>
    void saving.run(async () => {
      await month.saveKey();
      setSavedHere(true);
    });
  const tell = (to: Surroundings) =>
    void telling.run(async () => {
      const replacedCodes = await month.ask('codes-to-replace', null);
      setTold(replacedCodes.length);
      setSavedHere(false);
      month.sendingIs({ kind: 'sending', state: 'under-way', done: 0, of: 1, message: null });
      to.tell({ kind: 'replace-codes', replacedCodes });
    });

  return (
    <Section title="Save" id="save-key" note={<p>The key file comes first: codes that the registry replaces must be in it.</p>}>
      <div className="grid max-w-2xl justify-items-start gap-4">
        {isUnsaved && (
          <>
            <p>The key holds what its file does not: {changeWords(keyPicture).join('; ')}. Save it on your site’s own storage, twice.</p>
            <Button variant="primary" isPending={saving.isPending} onPress={save}>
              Save the key file
            </Button>
            <KeyRefusal refusal={saving.refusal} />
          </>
        )}
        {isSavedHere && savedAs !== null && !isUnsaved && sending === null && (
          <Outcome kind="success" title={`The key file is saved as ${savedAs}.`} />
        )}
        {codesToReplace > 0 && surroundings !== null && (
          <>
            <p>
              {formatCount(codesToReplace, 'code')} of the registry {codesToReplace === 1 ? 'has' : 'have'} to be replaced.
            </p>
            <Button isDisabled={isUnsaved} isPending={sending?.state === 'under-way'} onPress={() => tell(surroundings)}>
              Tell the registry
            </Button>
            {isUnsaved && <p className="text-quiet">Save the key file first.</p>}
          </>
        )}
        <KeyRefusal refusal={telling.refusal} />
        {sending?.state === 'failed' && (
          <Outcome kind="error" title={sending.message ?? 'The registry could not be told.'}>
            <p>The key file is saved. You can try again.</p>
          </Outcome>
        )}
        {sending?.state === 'done' && <Outcome kind="success" title={`The registry has replaced ${formatCount(told, 'code')}.`} />}
      </div>
    </Section>
  );
}
