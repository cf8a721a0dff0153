/** Typing on the sheet, as a reducer: each act gives the next state, and may say something. Nothing here knows the screen. */
import type { CellKey, KeyMuscle, Side } from '@cairnstep/scoring';
import { formatCount } from '../../lib/format.ts';
import { blankSheet, cellTitle, codeFor, normalScore, scoreIn, tagged, treatmentIn } from './exam-sheet.ts';
import type { ExamSheet, Treatment } from './exam-sheet.ts';
import { readPasted } from './pasted-cells.ts';
import { columnOf, entryOrders, firstCell, isAnswer, neighbour, placeOf } from './places.ts';
import type { EntryOrder, Step } from './places.ts';

/** A question that stands beside a cell until it is answered. */
export interface Question {
  readonly about: 'tag' | 'reason';
  readonly key: CellKey;
}

export interface Entry {
  readonly sheet: ExamSheet;
  readonly active: CellKey;
  readonly order: EntryOrder;
  readonly question: Question | null;
  /** Written by the last act: what a star or a reason typed next belongs to, although the active cell has moved on. */
  readonly lastWritten: CellKey | null;
  /** The answer given last, offered again. */
  readonly lastCause: string | null;
  /** Sheets before the last acts, oldest first. */
  readonly before: readonly { readonly sheet: ExamSheet; readonly active: CellKey }[];
  /** Said once; the number tells one from the next of the same words. */
  readonly said: { readonly words: string; readonly number: number } | null;
}

export const firstEntry: Entry = {
  sheet: blankSheet,
  active: firstCell,
  order: 'down',
  question: null,
  lastWritten: null,
  lastCause: null,
  before: [],
  said: null,
};

export type Fill = 'normal-down' | 'normal-up' | 'absent-down';

export type Act =
  | { readonly act: 'write'; readonly text: string }
  | { readonly act: 'step'; readonly step: Step }
  | { readonly act: 'go'; readonly to: CellKey }
  | { readonly act: 'go-on' }
  | { readonly act: 'back' }
  | { readonly act: 'clear' }
  | { readonly act: 'fill'; readonly fill: Fill }
  | { readonly act: 'paste'; readonly text: string }
  | { readonly act: 'star' }
  | { readonly act: 'tag'; readonly treatment: Treatment; readonly cause: string }
  | { readonly act: 'ask-reason' }
  | { readonly act: 'give-reason'; readonly reason: string }
  | { readonly act: 'leave-question' }
  | { readonly act: 'undo' }
  | { readonly act: 'start-anew' }
  | { readonly act: 'choose-order'; readonly order: EntryOrder }
  | { readonly act: 'reason-for-all'; readonly reason: string | null }
  | { readonly act: 'non-key'; readonly side: Side; readonly muscle: KeyMuscle | null }
  | { readonly act: 'earlier-deficit'; readonly answer: boolean };

const mostUndone = 200;

export function nextEntry(entry: Entry, act: Act): Entry {
  const { sheet, active } = entry;
  switch (act.act) {
    case 'write':
      return write(entry, act.text);
    case 'step':
      return { ...entry, active: neighbour(active, act.step), lastWritten: null };
    case 'go':
      return act.to === active && entry.question === null ? entry : { ...entry, active: act.to, question: null, lastWritten: null };
    case 'go-on':
      return { ...entry, active: after(entry, active), lastWritten: null };
    case 'back':
      return back(entry);
    case 'clear':
      return sheet.written[active] === undefined ? entry : changed(entry, without(sheet, active));
    case 'fill':
      return fill(entry, act.fill);
    case 'paste':
      return paste(entry, act.text);
    case 'star':
      return star(entry);
    case 'tag':
      return tag(entry, act.treatment, act.cause);
    case 'ask-reason':
      return askReason(entry);
    case 'give-reason':
      return giveReason(entry, act.reason);
    case 'leave-question':
      return { ...entry, question: null };
    case 'undo':
      return undo(entry);
    case 'start-anew':
      return { ...firstEntry, order: entry.order, said: saying(entry, 'The sheet is blank again.') };
    case 'choose-order':
      return { ...entry, order: act.order };
    case 'reason-for-all':
      return changed(entry, { ...sheet, ntReason: act.reason });
    case 'non-key':
      return changed(entry, { ...sheet, nonKey: { ...sheet.nonKey, [act.side]: act.muscle } });
    case 'earlier-deficit':
      return changed(entry, { ...sheet, earlierDeficit: act.answer });
  }
}

function saying(entry: Entry, words: string): Entry['said'] {
  return { words, number: (entry.said?.number ?? 0) + 1 };
}

function say(entry: Entry, words: string): Entry {
  return { ...entry, said: saying(entry, words) };
}

/** The next sheet, with the present one kept for undoing. */
function changed(entry: Entry, sheet: ExamSheet): Entry {
  return {
    ...entry,
    sheet,
    before: [...entry.before, { sheet: entry.sheet, active: entry.active }].slice(-mostUndone),
    lastWritten: null,
    said: null,
  };
}

/** Writes into a cell; remarks on what stood there go with it. */
function withWritten(sheet: ExamSheet, key: CellKey, code: string): ExamSheet {
  const cleared = without(sheet, key);
  return { ...cleared, written: { ...cleared.written, [key]: code } };
}

function without(sheet: ExamSheet, key: CellKey): ExamSheet {
  const { [key]: _written, ...written } = sheet.written;
  const { [key]: _cause, ...tagCauses } = sheet.tagCauses;
  const { [key]: _reason, ...ntReasons } = sheet.ntReasons;
  return { ...sheet, written, tagCauses, ntReasons };
}

