import { act, fireEvent, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { ComboBox } from './combo-box.tsx';

const options = [
  { value: 'steps_total', label: 'Steps in the session', words: 'step_count' },
  { value: 'distance_total_m', label: 'Distance in the session, m' },
  { value: 'left-out', label: 'Stays behind' },
];

function open(value: string | null) {
  const chosen: string[] = [];
  renderPart(<ComboBox id="meaning" label="Meaning" value={value} options={options} onChange={(each) => chosen.push(each)} />);
  const input = screen.getByRole('combobox', { name: 'Meaning' });
  return { chosen, input };
}

const type = (input: HTMLElement, text: string) => {
  act(() => input.focus());
  fireEvent.change(input, { target: { value: text } });
};
const shown = () => screen.getAllByRole('option').map(({ textContent }) => textContent);

describe('one of very many', () => {
  it('is found by words of its name and by other words, and given once chosen', () => {
    const { chosen, input } = open(null);
    type(input, 'session');
    expect(shown()).toEqual(['Steps in the session', 'Distance in the session, m']);
    type(input, 'step count');
    expect(shown()).toEqual(['Steps in the session']);
    fireEvent.click(screen.getByRole('option'));
    expect(chosen).toEqual(['steps_total']);
  });

  it('stays what it was when what is typed is nothing, or when it is chosen again', () => {
    const { chosen, input } = open('left-out');
    expect((input as HTMLInputElement).value).toBe('Stays behind');
    type(input, 'weather');
    expect(screen.getByText('Nothing is called like this.')).toBeTruthy();
    act(() => input.blur());
    expect((input as HTMLInputElement).value).toBe('Stays behind');
    expect(chosen).toEqual([]);
  });
});
