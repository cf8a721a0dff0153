import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { UnreachableError } from '../lib/problem-error.ts';
import { fakeApi } from '../testing/fake-api.ts';
import { renderPart } from '../testing/render.tsx';
import { Button } from './button.tsx';
import { ConfirmDialog } from './confirm-dialog.tsx';

function show(onConfirm: () => Promise<unknown>): void {
  fakeApi({});
  renderPart(
    <ConfirmDialog
      trigger={<Button>Withdraw</Button>}
      title="Withdraw request AR-7?"
      consequence="The stewards will no longer see it."
      confirm="Withdraw the request"
      danger
      onConfirm={onConfirm}
    />,
  );
  fireEvent.click(screen.getByRole('button', { name: 'Withdraw' }));
}

describe('a question before an act that cannot be taken back', () => {
  it('names the act and its consequence, and acts only on the word', async () => {
    const onConfirm = vi.fn(() => Promise.resolve());
    show(onConfirm);
    const dialog = screen.getByRole('alertdialog', { name: 'Withdraw request AR-7?' });
    expect(dialog.textContent).toContain('The stewards will no longer see it.');
    expect(onConfirm).not.toHaveBeenCalled();
    fireEvent.click(screen.getByRole('button', { name: 'Withdraw the request' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(onConfirm).toHaveBeenCalledTimes(1);
  });

  it('leaves everything as it is when refused', () => {
    const onConfirm = vi.fn(() => Promise.resolve());
    show(onConfirm);
    fireEvent.click(screen.getByRole('button', { name: 'Leave it as it is' }));
    expect(screen.queryByRole('alertdialog')).toBeNull();
    expect(onConfirm).not.toHaveBeenCalled();
  });

  it('stays open and says what happened when the act fails', async () => {
    show(() => Promise.reject(new UnreachableError()));
    fireEvent.click(screen.getByRole('button', { name: 'Withdraw the request' }));
    expect(await screen.findByText(/The registry cannot be reached/)).toBeTruthy();
    expect(screen.getByRole('alertdialog')).toBeTruthy();
  });
});
