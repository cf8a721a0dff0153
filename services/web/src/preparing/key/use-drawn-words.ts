import { useCallback, useEffect, useState } from 'react';
import type { PlacedProblem } from '../../lib/field-problems.ts';
import type { Month } from '../use-month.ts';

/** Two words are asked back: enough to see that the paper holds them, in their order. */
const asked = [2, 5] as const;

export interface DrawnWords {
  readonly words: readonly string[];
  readonly passphrase: string;
  readonly isWritten: boolean;
  readonly sayWritten: (isWritten: boolean) => void;
  readonly askedBack: readonly {
    readonly fieldId: string;
    readonly number: number;
    readonly typed: string;
    readonly type: (word: string) => void;
  }[];
  readonly writtenId: string;
  /** What keeps the words from being used. */
  readonly missing: readonly PlacedProblem[];
  readonly drawOthers: () => void;
}

/** A passphrase that was drawn, until somebody has written it down. @param id unique on the page */
export function useDrawnWords(ask: Month['ask'], id: string): DrawnWords {
  const [words, setWords] = useState<readonly string[]>([]);
  const [isWritten, sayWritten] = useState(false);
  const [typed, setTyped] = useState<Readonly<Record<number, string>>>({});

  const draw = useCallback(() => void ask('suggest-passphrase', null).then((drawn) => setWords(drawn.split(' '))), [ask]);
  useEffect(draw, [draw]);

  const writtenId = `${id}-written`;
  const askedBack = asked.map((number) => ({
    fieldId: `${id}-word-${number}`,
    number,
    typed: typed[number] ?? '',
    type: (word: string) => setTyped((before) => ({ ...before, [number]: word })),
  }));
  const wrong = askedBack.filter((word) => word.typed.trim().toLowerCase() !== words[word.number - 1]);
  return {
    words,
    passphrase: words.join(' '),
    isWritten,
    sayWritten,
    askedBack,
    writtenId,
    missing: [
      ...(isWritten ? [] : [{ fieldId: writtenId, message: 'Write the six words down, and say that you have.' }]),
      ...wrong.map(({ fieldId, number }) => ({ fieldId, message: `Type word ${number} as you wrote it down.` })),
    ],
    drawOthers: () => {
      draw();
      sayWritten(false);
      setTyped({});
    },
  };
}
