/** The one mark for a number that may not be shown. Whatever the reason, it looks the same. */

export const hiddenMeaning = 'not shown (fewer than 11, or protecting such a count)';

export function HiddenMark() {
  return (
    <span className="hidden-mark inline-block">
      <svg
        aria-hidden="true"
        width="16"
        height="12"
        viewBox="0 0 16 12"
        className="inline-block align-middle"
        stroke="currentColor"
        strokeWidth="1.5"
      >
        <path d="M1 11 8 1M5 11 12 1M9 11 15 2.5" />
      </svg>
      <span className="sr-only">not shown</span>
    </span>
  );
}

/** The mark with its meaning in words, for the margin beside numbers that may hold it. */
export function HiddenMarkKey() {
  return (
    <p>
      <HiddenMark /> {hiddenMeaning}.
    </p>
  );
}
