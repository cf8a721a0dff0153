/**
 * The spine from C1 down to S4-5 as a column, with a bar for the participants at each segment. It is the control for choosing
 * injury levels: click one, drag over several, arrow keys (with shift to extend), or type a range such as C5-T6.
 */
import { useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { formatCount } from '../lib/format.ts';
import { formatLevelRange, isWithin, parseLevelRange, rangeBetween, segments, wholeSpine } from '../lib/level-range.ts';
import type { LevelRange, Segment } from '../lib/level-range.ts';
import { Bar } from './bar-table.tsx';
import { Button } from './button.tsx';
import { HiddenMark } from './hidden-mark.tsx';
import { TextField } from './text-field.tsx';

/** Participants per segment. A segment that is absent has nobody; null may not be shown. */
export type SegmentCounts = ReadonlyMap<Segment, number | null>;

export interface LevelColumnProps {
  readonly label: string;
  readonly counts: SegmentCounts;
  /** Null: no restriction. */
  readonly range: LevelRange | null;
  readonly onRangeChange: (range: LevelRange | null) => void;
}

export function LevelColumn({ label, counts, range, onRangeChange }: LevelColumnProps) {
  const list = useRef<HTMLUListElement>(null);
  // Where a selection began and where its moving end is; they outlive one key press or drag.
  const [anchor, setAnchor] = useState<Segment>(range?.from ?? 'C1');
  const [active, setActive] = useState<Segment>(range?.to ?? 'C1');
  const dragging = useRef(false);
  const largest = Math.max(1, ...[...counts.values()].map((count) => count ?? 0));

  function choose(from: Segment, to: Segment): void {
    setAnchor(from);
    setActive(to);
    onRangeChange(rangeBetween(from, to));
  }

  function moveBy(event: KeyboardEvent, target: Segment): void {
    event.preventDefault();
    choose(event.shiftKey ? anchor : target, target);
    list.current?.querySelector<HTMLElement>(`[data-segment="${target}"]`)?.focus();
  }

  function onKeyDown(event: KeyboardEvent): void {
    const at = segments.indexOf(active);
    const targets: Partial<Record<string, Segment | undefined>> = {
      ArrowDown: segments[at + 1] ?? active,
      ArrowUp: segments[at - 1] ?? active,
      Home: segments[0],
      End: segments.at(-1),
      ' ': active,
      Enter: active,
    };
    const target = targets[event.key];
    if (target !== undefined) moveBy(event, target);
    else if (event.key === 'Escape') onRangeChange(null);
    else if (event.key === 'a' && (event.ctrlKey || event.metaKey)) {
      event.preventDefault();
      choose(wholeSpine.from, wholeSpine.to);
    }
  }

  return (
    <div className="grid gap-3">
      <TypedRange range={range} onRangeChange={onRangeChange} />
      <ul
        ref={list}
        role="listbox"
        aria-label={label}
        aria-multiselectable="true"
        onKeyDown={onKeyDown}
        onPointerUp={() => (dragging.current = false)}
        onPointerLeave={() => (dragging.current = false)}
        className="touch-pan-y select-none border-y border-edge"
      >
        {segments.map((segment, index) => {
          const selected = range !== null && isWithin(segment, range);
          return (
            <li
              key={segment}
              role="option"
              data-segment={segment}
              aria-selected={selected}
              tabIndex={segment === active ? 0 : -1}
              onPointerDown={(event) => {
                // A finger may be about to scroll: it chooses by its tap, a click.
                if (event.pointerType !== 'mouse' || event.button !== 0) return;
                dragging.current = true;
                choose(event.shiftKey ? anchor : segment, segment);
              }}
              onClick={(event) => choose(event.shiftKey ? anchor : segment, segment)}
              onPointerEnter={() => {
                if (dragging.current) choose(anchor, segment);
              }}
              className={`grid min-h-6 cursor-pointer grid-cols-[44px_40px_1fr] items-center gap-2 border-l-4 pl-2 focus-visible:-outline-offset-2 ${
                selected ? 'border-l-lichen bg-chosen font-semibold' : 'border-l-transparent hover:bg-paper'
              } ${startsRegion(index) ? 'border-t border-t-hairline' : ''}`}
            >
              <SegmentRow segment={segment} count={counts.get(segment) ?? (counts.has(segment) ? null : 0)} largest={largest} />
            </li>
          );
        })}
      </ul>
    </div>
  );
}

/** The column, small and only to look at: where a level or a range lies. */
export function SmallLevelColumn({ range, label }: { readonly range: LevelRange; readonly label?: string }) {
  const words = label ?? formatLevelRange(range);
  return (
    <span className="inline-flex items-center gap-2">
      <svg aria-hidden="true" width="10" height="58" viewBox="0 0 10 58" className="shrink-0">
        {segments.map((segment, index) => (
          <rect
            key={segment}
            x={startsRegion(index) ? 0 : 2}
            y={index * 2}
            width={startsRegion(index) ? 10 : 8}
            height="1.5"
            className={isWithin(segment, range) ? 'fill-lichen' : 'fill-hairline'}
          />
        ))}
      </svg>
      {words}
    </span>
  );
}

function TypedRange({ range, onRangeChange }: Pick<LevelColumnProps, 'range' | 'onRangeChange'>) {
  const written = range === null ? '' : formatLevelRange(range);
  // What is typed holds until the range changes elsewhere, in the column or in the address.
  const [draft, setDraft] = useState({ of: written, text: written });
  const text = draft.of === written ? draft.text : written;
  const setText = (typed: string) => setDraft({ of: written, text: typed });
  const [error, setError] = useState<string | undefined>();
  function take(): void {
    const typed = text.trim() === '' ? null : parseLevelRange(text);
    if (typed === null && text.trim() !== '') return setError('Write one level or two, for example C5-T6');
    setError(undefined);
    onRangeChange(typed);
  }
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        take();
      }}
      className="flex flex-wrap items-end gap-2"
    >
      <div className="min-w-32 flex-1">
        <TextField
          id="level-range"
          label="Levels"
          hint="For example C5-T6"
          value={text}
          onChange={setText}
          error={error}
          spellCheck="false"
          autoComplete="off"
        />
      </div>
      <Button type="submit">Choose levels</Button>
      {range !== null && (
        <Button variant="quiet" onPress={() => onRangeChange(null)}>
          All levels
        </Button>
      )}
    </form>
  );
}

function SegmentRow({ segment, count, largest }: { readonly segment: Segment; readonly count: number | null; readonly largest: number }) {
  return (
    <>
      <span className="numbers">{segment}</span>
      <span className="numbers text-right text-small text-quiet">
        {count === null ? (
          <HiddenMark />
        ) : (
          <>
            {count}
            <span className="sr-only"> {formatCount(count, 'participant').replace(/^\S+ /, '')}</span>
          </>
        )}
      </span>
      {count !== null && count > 0 ? <Bar share={count / largest} /> : <span />}
    </>
  );
}

/** T1, L1 and S1 begin a region; C1 begins the column. */
function startsRegion(index: number): boolean {
  return index > 0 && segments[index]?.charAt(0) !== segments[index - 1]?.charAt(0);
}
