/** Asks before a sheet that is kept nowhere is left behind. */
import { memo, useEffect } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { useBlocker } from 'react-router-dom';
import { Button } from '../../ui/button.tsx';

export const LeaveQuestion = memo(function LeaveQuestion({ isNeeded }: { readonly isNeeded: boolean }) {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => isNeeded && currentLocation.pathname !== nextLocation.pathname);

  // Closing the tab or loading it again: the browser asks in its own words.
  useEffect(() => {
    if (!isNeeded) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isNeeded]);

  return (
    <ModalOverlay
      isOpen={blocker.state === 'blocked'}
      onOpenChange={(isOpen) => {
        if (!isOpen) blocker.reset?.();
      }}
      className="dialog-veil fixed inset-0 z-20 grid items-center justify-items-center overflow-auto p-4"
    >
      <Modal className="w-full max-w-lg rounded-sm border border-edge bg-sheet text-ink">
        <Dialog role="alertdialog" className="grid gap-4 p-6 outline-none">
          <Heading slot="title" className="text-section font-semibold">
            Leave this exam?
          </Heading>
          <p>What you typed is kept nowhere. When you leave, it is gone.</p>
          <div className="flex flex-wrap gap-3">
            <Button variant="danger" onPress={() => blocker.proceed?.()}>
              Leave and forget it
            </Button>
            <Button onPress={() => blocker.reset?.()}>Stay with the exam</Button>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
});
