/** What was found in a file before it was sent, and the way out. */
import { LinkButton } from '../../ui/button.tsx';
import { Notice } from '../../ui/notice.tsx';
import type { Looked, LookPlace } from './look-through.ts';
import { tableName } from './table-names.ts';

const stopped = {
  identifies: 'Not sent: it would tell who somebody is.',
  unread: 'Not sent: it could not be looked through to its end, so nobody knows whether it tells who somebody is.',
};

export interface LookOutcomeProps {
  readonly submissionId: string;
  readonly looked: Looked;
}

export function LookOutcome({ submissionId, looked: { identifies, isUnread, stops, doubts } }: LookOutcomeProps) {
  if (identifies || isUnread) {
    return (
      <Notice kind="error" title={identifies ? stopped.identifies : stopped.unread}>
        <PlaceList places={stops} />
        <p className="my-2">
          Nothing of this file has left your browser. If it is a file as the clinic has it, prepare it: names, record numbers and dates are
          taken out, and you see what is left.
        </p>
        <LinkButton to={`/submit/${submissionId}/prepare`}>Prepare the clinic’s files</LinkButton>
      </Notice>
    );
  }
  if (doubts.length === 0) return null;
  return (
    <Notice kind="warning" title="Look at this before you send it: it might tell who somebody is.">
      <PlaceList places={doubts} />
    </Notice>
  );
}

/** So many places are in sight at once; a clinic's own file can have one for each of its columns. */
const inSight = 8;

export function PlaceList({ places }: { readonly places: readonly LookPlace[] }) {
  const folded = places.slice(inSight);
  return (
    <>
      <Places places={places.slice(0, inSight)} />
      {folded.length > 0 && (
        <details>
          <summary className="link">{folded.length} more</summary>
          <Places places={folded} />
        </details>
      )}
    </>
  );
}

function Places({ places }: { readonly places: readonly LookPlace[] }) {
  return (
    <ul className="list-disc pl-5">
      {places.map((place) => (
        <li key={`${place.rule} ${place.table} ${place.column} ${place.found}`}>
          <span className="font-semibold">{whereOf(place)}</span>: {place.found} {isAnswered(place) ? '' : place.mend}
        </li>
      ))}
    </ul>
  );
}

/** What identifies somebody is mended in one way, which stands below the list. */
const isAnswered = ({ rule }: LookPlace): boolean => rule === 'F50' || rule === 'F51' || rule === 'F12';

/** "Sessions, line 4 and further down, column participant" */
function whereOf({ table, line, column, hasMore }: LookPlace): string {
  const lineWords = line === null ? [] : [`line ${line}${hasMore ? ' and further down' : ''}`];
  return [tableName(table), ...lineWords, ...(column === null ? [] : [`column ${column}`])].join(', ');
}
