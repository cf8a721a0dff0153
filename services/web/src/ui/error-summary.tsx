/**
 * All that is wrong with a form, on top of it, in the words that stand beside the fields, each a link to its field
 * (after the error summary of the GOV.UK design system). Takes the focus when it appears or when `attempt` changes.
 */
import { useEffect, useId, useRef } from 'react';
import type { PlacedProblem } from '../lib/field-problems.ts';
import { formatCount } from '../lib/format.ts';

export function ErrorSummary({ problems, attempt = 0 }: { readonly problems: readonly PlacedProblem[]; readonly attempt?: number }) {
  const box = useRef<HTMLDivElement>(null);
  const titleId = useId();
  const any = problems.length > 0;
  useEffect(() => {
    if (any) box.current?.focus();
  }, [any, attempt]);
  if (!any) return null;
  return (
    <div ref={box} tabIndex={-1} role="alert" aria-labelledby={titleId} className="max-w-2xl rounded-sm border-2 border-oxide p-4">
      <h2 id={titleId} className="text-section font-semibold text-oxide">
        {formatCount(problems.length, 'thing needs', 'things need')} mending
      </h2>
      <ul className="mt-2 grid gap-1">
        {problems.map(({ fieldId, message }) => (
          <li key={`${fieldId}:${message}`}>
            {fieldId === undefined ? (
              message
            ) : (
              <a
                href={`#${fieldId}`}
                className="link"
                onClick={(event) => {
                  event.preventDefault();
                  goTo(fieldId);
                }}
              >
                {message}
              </a>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}

function goTo(fieldId: string): void {
  const field = document.getElementById(fieldId);
  const input = 'input, textarea, select, button, [tabindex]';
  const target = field?.matches(input) === true ? field : field?.querySelector<HTMLElement>(input);
  field?.scrollIntoView({ block: 'center' });
  target?.focus();
}
