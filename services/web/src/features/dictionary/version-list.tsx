import { dictionary, history } from '@cairnstep/dictionary';
import type { RowChange } from '@cairnstep/dictionary';

/** The versions of the dictionary, newest first. `since`: only those from this version on. */
export function VersionList({ since }: { readonly since?: string }) {
  const first = since === undefined ? 0 : history.findIndex(({ version }) => version === since);
  return (
    <ul className="grid max-w-2xl gap-3">
      {history
        .slice(Math.max(0, first))
        .reverse()
        .map(({ version, notes, changes }) => (
          <li key={version}>
            <span className="font-semibold">
              Version {version}
              {version === dictionary.version ? ', in force' : ''}
            </span>
            <ul className="list-disc pl-5">
              {notes.map((note) => (
                <li key={note}>{note}</li>
              ))}
              {changes.map((change) => (
                <li key={JSON.stringify(change)}>{describeChange(change)}</li>
              ))}
            </ul>
          </li>
        ))}
    </ul>
  );
}

function describeChange(change: RowChange): string {
  if (change.kind === 'renamed') return `In ${change.table}, the column ${change.from} is now called ${change.to}.`;
  const codes = Object.entries(change.codes).map(([before, after]) => `${before} is now ${after}`);
  return `In ${change.table}, the codes of ${change.column} changed: ${codes.join(', ')}.`;
}
