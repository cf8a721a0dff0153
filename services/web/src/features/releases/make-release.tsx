import { useState } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { ProblemError } from '../../lib/problem-error.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Form } from '../../ui/form.tsx';
import { Section } from '../../ui/page.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useMakeRelease } from './releases.queries.ts';

const shortestNote = 3;

/** `number`: the one the next release would have. */
export function MakeRelease({ number }: { readonly number: number }) {
  const [note, setNote] = useState('');
  const [problems, setProblems] = useState<readonly PlacedProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const make = useMakeRelease();
  const isComplete = note.trim().length >= shortestNote;

  function show(found: readonly PlacedProblem[]): void {
    setProblems(found);
    setAttempt(attempt + 1);
  }

  async function send(): Promise<void> {
    try {
      const made = await make.mutateAsync(note.trim());
      setNote('');
      announce(`Release ${made.number} was made.`);
    } catch (error) {
      if (!(error instanceof ProblemError && error.code === 'invalid-input')) throw error;
      show(problemsOf(error, { '/note': 'note' }));
    }
  }

  return (
    <Section
      title={`Make release ${number}`}
      note={<p>Best after a month in which most sites have submitted and the open questions are answered.</p>}
    >
      <Form
        onSubmit={() => show([{ fieldId: 'note', message: 'Say in a few words what this release is for.' }])}
        problems={problems}
        attempt={attempt}
      >
        <TextField
          id="note"
          label="What this release is for"
          hint="For example: figures for the consortium meeting in March"
          isRequired
          maxLength={200}
          value={note}
          error={problems[0]?.message}
          onChange={(text) => {
            setProblems([]);
            setNote(text);
          }}
        />
        <div>
          {isComplete ? (
            <ConfirmDialog
              trigger={<Button variant="primary">Make release {number}</Button>}
              title={`Make release ${number}?`}
              consequence={
                <p>
                  It freezes the registry as it is now. It can neither be changed nor taken back, and becomes what everyone sees first, the
                  public page included.
                </p>
              }
              confirm={`Make release ${number}`}
              cancel="Not now"
              onConfirm={send}
            />
          ) : (
            <Button type="submit" variant="primary">
              Make release {number}
            </Button>
          )}
        </div>
      </Form>
    </Section>
  );
}
