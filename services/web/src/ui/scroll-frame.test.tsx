import { act, fireEvent, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { ScrollFrame } from './scroll-frame.tsx';

let measure: () => void = () => undefined;

/** The page of a test has no sizes of its own, so the frame is told them. */
function open(sizes: { readonly width: number; readonly height: number }, room = { width: 300, height: 200 }) {
  vi.stubGlobal(
    'ResizeObserver',
    class {
      constructor(look: () => void) {
        measure = look;
      }
      observe() {}
      disconnect() {}
    },
  );
  renderPart(
    <>
      <h2 id="name">Months</h2>
      <ScrollFrame labelledBy="name">
        <p>rows</p>
      </ScrollFrame>
    </>,
  );
  const frame = screen.getByText('rows').parentElement as HTMLElement;
  const sized = { scrollWidth: sizes.width, scrollHeight: sizes.height, clientWidth: room.width, clientHeight: room.height };
  for (const [key, value] of Object.entries(sized)) Object.defineProperty(frame, key, { value, configurable: true });
  act(() => measure());
  return frame;
}
afterEach(() => vi.unstubAllGlobals());

describe('a frame', () => {
  it('that holds everything is no stop for the keyboard and says nothing', () => {
    const frame = open({ width: 300, height: 200 });
    expect(frame.getAttribute('tabindex')).toBeNull();
    expect(screen.queryByText(/^More/)).toBeNull();
  });

  it('that is higher than the window, but not too wide, stands at its full height', () => {
    const frame = open({ width: 300, height: 2000 }, { width: 300, height: 2000 });
    expect(frame.getAttribute('tabindex')).toBeNull();
    expect(frame.className).not.toMatch(/overflow-|max-h-/);
  });

  it('that holds more says where, until it has been scrolled there', () => {
    const frame = open({ width: 500, height: 900 });
    expect(screen.getByRole('region', { name: 'Months' })).toBe(frame);
    expect(frame.tabIndex).toBe(0);
    expect(screen.getByText('More to the right and below')).toBeTruthy();
    frame.scrollLeft = 200;
    fireEvent.scroll(frame);
    expect(screen.getByText('More below')).toBeTruthy();
    frame.scrollTop = 700;
    fireEvent.scroll(frame);
    expect(screen.queryByText(/^More/)).toBeNull();
    frame.scrollLeft = 0;
    fireEvent.scroll(frame);
    expect(screen.getByText('More to the right')).toBeTruthy();
  });
});
