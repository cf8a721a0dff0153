/** Why the warnings of one rule stand: asked for once, kept with the submission, printed on the receipt. */
import { acknowledgeFindings } from '@cairnstep/contract';
import type { Submission } from '@cairnstep/contract';
import { useState } from 'react';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Form } from '../../ui/form.tsx';
import { TextArea } from '../../ui/text-field.tsx';
import { useAcknowledge } from './submissions.queries.ts';

/** What was typed, by rule; it outlives a check, which begins the findings anew. */
export interface ReasonDrafts {
  readonly of: (rule: string) => string | undefined;
  readonly write: (rule: string, reason: string) => void;
}

export interface ReasonFormProps {
  readonly submissionId: string;
  readonly group: Submission['findings'][number];
  readonly drafts: ReasonDrafts;
}

const longest = 500;

export function ReasonForm({ submissionId, group: { rule, acknowledgedReason }, drafts }: ReasonFormProps) {
  const acknowledge = useAcknowledge(submissionId);
  const [isOpen, setOpen] = useState(acknowledgedReason === null);
  const [wasKept, setWasKept] = useState(false);
  const [attempt, setAttempt] = useState(0);
  const reason = drafts.of(rule) ?? acknowledgedReason ?? '';
  const [told, setTold] = useState<{ readonly reason: string; readonly problem: string } | null>(null);
  const problem = attempt === 0 ? undefined : (problemOf(reason) ?? (told?.reason === reason ? told.problem : undefined));

  async function keep(): Promise<void> {
    setAttempt(attempt + 1);
    if (problemOf(reason) !== undefined) return;
    const identifying = await identifyingProblem(reason);
    if (identifying !== null) return setTold({ reason, problem: identifying });
    acknowledge.mutate(
      { rule, reason },
      {
        onSuccess: () => {
          setAttempt(0);
          setOpen(false);
          setWasKept(true);
          announce(`The reason for rule ${rule} is kept.`);
        },
      },
    );
  }

  if (!isOpen && acknowledgedReason !== null) {
    return (
      <p className="max-w-2xl">
        <span className="text-quiet">Your reason: </span>
        {acknowledgedReason}{' '}
        <Button variant="quiet" autoFocus={wasKept} onPress={() => setOpen(true)} aria-label={`Change the reason for rule ${rule}`}>
          Change
        </Button>
      </p>
    );
  }
  const fieldId = `reason-${rule}`;
  return (
    <Form onSubmit={() => void keep()} attempt={attempt} problems={problem === undefined ? [] : [{ fieldId, message: problem }]}>
      <TextArea
        id={fieldId}
        label="Why these stand"
        hint="A few words about what happened. Nothing that could tell who it was."
        rows={2}
        maxLength={longest}
        isRequired
        value={reason}
        onChange={(words) => drafts.write(rule, words)}
        error={problem}
      />
      {acknowledge.isError && <ErrorNotice error={acknowledge.error} />}
      <div>
        <Button type="submit" isPending={acknowledge.isPending}>
          Keep this reason<span className="sr-only"> for rule {rule}</span>
        </Button>
      </div>
    </Form>
  );
}

/** Why the reason does not leave this browser; null when it may. */
async function identifyingProblem(reason: string): Promise<string | null> {
  try {
    const { identifyingIn } = await import('./screen-reason.ts');
    const kinds = identifyingIn(reason);
    return kinds.length === 0 ? null : `It holds ${kinds.join(' and ')}. Nothing was sent. Say why these stand without it.`;
  } catch {
    return 'It could not be looked through before sending: a part of this page did not load. Nothing was sent. Try again.';
  }
}

function problemOf(reason: string): string | undefined {
  const parsed = acknowledgeFindings.body?.shape.reason.safeParse(reason);
  return parsed?.error?.issues[0]?.message;
}
