/** Asked beside a cell: how a tagged cell counts and what affects it, or why a cell was not tested. Answered by digits alone. */
import { useEffect, useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { Button } from '../../ui/button.tsx';
import type { Act } from './entry.ts';
import { cellTitle, ntReasons, tagCauses } from './exam-sheet.ts';
import type { Treatment } from './exam-sheet.ts';
import { NumberedChoice, optionOfDigit } from './numbered-choice.tsx';
import type { Question } from './entry.ts';

const treatments: readonly { readonly value: Treatment; readonly label: string }[] = [
  { value: 'not-normal', label: 'As not normal: usual at or below the level of injury' },
  { value: 'normal', label: 'As normal: usual above the level of injury' },
];
const causes = tagCauses.map(({ code, label }) => ({ value: code, label }));
const reasons = ntReasons.map(({ code, label }) => ({ value: code, label }));

export interface CellQuestionProps {
  readonly question: Question;
  readonly lastCause: string | null;
  readonly act: (act: Act) => void;
}

export function CellQuestion({ question, lastCause, act }: CellQuestionProps) {
  return question.about === 'tag' ? (
    <TagQuestion question={question} lastCause={lastCause} act={act} />
  ) : (
    <ReasonQuestion question={question} act={act} />
  );
}

function TagQuestion({ question, lastCause, act }: CellQuestionProps) {
  const [treatment, setTreatment] = useState<Treatment | null>(null);
  const [cause, setCause] = useState<string | null>(lastCause);
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => focusChoice(form.current, 'treatment'), []);

  function finish(how: Treatment | null, what: string | null): void {
    if (how !== null && what !== null) act({ act: 'tag', treatment: how, cause: what });
    else focusChoice(form.current, how === null ? 'treatment' : 'cause');
  }

  /** A digit answers the question it stands in and goes on; Enter accepts the cause offered. */
  function onDigit(digit: string, choice: string | undefined): void {
    if (choice === 'treatment') {
      const chosen = optionOfDigit(treatments, digit);
      if (chosen === undefined) return;
      setTreatment(chosen.value);
      focusChoice(form.current, 'cause');
    } else {
      const chosen = optionOfDigit(causes, digit);
      if (chosen === undefined) return;
      setCause(chosen.value);
      finish(treatment, chosen.value);
    }
  }

  return (
    <form
      ref={form}
      aria-label={`Star on ${cellTitle(question.key)}`}
      className="grid gap-2"
      onKeyDown={(event) => onKey(event, onDigit, act)}
      onSubmit={(event) => {
        event.preventDefault();
        finish(treatment, cause);
      }}
    >
      <p className="font-semibold">Star on {cellTitle(question.key)}</p>
      <NumberedChoice
        legend="How does it count in the classification?"
        name="treatment"
        options={treatments}
        value={treatment}
        onChange={(value) => setTreatment(value === 'normal' ? 'normal' : 'not-normal')}
      />
      <NumberedChoice legend="What affects it?" name="cause" options={causes} value={cause} onChange={setCause} />
      <Buttons done="Set the star" isReady={treatment !== null && cause !== null} act={act} />
    </form>
  );
}

function ReasonQuestion({ question, act }: Omit<CellQuestionProps, 'lastCause'>) {
  const [reason, setReason] = useState<string | null>(null);
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => focusChoice(form.current, 'reason'), []);
  return (
    <form
      ref={form}
      aria-label={`Reason for ${cellTitle(question.key)}`}
      className="grid gap-2"
      onKeyDown={(event) =>
        onKey(
          event,
          (digit) => {
            const chosen = optionOfDigit(reasons, digit);
            if (chosen !== undefined) act({ act: 'give-reason', reason: chosen.value });
          },
          act,
        )
      }
      onSubmit={(event) => {
        event.preventDefault();
        if (reason !== null) act({ act: 'give-reason', reason });
      }}
    >
      <NumberedChoice
        legend={`Why was ${cellTitle(question.key)} not tested?`}
        name="reason"
        options={reasons}
        value={reason}
        onChange={setReason}
      />
      <Buttons done="Give the reason" isReady={reason !== null} act={act} />
    </form>
  );
}

function Buttons({ done, isReady, act }: { readonly done: string; readonly isReady: boolean; readonly act: (act: Act) => void }) {
  return (
    <div className="flex flex-wrap gap-3">
      <Button type="submit" isDisabled={!isReady}>
        {done}
      </Button>
      <Button variant="quiet" onPress={() => act({ act: 'leave-question' })}>
        Leave it (Escape)
      </Button>
    </div>
  );
}

function onKey(event: KeyboardEvent, onDigit: (digit: string, choice: string | undefined) => void, act: (act: Act) => void): void {
  // The grid around it takes digits too.
  event.stopPropagation();
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  if (event.key === 'Escape') {
    event.preventDefault();
    act({ act: 'leave-question' });
  } else if (/^[0-9]$/.test(event.key)) {
    event.preventDefault();
    const choice = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-choice]')?.dataset['choice'] : undefined;
    onDigit(event.key, choice);
  }
}

/** Focuses the chosen option of a choice, or its first. */
function focusChoice(form: HTMLFormElement | null, name: string): void {
  const choice = form?.querySelector(`[data-choice="${name}"]`);
  (choice?.querySelector<HTMLInputElement>('input:checked') ?? choice?.querySelector('input'))?.focus();
}
