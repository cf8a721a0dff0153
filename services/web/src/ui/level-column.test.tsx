import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import type { LevelRange } from '../lib/level-range.ts';
import { renderPart } from '../testing/render.tsx';
import { LevelColumn } from './level-column.tsx';

const counts = new Map([
  ['C5', 40],
  ['C6', null],
] as const);

function Column() {
  const [range, setRange] = useState<LevelRange | null>(null);
  return <LevelColumn label="Level of injury" counts={counts} range={range} onRangeChange={setRange} />;
}

const option = (name: RegExp) => screen.getByRole('option', { name });
const selected = () => screen.queryAllByRole('option', { selected: true }).map((element) => element.dataset['segment']);

describe('the level column', () => {
  it('says how many participants a segment has, and no more than that a number is not shown', () => {
    renderPart(<Column />);
    expect(option(/^C5 ?40 participants$/)).toBeTruthy();
    expect(option(/^C6 ?not shown$/)).toBeTruthy();
    expect(option(/^C7 ?0 participants$/)).toBeTruthy();
  });

  it('chooses one segment by a click and a run of them with shift', () => {
    renderPart(<Column />);
    fireEvent.click(option(/^C5/));
    expect(selected()).toEqual(['C5']);
    fireEvent.click(option(/^C8/), { shiftKey: true });
    expect(selected()).toEqual(['C5', 'C6', 'C7', 'C8']);
  });

  it('chooses a run by dragging, in either direction', () => {
    renderPart(<Column />);
    fireEvent.pointerDown(option(/^T2/), { button: 0, pointerType: 'mouse' });
    fireEvent.pointerEnter(option(/^C8/));
    fireEvent.pointerUp(option(/^C8/));
    fireEvent.pointerEnter(option(/^C4/));
    expect(selected()).toEqual(['C8', 'T1', 'T2']);
  });

  it('does not choose where a finger begins to scroll', () => {
    renderPart(<Column />);
    fireEvent.pointerDown(option(/^T2/), { button: 0, pointerType: 'touch' });
    expect(selected()).toEqual([]);
    fireEvent.click(option(/^T2/));
    expect(selected()).toEqual(['T2']);
  });

  it('is worked with arrow keys; shift extends, Escape gives up the choice', () => {
    renderPart(<Column />);
    const list = screen.getByRole('listbox', { name: 'Level of injury' });
    fireEvent.keyDown(list, { key: 'ArrowDown' });
    expect(selected()).toEqual(['C2']);
    fireEvent.keyDown(list, { key: 'ArrowDown', shiftKey: true });
    fireEvent.keyDown(list, { key: 'ArrowDown', shiftKey: true });
    expect(selected()).toEqual(['C2', 'C3', 'C4']);
    expect(document.activeElement).toBe(option(/^C4/));
    fireEvent.keyDown(list, { key: 'ArrowUp', shiftKey: true });
    expect(selected()).toEqual(['C2', 'C3']);
    fireEvent.keyDown(list, { key: 'Escape' });
    expect(selected()).toEqual([]);
  });

  it('has one stop for the Tab key', () => {
    renderPart(<Column />);
    expect(screen.getAllByRole('option').filter(({ tabIndex }) => tabIndex === 0)).toHaveLength(1);
  });

  it('takes a typed range and says what it expects of one it cannot read', () => {
    renderPart(<Column />);
    const field = screen.getByRole('textbox', { name: 'Levels' });
    fireEvent.change(field, { target: { value: 'C9' } });
    fireEvent.submit(field);
    expect(screen.getByText('Write one level or two, for example C5-T6')).toBeTruthy();
    expect(selected()).toEqual([]);
    fireEvent.change(field, { target: { value: 't2-c8' } });
    fireEvent.submit(field);
    expect(selected()).toEqual(['C8', 'T1', 'T2']);
    expect(screen.queryByText(/Write one level/)).toBeNull();
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: 'Levels' }).value).toBe('C8-T2');
  });
});
