import { useState } from 'react';
import { Button } from '../../ui/button.tsx';
import { Form } from '../../ui/form.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { Outcome } from '../outcome.tsx';
import { useAct } from '../use-act.ts';
import type { Month } from '../use-month.ts';
import { KeyRefusal } from './key-refusal.tsx';
import { replacedWords } from './replaced-words.ts';

/** One person is twice in the clinic’s system. */
export function JoinNumbers({ month }: { readonly month: Month }) {
  const [kept, setKept] = useState('');
  const [joined, setJoined] = useState('');
  const [done, setDone] = useState<{ readonly replaced: number; readonly firstDayMoved: string | null } | null>(null);
  const [attempt, setAttempt] = useState(0);
  const joining = useAct();
  const missing = [
    ...(kept.trim() === '' ? [{ fieldId: 'join-kept', message: 'Give the record number that stays.' }] : []),
    ...(joined.trim() === '' ? [{ fieldId: 'join-joined', message: 'Give the other record number.' }] : []),
  ];
  const problems = attempt === 0 ? [] : missing;

  function join(): void {
    setDone(null);
    if (missing.length > 0) {
      setAttempt(attempt + 1);
      return;
    }
    setAttempt(0);
    void joining.run(async () => {
      const { picture, ...result } = await month.ask('join-numbers', { kept, joined });
      setDone(result);
      setKept('');
      setJoined('');
      await month.keyChanged(picture);
    });
  }

  return (
    <Form onSubmit={join} problems={problems} attempt={attempt}>
      <p>When your clinic’s system has the same person twice, both record numbers can lead to one code.</p>
      <TextField
        id="join-kept"
        label="Record number whose code stays"
        autoComplete="off"
        value={kept}
        onChange={setKept}
        error={problems.find(({ fieldId }) => fieldId === 'join-kept')?.message}
        isRequired
      />
      <TextField
        id="join-joined"
        label="The other record number of this person"
        autoComplete="off"
        value={joined}
        onChange={setJoined}
        error={problems.find(({ fieldId }) => fieldId === 'join-joined')?.message}
        isRequired
      />
      <KeyRefusal refusal={joining.refusal} />
      {done !== null && (
        <Outcome kind="success" title="Both record numbers lead to one code now. Save the key file.">
          <p>{replacedWords(done.replaced)}</p>
          {done.firstDayMoved !== null && (
            <p>
              The two had different first training days; the earlier one counts. Send all rows of this person again:{' '}
              <span className="font-mono wrap-anywhere">{done.firstDayMoved}</span>
            </p>
          )}
        </Outcome>
      )}
      <div>
        <Button type="submit" isPending={joining.isPending}>
          Join the two
        </Button>
      </div>
    </Form>
  );
}
