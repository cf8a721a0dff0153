import type { CellKey } from '@cairnstep/scoring';
import { describe, expect, it } from 'vitest';
import { firstEntry, nextEntry } from './entry.ts';
import type { Act, Entry } from './entry.ts';
import { actOfKey } from './keys.ts';

const plain = { ctrlKey: false, metaKey: false, altKey: false };

/** Presses keys one after the other; a word such as `Backspace` is one key. */
function press(entry: Entry, ...keys: readonly string[]): Entry {
  return keys.reduce((before, key) => {
    const act = actOfKey({ key, ...plain });
    if (act === null) throw new Error(`The grid does not take ${key}.`);
    return nextEntry(before, act);
  }, entry);
}

const digits = (text: string): readonly string[] => [...text];
const at = (cell: CellKey, entry: Entry = firstEntry): Entry => nextEntry(entry, { act: 'go', to: cell });
const did = (entry: Entry, act: Act): Entry => nextEntry(entry, act);

describe('typing', () => {
  it('writes each digit and goes on down the column, then to the next', () => {
    const entry = press(firstEntry, ...digits('2'.repeat(28)), '1');
    expect(entry.sheet.written['lt_r_s4_5']).toBe('2');
    expect(entry.sheet.written['lt_l_c2']).toBe('1');
    expect(entry.active).toBe('lt_l_c3');
  });

  it('goes across the row when that order is chosen', () => {
    const across = did(at('lt_r_c5'), { act: 'choose-order', order: 'across' });
    const entry = press(across, ...digits('210154'), '2');
    expect(entry.sheet.written).toEqual({ lt_r_c5: '2', lt_l_c5: '1', pp_r_c5: '0', pp_l_c5: '1', m_r_c5: '5', m_l_c5: '4', lt_r_c6: '2' });
  });

  it('writes NT with N in any case, and goes on', () => {
    const entry = press(firstEntry, 'n', 'N');
    expect(entry.sheet.written).toEqual({ lt_r_c2: 'NT', lt_r_c3: 'NT' });
  });

  it('takes 1 and 0, or Y, for the two answers, and N for not tested, never for no', () => {
    expect(press(at('vac'), '0', '1').sheet.written).toEqual({ vac: 'no', dap: 'yes' });
    expect(press(at('vac'), 'y', 'n').sheet.written).toEqual({ vac: 'yes', dap: 'NT' });
  });

  it('refuses what a cell cannot hold, says what it takes, and changes nothing', () => {
    const entry = press(firstEntry, '3');
    expect(entry.sheet).toBe(firstEntry.sheet);
    expect(entry.active).toBe('lt_r_c2');
    expect(entry.said?.words).toBe('Light touch, right, C2 takes 0 to 2, or N for not tested.');
    expect(press(at('m_r_c5'), '6').said?.words).toContain('takes 0 to 5');
    expect(press(at('m_r_c5'), '5').sheet.written).toEqual({ m_r_c5: '5' });
    expect(press(at('dap'), '2').said?.words).toContain('1 for yes, 0 for no');
  });

  it('goes back with Backspace as in a line of text, and empties without moving with Delete', () => {
    const typed = press(firstEntry, '2', '2', '1');
    const back = press(typed, 'Backspace');
    expect([back.active, back.sheet.written]).toEqual(['lt_r_c4', { lt_r_c2: '2', lt_r_c3: '2' }]);
    const again = press(back, 'Backspace');
    expect([again.active, again.sheet.written]).toEqual(['lt_r_c3', { lt_r_c2: '2' }]);
    const inPlace = press(at('lt_r_c2', typed), 'Backspace');
    expect([inPlace.active, inPlace.sheet.written]).toEqual(['lt_r_c2', { lt_r_c3: '2', lt_r_c4: '1' }]);
    const deleted = press(at('lt_r_c3', typed), 'Delete');
    expect([deleted.active, deleted.sheet.written]).toEqual(['lt_r_c3', { lt_r_c2: '2', lt_r_c4: '1' }]);
    expect(press(firstEntry, 'Backspace')).toBe(firstEntry);
  });

  it('undoes change after change, back to the cell where each was made', () => {
    const typed = press(firstEntry, '2', '1', 'd');
    const undone = did(did(typed, { act: 'undo' }), { act: 'undo' });
    expect([undone.active, undone.sheet.written]).toEqual(['lt_r_c3', { lt_r_c2: '2' }]);
    expect(did(did(undone, { act: 'undo' }), { act: 'undo' }).said?.words).toBe('There is nothing to undo.');
  });

  it('leaves keys that are not its own to the browser', () => {
    expect(actOfKey({ key: 'Tab', ...plain })).toBeNull();
    expect(actOfKey({ key: 'd', ...plain, ctrlKey: true })).toBeNull();
    expect(actOfKey({ key: 'ArrowLeft', ...plain, altKey: true })).toBeNull();
    expect(actOfKey({ key: 'F5', ...plain })).toBeNull();
    expect(actOfKey({ key: 'z', ...plain, metaKey: true })).toEqual({ act: 'undo' });
    expect(actOfKey({ key: 'Home', ...plain, ctrlKey: true })).toEqual({ act: 'step', step: 'sheetStart' });
  });
});