function after({ order }: Entry, key: CellKey): CellKey {
  const cells = entryOrders[order];
  return cells[cells.indexOf(key) + 1] ?? key;
}

function write(entry: Entry, text: string): Entry {
  const { active, sheet } = entry;
  // In the two answers 1 is yes and 0 is no, so that the hand stays on the digits.
  const meant = isAnswer(active) ? ({ '1': 'yes', '0': 'no' }[text] ?? text) : text;
  const code = codeFor(active, meant);
  if (code === undefined) return say(entry, `${cellTitle(active)} takes ${whatIsTaken(active)}.`);
  return { ...changed(entry, withWritten(sheet, active, code)), active: after(entry, active), lastWritten: active };
}

function whatIsTaken(key: CellKey): string {
  if (isAnswer(key)) return '1 for yes, 0 for no, or N for not tested';
  return `0 to ${normalScore(key)}, or N for not tested`;
}

/** As in a line of text: on a written cell it empties it, on a blank one it goes back and empties that. */
function back(entry: Entry): Entry {
  const { active, sheet, order } = entry;
  if (sheet.written[active] !== undefined) return changed(entry, without(sheet, active));
  const cells = entryOrders[order];
  const before = cells[cells.indexOf(active) - 1];
  if (before === undefined) return entry;
  const moved = { ...entry, active: before };
  return sheet.written[before] === undefined ? moved : { ...changed(entry, without(sheet, before)), active: before };
}

function fill(entry: Entry, which: Fill): Entry {
  const { active, sheet } = entry;
  if (isAnswer(active)) return say(entry, 'Only a column of scores is filled; type the answer.');
  const column = columnOf(active);
  const at = column.indexOf(active);
  const run = which === 'normal-up' ? column.slice(0, at + 1) : column.slice(at);
  const blank = run.filter((key) => sheet.written[key] === undefined);
  if (blank.length === 0) return say(entry, 'No cell there is blank. Nothing was changed.');
  const written = { ...sheet.written, ...Object.fromEntries(blank.map((key) => [key, which === 'absent-down' ? '0' : normalScore(key)])) };
  const filled = changed(entry, { ...sheet, written });
  const place = placeOf(active);
  const words = `${formatCount(blank.length, 'blank cell')} filled as ${which === 'absent-down' ? 'absent' : 'normal'}, ${
    place?.side === 'left' ? 'left' : 'right'
  } side, ${which === 'normal-up' ? 'up' : 'down'} from here.`;
  return say({ ...filled, active: nextBlank(filled, active) }, words);
}

/** The next blank cell in the order of typing, or the cell itself when none follows. */
function nextBlank({ order, sheet }: Entry, from: CellKey): CellKey {
  const cells = entryOrders[order];
  return cells.slice(cells.indexOf(from)).find((key) => sheet.written[key] === undefined) ?? from;
}

function paste(entry: Entry, text: string): Entry {
  const pasted = readPasted(text, entry.active, entry.order);
  if ('problem' in pasted) return say(entry, pasted.problem);
  let sheet = entry.sheet;
  for (const [key, code] of pasted.cells) sheet = withWritten(sheet, key, code);
  const filled = changed(entry, sheet);
  return say({ ...filled, active: nextBlank(filled, entry.active) }, `${formatCount(pasted.cells.size, 'cell')} pasted.`);
}

/** The cell a remark is meant for: the one just written, else the active one. */
function remarked({ active, sheet, lastWritten }: Entry): CellKey | null {
  const key = lastWritten ?? active;
  return sheet.written[key] === undefined ? null : key;
}

function star(entry: Entry): Entry {
  const key = remarked(entry);
  if (key === null) return say(entry, 'Write the score first, then the star.');
  const written = entry.sheet.written[key] ?? '';
  if (isAnswer(key)) return say(entry, `${cellTitle(key)} takes no star.`);
  if (treatmentIn(written) !== null) {
    const plain = withWritten(entry.sheet, key, scoreIn(written));
    return say(changed(entry, plain), `Star taken off ${cellTitle(key)}.`);
  }
  if (written === normalScore(key)) return say(entry, 'A normal score takes no star.');
  return { ...entry, active: key, question: { about: 'tag', key }, said: null };
}

function tag(entry: Entry, treatment: Treatment, cause: string): Entry {
  const { sheet, question } = entry;
  if (question?.about !== 'tag') return entry;
  const { key } = question;
  const written = { ...sheet.written, [key]: tagged(scoreIn(sheet.written[key] ?? ''), treatment) };
  const done = changed(entry, { ...sheet, written, tagCauses: { ...sheet.tagCauses, [key]: cause } });
  return { ...done, question: null, lastCause: cause, active: after(entry, key) };
}

function askReason(entry: Entry): Entry {
  const key = remarked(entry);
  if (key === null || entry.sheet.written[key]?.startsWith('NT') !== true)
    return say(entry, 'A reason belongs to a cell that was not tested.');
  return { ...entry, active: key, question: { about: 'reason', key }, said: null };
}

function giveReason(entry: Entry, reason: string): Entry {
  const { sheet, question } = entry;
  if (question?.about !== 'reason') return entry;
  const { key } = question;
  const done = changed(entry, { ...sheet, ntReasons: { ...sheet.ntReasons, [key]: reason } });
  return { ...done, question: null, active: after(entry, key) };
}

function undo(entry: Entry): Entry {
  const last = entry.before.at(-1);
  if (last === undefined) return say(entry, 'There is nothing to undo.');
  return say({ ...entry, ...last, before: entry.before.slice(0, -1), question: null, lastWritten: null }, 'The last change is undone.');
}
