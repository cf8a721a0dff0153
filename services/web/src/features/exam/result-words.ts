/** Results as the page writes them. */
import { levels, resultOf } from '@cairnstep/scoring';
import type { Classification, ResultName, Total } from '@cairnstep/scoring';

const singleWords: Readonly<Partial<Record<ResultName['result'], Readonly<Record<string, string>>>>> = {
  completeness: { C: 'Complete', I: 'Incomplete' },
  ais: { none: 'no grade' },
};

/** Every value a result can have: runs of three levels or more as "T9 to INT". */
export function valuesInWords({ result }: Pick<ResultName, 'result'>, values: readonly string[]): string {
  const words = singleWords[result];
  if (words !== undefined) return values.map((value) => words[value] ?? value).join(', ');
  const parts: string[] = [];
  for (let index = 0; index < values.length;) {
    let end = index;
    while (isNext(values[end], values[end + 1])) end += 1;
    const isRun = end - index >= 2;
    parts.push(isRun ? `${values[index]} to ${values[end]}` : (values[index] ?? ''));
    index = isRun ? end + 1 : index + 1;
  }
  return parts.join(', ');
}

function isNext(level: string | undefined, next: string | undefined): boolean {
  const at = (levels as readonly string[]).indexOf(level ?? '');
  return at >= 0 && next !== undefined && levels[at + 1] === next;
}

export type State = 'settled' | 'open' | 'not-determinable';

export interface ShownResult {
  readonly words: string;
  readonly state: State;
  /** Tagged cells changed it. */
  readonly starred: boolean;
}

/** A result with several values is open while cells are blank, and not determinable (ND) on a full sheet. */
export function shownResult(classification: Classification, name: ResultName, isFull: boolean): ShownResult {
  const { values, tagged } = resultOf(classification, name);
  const state = values.length === 1 ? 'settled' : isFull ? 'not-determinable' : 'open';
  return { words: valuesInWords(name, values), state, starred: tagged };
}

const names: Readonly<Record<ResultName['result'], string>> = {
  sensoryLevel: 'Sensory level',
  motorLevel: 'Motor level',
  nli: 'Neurological level of injury',
  completeness: 'Completeness',
  ais: 'AIS grade',
  zppSensory: 'Sensory zone of partial preservation',
  zppMotor: 'Motor zone of partial preservation',
};

/** "Motor level, left" */
export function nameOfResult({ result, side }: ResultName): string {
  return side === undefined ? names[result] : `${names[result]}, ${side}`;
}

/** "41 of 56"; a total with an untested cell is ND. */
export function totalInWords(total: Total, isFull: boolean): string {
  if (total !== 'ND') return String(total);
  return isFull ? 'ND' : 'open';
}
