import { fireEvent, screen } from '@testing-library/react';
import { expect, it, vi } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { Announcer } from './announcer.tsx';
import { Button } from './button.tsx';

it('takes no further press while what it began is under way, keeps its place for the keyboard, and says so', () => {
  const onPress = vi.fn();
  const onSubmit = vi.fn((event: { preventDefault: () => void }) => event.preventDefault());
  renderPart(
    <form onSubmit={onSubmit}>
      <Button type="submit" isPending onPress={onPress}>
        Send
      </Button>
      <Announcer />
    </form>,
  );
  const button = screen.getByRole('button', { name: 'Send' });
  button.focus();
  fireEvent.click(button);
  expect(onPress).not.toHaveBeenCalled();
  expect(onSubmit).not.toHaveBeenCalled();
  expect(document.activeElement).toBe(button);
  expect(button.getAttribute('aria-disabled')).toBe('true');
  expect(screen.getByRole('status').textContent).toContain('Under way.');
});

it('presses and submits when nothing is under way', () => {
  const onPress = vi.fn();
  const onSubmit = vi.fn((event: { preventDefault: () => void }) => event.preventDefault());
  renderPart(
    <form onSubmit={onSubmit}>
      <Button type="submit" onPress={onPress}>
        Send
      </Button>
    </form>,
  );
  fireEvent.click(screen.getByRole('button', { name: 'Send' }));
  expect(onPress).toHaveBeenCalledTimes(1);
  expect(onSubmit).toHaveBeenCalledTimes(1);
});
