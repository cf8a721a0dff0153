/** What the active cell is and holds, and the keys as buttons: for fingers, and to learn the keys by. Stays in sight while the sheet is used. */
import { memo, useEffect, useRef } from 'react';
import type { RefObject } from 'react';
import { Button } from 'react-aria-components/Button';
import type { Act, Entry } from './entry.ts';
import { cellTitle, labelIn, meaningOf, normalScore, ntReasons, reasonFor, tagCauses } from './exam-sheet.ts';
import { isAnswer } from './places.ts';
import type { Reading } from './reading.ts';
import { shownResult } from './result-words.ts';

export interface CellLineProps {
  readonly entry: Entry;
  readonly reading: Reading;
  readonly act: (act: Act) => void;
  readonly followsRef: RefObject<boolean>;
  /** What holds the cells: they keep clear of the keys in front of them. */
  readonly roomIn: RefObject<HTMLElement | null>;
}

export function CellLine({ entry, reading, act, followsRef, roomIn }: CellLineProps) {
  const { active, question } = entry;
  const issues = reading.issues.filter(({ cell }) => cell === active);
  // A question has keys of its own, and needs the room.
  const isShown = question === null;
  const keys = useRoomForKeys(roomIn, isShown);
  if (!isShown) return null;
  return (
    <div
      ref={keys}
      className="not-printed z-2 grid gap-2 border-t-2 border-edge bg-sheet py-2 roomy:group-focus-within/sheet:sticky roomy:group-focus-within/sheet:bottom-0"
    >
      <p className="min-h-6">
        <span className="font-semibold">{cellTitle(active)}</span>: {heldIn(entry)}
      </p>
      {issues.map(({ message, severity }) => (
        <p key={message} className={`border-l-4 pl-2 text-small ${severity === 'error' ? 'border-oxide' : 'border-amber'}`}>
          {message}
        </p>
      ))}
      {entry.said !== null && <p className="text-small text-quiet">{entry.said.words}</p>}
      <Pad isAnswer={isAnswer(active)} normal={normalScore(active)} act={act} followsRef={followsRef} />
      <SoFar reading={reading} />
    </div>
  );
}

/** Tells the cells how high the keys are, and keeps the one that is typed into in front of them when they grow. */
function useRoomForKeys(roomIn: RefObject<HTMLElement | null>, isShown: boolean): RefObject<HTMLDivElement | null> {
  const keys = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const [room, box] = [roomIn.current, keys.current];
    if (room === null || box === null) return;
    const observer = new ResizeObserver(() => {
      room.style.setProperty('--keys-height', `${box.offsetHeight}px`);
      room.querySelector('[data-cell]:focus')?.scrollIntoView({ block: 'nearest' });
    });
    observer.observe(box);
    return () => {
      observer.disconnect();
      room.style.removeProperty('--keys-height');
    };
  }, [roomIn, isShown]);
  return keys;
}

function heldIn({ active, sheet }: Entry): string {
  const written = sheet.written[active];
  if (written === undefined) return 'blank';
  const remarks = [
    meaningOf(active, written),
    ...(written.endsWith('*') ? [labelIn(tagCauses, sheet.tagCauses[active]) ?? 'no condition named'] : []),
    ...(written.startsWith('NT') ? [labelIn(ntReasons, reasonFor(sheet, active)) ?? 'no reason given'] : []),
  ];
  return `${written}, ${remarks.join('; ')}`;
}

/** The two results most asked for, where the results themselves are out of sight. */
function SoFar({ reading }: { readonly reading: Reading }) {
  const isFull = reading.blank.length === 0;
  const nli = shownResult(reading.classification, { result: 'nli' }, isFull);
  const ais = shownResult(reading.classification, { result: 'ais' }, isFull);
  return (
    <p className="text-small lg:hidden">
      Level of injury <span className="font-semibold">{nli.words}</span>, AIS <span className="font-semibold">{ais.words}</span>
    </p>
  );
}

interface PadProps extends Pick<CellLineProps, 'act' | 'followsRef'> {
  /** Of the active cell: whether it is one of the two answers, and otherwise its highest score. */
  readonly isAnswer: boolean;
  readonly normal: string;
}

const Pad = memo(function Pad({ isAnswer, normal, act, followsRef }: PadProps) {
  const scores = isAnswer
    ? [
        { text: '1', words: 'Yes' },
        { text: '0', words: 'No' },
      ]
    : Array.from({ length: Number(normal) + 1 }, (_, score) => ({ text: String(score), words: String(score) }));
  const keys: readonly { readonly act: Act; readonly words: string; readonly name?: string }[] = [
    ...scores.map(({ text, words }) => ({ act: { act: 'write', text } as const, words })),
    { act: { act: 'write', text: 'NT' }, words: 'NT', name: 'Not tested' },
    { act: { act: 'star' }, words: 'Star *' },
    { act: { act: 'ask-reason' }, words: 'Reason' },
    { act: { act: 'back' }, words: 'Back' },
    { act: { act: 'fill', fill: 'normal-down' }, words: 'Normal down' },
    { act: { act: 'fill', fill: 'normal-up' }, words: 'Normal up' },
    { act: { act: 'fill', fill: 'absent-down' }, words: 'Absent down' },
    { act: { act: 'undo' }, words: 'Undo' },
  ];
  return (
    <div role="group" aria-label="Keys" className="flex flex-wrap gap-1">
      {keys.map(({ act: pressed, words, name }) => (
        <Button
          key={words}
          {...(name !== undefined && { 'aria-label': name })}
          onPress={({ pointerType }) => {
            // A finger or a mouse came from the grid and goes back to it; the keyboard stays where it is.
            if (pointerType === 'mouse' || pointerType === 'touch' || pointerType === 'pen') followsRef.current = true;
            act(pressed);
          }}
          className="min-h-9 min-w-9 rounded-sm border border-edge px-2 text-small numbers hover:border-ink hover:bg-paper"
        >
          {words}
        </Button>
      ))}
    </div>
  );
});
