/** All that is missing, wrong or improbable, each with the way to its cell. Many of one kind are told once. */
import type { CellKey } from '@cairnstep/scoring';
import { formatCount } from '../../lib/format.ts';
import type { Reading, SheetIssue } from './reading.ts';
import { nonKeyFieldId } from './rest-of-exam.tsx';

export interface IssueListProps {
  readonly reading: Reading;
  readonly goTo: (cell: CellKey) => void;
}

/** More of one kind than this are told in one line. */
const mostOfAKind = 3;

const kindWords: Readonly<Partial<Record<SheetIssue['code'], (count: number) => string>>> = {
  'nt-without-reason': (count) => `${count} cells are not tested, without a reason. Give one for all of them below the sheet.`,
  'tag-without-cause': (count) => `${count} cells have a star, but no condition is named for them.`,
};

export function IssueList({ reading, goTo }: IssueListProps) {
  const { blank, issues } = reading;
  const [firstBlank] = blank;
  if (firstBlank === undefined && issues.length === 0) return <p>All cells are written, and nothing needs a second look.</p>;
  return (
    <ul className="grid gap-2">
      {firstBlank !== undefined && (
        <Line
          kind="blank"
          words={`${formatCount(blank.length, 'cell is', 'cells are')} blank.`}
          link="Go to the first"
          onGo={() => goTo(firstBlank)}
        />
      )}
      {foldedByKind(issues).map(({ words, issue }) => (
        <Line
          key={words}
          kind={issue.severity}
          words={words}
          link="Go there"
          onGo={issue.cell === undefined ? goToField(issue) : () => goTo(issue.cell as CellKey)}
        />
      ))}
    </ul>
  );
}

interface Told {
  readonly words: string;
  readonly issue: SheetIssue;
}

function foldedByKind(issues: readonly SheetIssue[]): readonly Told[] {
  const told = new Set<string>();
  return issues.flatMap((issue): Told[] => {
    const alike = issues.filter(({ code }) => code === issue.code);
    const inOne = kindWords[issue.code];
    if (alike.length <= mostOfAKind || inOne === undefined) return [{ words: issue.message, issue }];
    if (told.has(issue.code)) return [];
    told.add(issue.code);
    return [{ words: inOne(alike.length), issue }];
  });
}

function goToField({ field, side }: SheetIssue): (() => void) | undefined {
  if (field !== 'nonKey' || side === undefined) return undefined;
  return () => document.querySelector<HTMLElement>(`#${nonKeyFieldId(side)} button`)?.focus();
}

const kinds = {
  blank: { name: 'Blank', line: 'border-edge', word: 'text-quiet' },
  error: { name: 'Problem', line: 'border-oxide', word: 'text-oxide' },
  warning: { name: 'Take care', line: 'border-amber', word: 'text-amber' },
} as const;

function Line({
  kind,
  words,
  link,
  onGo,
}: {
  readonly kind: keyof typeof kinds;
  readonly words: string;
  readonly link: string;
  readonly onGo: (() => void) | undefined;
}) {
  const look = kinds[kind];
  return (
    <li className={`border-l-4 pl-3 ${look.line}`}>
      <span className={`font-semibold ${look.word}`}>{look.name}.</span> {words}{' '}
      {onGo !== undefined && (
        <button type="button" className="not-printed link min-h-6" onClick={onGo}>
          {link}
          <span className="sr-only">: {words}</span>
        </button>
      )}
    </li>
  );
}
