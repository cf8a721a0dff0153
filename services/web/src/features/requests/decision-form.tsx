import type { AccessRequest } from '@cairnstep/contract';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { problemsOf } from '../../lib/field-problems.ts';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import { formatCount } from '../../lib/format.ts';
import { ProblemError } from '../../lib/problem-error.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { Checkbox } from '../../ui/checkbox.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Form } from '../../ui/form.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { TextArea } from '../../ui/text-field.tsx';
import { useDecideRequest } from './requests.queries.ts';

/** A requester has to be able to learn something from it. */
const shortestReason = 10;

const fieldIds = { '/vote': 'vote', '/reason': 'reason', '/noConflict': 'no-conflict' };

export interface DecisionFormProps {
  readonly request: AccessRequest;
  /** Whom an approval would reach; null until it is known. */
  readonly consenting: number | null;
}

export function DecisionForm({ request, consenting }: DecisionFormProps) {
  const [vote, setVote] = useState<'approve' | 'decline' | null>(null);
  const [reason, setReason] = useState('');
  const [noConflict, setNoConflict] = useState(false);
  const [problems, setProblems] = useState<readonly PlacedProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const decide = useDecideRequest(request.id);

  const errorOf = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;
  const mend = (id: string) => setProblems((before) => before.filter(({ fieldId }) => fieldId !== id));
  function show(found: readonly PlacedProblem[]): void {
    setProblems(found);
    setAttempt(attempt + 1);
  }

  function missing(): PlacedProblem[] {
    return [
      ...(vote === null ? [{ fieldId: 'vote', message: 'Choose whether to approve or to decline.' }] : []),
      ...(reason.trim().length < shortestReason ? [{ fieldId: 'reason', message: 'Give a reason the requester can understand.' }] : []),
      ...(noConflict ? [] : [{ fieldId: 'no-conflict', message: 'State that you have no interest in this request.' }]),
    ];
  }

  async function send(): Promise<void> {
    if (vote === null) return;
    try {
      const { status } = await decide.mutateAsync({ versionHash: request.versionHash, vote, reason: reason.trim() });
      announce(status === 'approved' || status === 'declined' ? `Request ${request.number} is ${status}.` : 'Your decision was recorded.');
    } catch (error) {
      if (!(error instanceof ProblemError && error.code === 'invalid-input')) throw error;
      show(problemsOf(error, fieldIds));
    }
  }

  return (
    <Form onSubmit={() => show(missing())} problems={problems} attempt={attempt}>
      <RadioGroup
        id="vote"
        label="Your decision"
        isRequired
        value={vote}
        error={errorOf('vote')}
        onChange={(next) => {
          mend('vote');
          setVote(next === 'approve' ? 'approve' : 'decline');
        }}
        options={[
          { value: 'approve', label: 'Approve' },
          { value: 'decline', label: 'Decline' },
        ]}
      />
      <TextArea
        id="reason"
        label="Reason"
        hint="The requester reads it with the decision. Say what convinced you, or what would have to be different."
        isRequired
        maxLength={2000}
        value={reason}
        error={errorOf('reason')}
        onChange={(next) => {
          mend('reason');
          setReason(next);
        }}
      />
      <Checkbox
        id="no-conflict"
        isRequired
        value={noConflict}
        error={errorOf('no-conflict')}
        onChange={(next) => {
          mend('no-conflict');
          setNoConflict(next);
        }}
      >
        I have no interest in this request: I am not part of the team, do not work with it on this question, and gain nothing from the
        outcome.
      </Checkbox>
      <div>
        {vote === null || missing().length > 0 ? (
          <Button type="submit" variant="primary">
            Decide
          </Button>
        ) : (
          <ConfirmDialog
            trigger={<Button variant="primary">Decide</Button>}
            title={vote === 'approve' ? `Approve request ${request.number}?` : `Decline request ${request.number}?`}
            consequence={<Consequence request={request} vote={vote} consenting={consenting} />}
            confirm={vote === 'approve' ? 'Approve it' : 'Decline it'}
            cancel="Read it again"
            danger={vote === 'decline'}
            onConfirm={send}
          />
        )}
      </div>
    </Form>
  );
}

function Consequence({ request, vote, consenting }: DecisionFormProps & { readonly vote: 'approve' | 'decline' }): ReactNode {
  const { form, votesNeeded } = request;
  const several = votesNeeded > 1 ? ` ${votesNeeded} stewards have to agree; until then it stays under review.` : '';
  return (
    <div className="grid gap-2">
      {vote === 'approve' ? (
        <p>
          The team may export the rows of{' '}
          {consenting === null
            ? 'all people whose consent permits it'
            : `up to ${formatCount(consenting, 'consenting person', 'consenting people')}`}{' '}
          for {formatCount(form.months ?? 1, 'month')}.{several}
        </p>
      ) : (
        <p>The team gets no rows under this request, and it cannot be handed in again.{several}</p>
      )}
      <p>The requester is told by e-mail, with your reason. Your decision is recorded for good and cannot be changed.</p>
    </div>
  );
}
