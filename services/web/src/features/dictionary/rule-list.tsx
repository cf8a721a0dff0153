import type { Rule } from '@cairnstep/dictionary';
import { EmptyState } from '../../ui/empty-state.tsx';
import { ruleScopeWords, severityWords } from './words.ts';

/** Rules across fields: what each demands, why, and how to mend a break. */
export function RuleList({ rules }: { readonly rules: readonly Rule[] }) {
  if (rules.length === 0)
    return <EmptyState>No rule compares this with anything else. Its own limits and codes are checked all the same.</EmptyState>;
  return (
    <ol className="grid max-w-2xl">
      {rules.map(({ id, severity, scope, statement, why, mend, source }) => (
        <li key={id} className="grid gap-1 border-b border-hairline py-3 sm:grid-cols-[4rem_minmax(0,1fr)]">
          <span className="numbers font-semibold">{id}</span>
          <div className="grid gap-1">
            <p>{statement}</p>
            <p className="text-small">{why}</p>
            <p className="text-small">
              <span className="text-quiet">To mend: </span>
              {mend}
            </p>
            <p className="text-small text-quiet">
              {severityWords[severity]}. Checked {ruleScopeWords[scope]}. {source}.
            </p>
          </div>
        </li>
      ))}
    </ol>
  );
}