describe('filling the rest', () => {
  it('fills the blank cells from here down the column as normal, and goes on after them', () => {
    const entry = press(press(firstEntry, '2', '1'), 'd');
    expect(Object.keys(entry.sheet.written)).toHaveLength(28);
    expect(entry.sheet.written['lt_r_c3']).toBe('1');
    expect(entry.sheet.written['lt_r_s4_5']).toBe('2');
    expect(entry.active).toBe('lt_l_c2');
    expect(entry.said?.words).toBe('26 blank cells filled as normal, right side, down from here.');
  });

  it('fills upwards, with 5 for strength, and never writes over a score', () => {
    const entry = press(press(at('m_l_l3'), '2'), 'u');
    const up = press(at('m_l_l3', entry), 'u');
    expect(entry.sheet.written).toMatchObject({ m_l_c5: '5', m_l_l2: '5', m_l_l3: '2', m_l_l4: '5' });
    expect(entry.sheet.written['m_l_l5']).toBeUndefined();
    expect(up.said?.words).toBe('No cell there is blank. Nothing was changed.');
  });

  it('fills downwards as absent', () => {
    const entry = press(at('pp_r_t10'), 'a');
    expect(entry.sheet.written['pp_r_t10']).toBe('0');
    expect(entry.sheet.written['pp_r_s4_5']).toBe('0');
    expect(entry.sheet.written['pp_r_t9']).toBeUndefined();
  });

  it('does not fill an answer', () => {
    expect(press(at('vac'), 'd').sheet.written).toEqual({});
  });
});

describe('a star', () => {
  it('asks about the score just written, then counts as answered and goes on', () => {
    const asked = press(at('m_l_c8'), '3', '*');
    expect(asked.question).toEqual({ about: 'tag', key: 'm_l_c8' });
    expect(asked.active).toBe('m_l_c8');
    const done = did(asked, { act: 'tag', treatment: 'normal', cause: 'peripheral_nerve' });
    expect(done.sheet.written).toEqual({ m_l_c8: '3**' });
    expect(done.sheet.tagCauses).toEqual({ m_l_c8: 'peripheral_nerve' });
    expect([done.active, done.question, done.lastCause]).toEqual(['m_l_t1', null, 'peripheral_nerve']);
  });

  it('belongs to the score just written also where the next cell is written already, and after a move to the active cell', () => {
    const full = press(firstEntry, '1', '0', '1');
    expect(press(at('lt_r_c2', full), '0', '*').question?.key).toBe('lt_r_c2');
    expect(press(at('lt_r_c2', full), '0', 'ArrowDown', '*').question?.key).toBe('lt_r_c4');
  });

  it('is one for not normal and two for normal', () => {
    const done = did(press(firstEntry, '1', '*'), { act: 'tag', treatment: 'not-normal', cause: 'pain' });
    expect(done.sheet.written['lt_r_c2']).toBe('1*');
  });

  it('comes off again, with its cause', () => {
    const done = did(press(firstEntry, 'n', '*'), { act: 'tag', treatment: 'not-normal', cause: 'pain' });
    const off = press(at('lt_r_c2', done), '*');
    expect([off.sheet.written, off.sheet.tagCauses]).toEqual([{ lt_r_c2: 'NT' }, {}]);
  });

  it('is not asked for on a blank sheet, a normal score or an answer', () => {
    expect(press(firstEntry, '*').said?.words).toBe('Write the score first, then the star.');
    expect(press(firstEntry, '2', '*').question).toBeNull();
    expect(press(at('vac'), '1', '*').question).toBeNull();
  });

  it('leaves the score as it was when the question is left', () => {
    const left = did(press(firstEntry, '1', '*'), { act: 'leave-question' });
    expect([left.question, left.sheet.written]).toEqual([null, { lt_r_c2: '1' }]);
  });

  it('goes with the score when another is written', () => {
    const done = did(press(firstEntry, '1', '*'), { act: 'tag', treatment: 'not-normal', cause: 'pain' });
    const over = press(at('lt_r_c2', done), '2');
    expect([over.sheet.written, over.sheet.tagCauses]).toEqual([{ lt_r_c2: '2' }, {}]);
  });
});

