/** How far a piece of work has come: a filling line with its words beside it. */

export interface ProgressProps {
  /** The work: "Sending sessions.csv". */
  readonly label: string;
  /** Done, from 0 to 1; `null` while nobody can tell. */
  readonly part: number | null;
  /** Where it stands: "1.2 MB of 3.4 MB". */
  readonly words: string;
}

export function Progress({ label, part, words }: ProgressProps) {
  const value = part === null ? null : Math.round(part * 100);
  return (
    <div className="grid max-w-xl gap-1">
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuetext={words}
        {...(value !== null && { 'aria-valuenow': value })}
      >
        <svg aria-hidden="true" width="100%" height="10" className="block">
          <rect y="4" width="100%" height="2" className="fill-hairline" />
          {value !== null && <rect width={`${value}%`} height="10" className="fill-lichen" />}
        </svg>
      </div>
      <p aria-hidden="true" className="numbers text-small text-quiet">
        {words}
      </p>
    </div>
  );
}
