/** Fields under each other, with all that is wrong named on top. Checking is ours, so the browser's own bubbles stay away. */
import type { ReactNode } from 'react';
import type { PlacedProblem } from '../lib/field-problems.ts';
import { ErrorSummary } from './error-summary.tsx';

export interface FormProps {
  readonly onSubmit: () => void;
  readonly problems?: readonly PlacedProblem[];
  /** Counts tries, so that a second try that fails in the same way brings the reader to the summary again. */
  readonly attempt?: number;
  readonly children: ReactNode;
}

export function Form({ onSubmit, problems = [], attempt = 0, children }: FormProps) {
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        onSubmit();
      }}
      className="grid gap-6"
    >
      <ErrorSummary problems={problems} attempt={attempt} />
      {children}
    </form>
  );
}