describe('a reason', () => {
  it('is given to the cell just marked NT', () => {
    const asked = press(firstEntry, 'n', 'r');
    expect(asked.question).toEqual({ about: 'reason', key: 'lt_r_c2' });
    const done = did(asked, { act: 'give-reason', reason: 'pain' });
    expect([done.sheet.ntReasons, done.active]).toEqual([{ lt_r_c2: 'pain' }, 'lt_r_c3']);
  });

  it('is not asked for where a score stands', () => {
    expect(press(firstEntry, '2', 'r').said?.words).toBe('A reason belongs to a cell that was not tested.');
  });
});

describe('pasting', () => {
  const pasted = (text: string, from: CellKey, order: 'down' | 'across' = 'down') =>
    did(did(at(from), { act: 'choose-order', order }), { act: 'paste', text });

  it('takes a column from the active cell down, whatever the order of typing', () => {
    const entry = pasted('2\r\n1\r\nnt\r\n\r\n0*\r\n', 'pp_l_t1', 'across');
    expect(entry.sheet.written).toEqual({ pp_l_t1: '2', pp_l_t2: '1', pp_l_t3: 'NT', pp_l_t5: '0*' });
    expect(entry.said?.words).toBe('4 cells pasted.');
  });

  it('takes a run of scores in the order of typing', () => {
    expect(pasted('2 2, 1', 'lt_r_c5').sheet.written).toEqual({ lt_r_c5: '2', lt_r_c6: '2', lt_r_c7: '1' });
    expect(pasted('2 2 1', 'lt_r_c5', 'across').sheet.written).toEqual({ lt_r_c5: '2', lt_l_c5: '2', pp_r_c5: '1' });
  });

  it('takes a block by rows of segments, with nothing where no key muscle is tested', () => {
    const entry = pasted('2\t2\t5\t4\n1\t1\t\t\n', 'pp_r_t1');
    expect(entry.sheet.written).toEqual({ pp_r_t1: '2', pp_l_t1: '2', m_r_t1: '5', m_l_t1: '4', pp_r_t2: '1', pp_l_t2: '1' });
  });

  it.each([
    ['1\n3\n1', 'lt_r_c5', 'Entry 2 is not a value for Light touch, right, C6. Nothing was changed.'],
    ['5*\n1', 'm_r_c5', 'Entry 1 is not a value for Key muscle, right, C5. Nothing was changed.'],
    ['1\n1\n1', 'lt_r_s3', 'Entry 3 has no cell on the sheet. Nothing was changed.'],
    ['2\t2\n2\t2', 'm_r_t1', 'Line 2, column 1 has no cell on the sheet. Nothing was changed.'],
    ['2\t2', 'vac', 'A block of columns begins in a cell of scores.'],
    ['  \n', 'lt_r_c2', 'The clipboard holds no text.'],
    ['2 '.repeat(3000), 'lt_r_c2', 'The clipboard holds more than a sheet of scores.'],
  ] as const)('refuses %j as a whole', (text, from, words) => {
    const entry = pasted(text, from);
    expect(entry.said?.words).toBe(words);
    expect(entry.sheet).toBe(firstEntry.sheet);
  });
});

describe('starting anew', () => {
  it('empties the sheet and keeps the order of typing', () => {
    const typed = did(press(firstEntry, '2', '1'), { act: 'choose-order', order: 'across' });
    const anew = did(typed, { act: 'start-anew' });
    expect([anew.sheet, anew.order, anew.before]).toEqual([firstEntry.sheet, 'across', []]);
  });
});
