import { useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { TextArea } from '../../ui/text-field.tsx';
import { Outcome } from '../outcome.tsx';
import { useAct } from '../use-act.ts';
import type { Month } from '../use-month.ts';
import { KeyRefusal } from './key-refusal.tsx';
import { replacedWords } from './replaced-words.ts';

/** A new secret, and new codes with it. */
export function RotateKey({ month }: { readonly month: Month }) {
  const [numbers, setNumbers] = useState('');
  const [isAsking, setAsking] = useState(false);
  const [carriedOver, setCarriedOver] = useState<number | null>(null);
  const rotating = useAct();

  const rotate = () =>
    void rotating.run(async () => {
      const recordNumbers = numbers.split(/[\r\n;]+/).filter((each) => each.trim() !== '');
      const done = await month.ask('rotate-key', { recordNumbers });
      setCarriedOver(done.carriedOver);
      setAsking(false);
      setNumbers('');
      await month.keyChanged(done.picture);
    });

  return (
    <>
      <p>
        Draw a new secret when somebody may have seen the key file together with its passphrase, or when somebody who knew it has left. The
        codes made with the old secret are replaced in the registry by new ones; nothing else of the registry changes. Take a new passphrase
        as well, under the next heading.
      </p>
      <p>
        The people whose record numbers you list are carried over now. Everybody else is carried over when their record number is met in a
        later month; until then the key file keeps the old secret.
      </p>
      <TextArea
        id="rotate-numbers"
        label="Record numbers to carry over now"
        hint="One a line. Leave it empty to carry everybody over when they are met."
        value={numbers}
        onChange={setNumbers}
      />
      <KeyRefusal refusal={rotating.refusal} />
      {carriedOver !== null && (
        <Outcome kind="success" title="The key has a new secret. Save the key file.">
          <p>{replacedWords(carriedOver)} Older copies of the file must not be used any more.</p>
        </Outcome>
      )}
      {isAsking ? (
        <div role="group" aria-labelledby="rotate-question" className="grid gap-3">
          <p id="rotate-question" className="font-semibold">
            Draw a new secret? Codes that are replaced stay replaced, and copies of the key file saved before become useless.
          </p>
          <div className="flex flex-wrap gap-3">
            <Button variant="danger" isPending={rotating.isPending} onPress={rotate} autoFocus>
              Draw a new secret
            </Button>
            <Button onPress={() => setAsking(false)}>Leave it as it is</Button>
          </div>
        </div>
      ) : (
        <div>
          <Button onPress={() => setAsking(true)}>Draw a new secret</Button>
        </div>
      )}
    </>
  );
}
