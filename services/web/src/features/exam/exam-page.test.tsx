import { act, createEvent, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { renderRoutes } from '../../testing/render.tsx';
import ExamPage from './exam-page.tsx';

const open = () =>
  renderRoutes(
    [
      { path: '/exam', element: <ExamPage /> },
      { path: '/', element: <h1>Elsewhere</h1> },
    ],
    '/exam',
  );

const cell = (key: string) => document.querySelector<HTMLElement>(`[data-cell="${key}"]`) as HTMLElement;
const focused = () => (document.activeElement as HTMLElement | null)?.dataset['cell'];
const start = (key = 'lt_r_c2') => act(() => cell(key).focus());
/** Presses keys where the focus is, as a keyboard does. */
const press = (...keys: readonly string[]) => {
  for (const key of keys) fireEvent.keyDown(document.activeElement ?? document.body, { key });
};
const type = (text: string) => press(...text);
const result = (name: RegExp) => screen.getByRole('button', { name });

/** Pastes into the cell that has the focus. */
function paste(text: string): void {
  const target = document.activeElement ?? document.body;
  fireEvent(target, createEvent.paste(target, { clipboardData: { getData: () => text } }));
}

/** Injury at C5: sensation altered from C6 down, arms weak, no voluntary contraction, pressure felt. */
function enterExam(strengthRight: string, strengthLeft: string): void {
  start();
  const sensory = '2222' + '1'.repeat(24);
  paste([...sensory.repeat(4), ...strengthRight, ...strengthLeft].join(' '));
  start('vac');
  type('01');
}

describe('the exam sheet', () => {
  it('is one stop for the keyboard, and its focus goes on with each digit', () => {
    open();
    const grid = screen.getByRole('grid', { name: 'Exam sheet' });
    expect(
      within(grid)
        .getAllByRole('gridcell')
        .filter(({ tabIndex }) => tabIndex === 0),
    ).toHaveLength(1);
    start();
    type('22');
    expect(focused()).toBe('lt_r_c4');
    expect(cell('lt_r_c4').tabIndex).toBe(0);
    expect(cell('lt_r_c2').tabIndex).toBe(-1);
    expect(cell('lt_r_c2').getAttribute('aria-label')).toBe('Light touch, right, C2: 2, normal');
    press('ArrowRight', 'ArrowDown');
    expect(focused()).toBe('lt_l_c5');
    press('End');
    expect(focused()).toBe('m_l_c5');
  });

  it('says that nothing is stored or sent', () => {
    open();
    expect(screen.getByText(/Nothing typed here is stored or sent/)).toBeTruthy();
  });

  it('settles results while it is typed, and says which are still open', () => {
    open();
    expect(result(/^Neurological level of injury: open: C1 to INT/)).toBeTruthy();
    start();
    type('2221');
    press('Home', 'End');
    expect(result(/^Sensory level, right: open: C1 to C4$/)).toBeTruthy();
    start('pp_r_c2');
    type('222');
    expect(result(/^Sensory level, right: C4$/)).toBeTruthy();
    expect(result(/^Motor level, right: open: C4/)).toBeTruthy();
    expect(screen.getByText(/7 of 134 cells are written/)).toBeTruthy();
  });

  it('tells why the grade is C and not B, and marks the cells that decided', () => {
    open();
    enterExam('5211100000', '5310010000');
    expect(screen.getByText('134 of 134 cells are written.')).toBeTruthy();
    expect(result(/^Neurological level of injury: C5$/)).toBeTruthy();
    fireEvent.click(result(/^AIS grade: C$/));
    expect(screen.getByRole('heading', { name: 'Why AIS grade is C' })).toBeTruthy();
    expect(screen.getByText(/So the injury is motor incomplete, not B\./)).toBeTruthy();
    expect(cell('m_r_t1').getAttribute('aria-label')).toContain('decides the result chosen');
    expect(cell('m_r_c5').getAttribute('aria-label')).not.toContain('decides');
    fireEvent.click(screen.getByRole('button', { name: 'Key muscle, right, T1: 1' }));
    expect(focused()).toBe('m_r_t1');
  });

  it('changes the grade with the one cell that makes the difference', () => {
    open();
    enterExam('5200000000', '5310000000');
    expect(result(/^AIS grade: B$/)).toBeTruthy();
    start('m_l_l2');
    type('1');
    expect(result(/^AIS grade: C$/)).toBeTruthy();
  });

  it('asks beside the cell how a star counts and what is behind it, answered by digits alone', () => {
    open();
    enterExam('5211100000', '5310010000');
    start('m_l_c8');
    type('3*');
    const question = screen.getByRole('form', { name: 'Star on Key muscle, left, C8' });
    expect(document.activeElement?.closest('fieldset')?.textContent).toContain('How does it count in the classification?');
    type('2');
    expect(document.activeElement?.closest('fieldset')?.textContent).toContain('What affects it?');
    type('1');
    expect(question.isConnected).toBe(false);
    expect(cell('m_l_c8').textContent).toBe('3**');
    expect(focused()).toBe('m_l_t1');
    expect(screen.getByText('Key muscle, left, C8, 3**: peripheral nerve injury; counts as normal.')).toBeTruthy();
  });

  it('offers the same condition again, and takes Enter for it; Escape leaves the score alone', () => {
    open();
    start();
    type('1*15');
    type('1*1');
    fireEvent.submit(screen.getByRole('form', { name: 'Star on Light touch, right, C3' }));
    expect([cell('lt_r_c2').textContent, cell('lt_r_c3').textContent]).toEqual(['1*', '1*']);
    type('1*');
    press('Escape');
    expect(cell('lt_r_c4').textContent).toBe('1');
    expect(focused()).toBe('lt_r_c4');
  });

  it('marks a result that starred cells change', () => {
    open();
    enterExam('5211100000', '5310010000');
    start('m_l_c6');
    // Without the star C6 at 0 ends the search at C5; counted as normal it lets it go on to C7.
    type('0*21');
    expect(result(/^Motor level, left: C6.*, changed by starred cells$/)).toBeTruthy();
  });

  it('lists what is missing or improbable, with the way to each cell', () => {
    open();
    start();
    type('2n');
    const list = screen.getByRole('region', { name: 'To look at' });
    expect(within(list).getByText(/^132 cells are blank\./)).toBeTruthy();
    fireEvent.click(within(list).getByRole('button', { name: /The right light touch C3 is not tested, without a reason/ }));
    expect(focused()).toBe('lt_r_c3');
    expect(cell('lt_r_c3').getAttribute('aria-label')).toContain('to be looked at');
    type('r5');
    expect(within(list).queryByText(/without a reason/)).toBeNull();
    expect(screen.getByText('Not tested (contracture): Light touch, right, C3.')).toBeTruthy();
  });

  it('tells many cells without a reason once, and takes one reason for all', () => {
    open();
    start();
    type('nnnnn');
    expect(screen.getByText(/^5 cells are not tested, without a reason/)).toBeTruthy();
    expect(screen.getByRole('button', { name: /Why cells were not tested/ })).toBeTruthy();
  });

  it('takes a pasted column', () => {
    open();
    start('m_r_c5');
    const event = createEvent.paste(cell('m_r_c5'), { clipboardData: { getData: () => '5\n5\n4\n3\n2\n1\n0\n0\n0\nNT\n' } });
    fireEvent(cell('m_r_c5'), event);
    expect(cell('m_r_s1').textContent).toBe('NT');
    expect(screen.getByText('10 cells pasted.')).toBeTruthy();
  });

  it('fills and undoes by key', () => {
    open();
    start();
    type('d');
    expect(cell('lt_r_s4_5').textContent).toBe('2');
    expect(focused()).toBe('lt_l_c2');
    fireEvent.keyDown(cell('lt_l_c2'), { key: 'z', ctrlKey: true });
    expect(cell('lt_r_s4_5').textContent).toBe('');
    expect(focused()).toBe('lt_r_c2');
  });

  it('has every key as a button too', () => {
    open();
    const keys = screen.getByRole('group', { name: 'Keys' });
    fireEvent.click(within(keys).getByRole('button', { name: '1' }));
    fireEvent.click(within(keys).getByRole('button', { name: 'Not tested' }));
    fireEvent.click(within(keys).getByRole('button', { name: 'Normal down' }));
    expect(['lt_r_c2', 'lt_r_c3', 'lt_r_c4'].map((key) => cell(key).textContent)).toEqual(['1', 'NT', '2']);
  });

  it('asks before what was typed is left behind, and lets a blank sheet go', async () => {
    const router = open();
    await act(() => router.navigate('/'));
    expect(screen.getByRole('heading', { name: 'Elsewhere' })).toBeTruthy();
    await act(() => router.navigate('/exam'));
    start();
    type('2');
    act(() => void router.navigate('/'));
    const question = await screen.findByRole('alertdialog', { name: 'Leave this exam?' });
    fireEvent.click(within(question).getByRole('button', { name: 'Stay with the exam' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(cell('lt_r_c2').textContent).toBe('2');
    act(() => void router.navigate('/'));
    fireEvent.click(await screen.findByRole('button', { name: 'Leave and forget it' }));
    expect(await screen.findByRole('heading', { name: 'Elsewhere' })).toBeTruthy();
  });

  it('has the browser ask too while something is typed', () => {
    open();
    const closing = () => {
      const event = new Event('beforeunload', { cancelable: true });
      window.dispatchEvent(event);
      return event.defaultPrevented;
    };
    expect(closing()).toBe(false);
    start();
    type('2');
    expect(closing()).toBe(true);
  });

  it('keeps what is typed out of the address and of the browser’s storage', () => {
    const kept = vi.spyOn(Storage.prototype, 'setItem');
    const router = open();
    start();
    type('21n');
    expect(router.state.location.search + router.state.location.hash).toBe('');
    expect(kept).not.toHaveBeenCalled();
    kept.mockRestore();
  });
});
