import { useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Form } from '../../ui/form.tsx';
import { Outcome } from '../outcome.tsx';
import { useAct } from '../use-act.ts';
import type { Month } from '../use-month.ts';
import { DrawnWordsFields } from './drawn-words-fields.tsx';
import { KeyRefusal } from './key-refusal.tsx';
import { useDrawnWords } from './use-drawn-words.ts';

/** New words for the same key. */
export function ChangePassphrase({ month }: { readonly month: Month }) {
  const [attempt, setAttempt] = useState(0);
  const [isChanged, setChanged] = useState(false);
  const changing = useAct();
  const drawn = useDrawnWords(month.ask, 'new-passphrase');
  const problems = attempt === 0 ? [] : drawn.missing;

  function change(): void {
    if (drawn.missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void changing.run(async () => {
      const picture = await month.ask('change-passphrase', { passphrase: drawn.passphrase });
      setChanged(true);
      await month.keyChanged(picture);
    });
  }

  return (
    <Form onSubmit={change} problems={problems} attempt={attempt}>
      <p>
        The file that you save next is locked with the new words. Copies saved before stay locked with the old ones: delete them, once the
        new file is where it belongs.
      </p>
      {isChanged ? (
        <Outcome kind="success" title="The key has a new passphrase. Save the key file." />
      ) : (
        <>
          <DrawnWordsFields drawn={drawn} problems={problems} />
          <KeyRefusal refusal={changing.refusal} />
          <div>
            <Button type="submit" isPending={changing.isPending}>
              Use these words
            </Button>
          </div>
        </>
      )}
    </Form>
  );
}
