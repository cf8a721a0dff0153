/** Asks before a page is left whose work is kept nowhere. */
import { memo } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { useBlocker } from 'react-router-dom';
import { useStayOnPage } from '../lib/use-stay-on-page.ts';
import { Button } from './button.tsx';

export interface LeaveQuestionProps {
  readonly isNeeded: boolean;
  /** "Leave this exam?" */
  readonly title: string;
  /** What would be lost, as a sentence. */
  readonly consequence: string;
  readonly leave: string;
  readonly stay: string;
}

export const LeaveQuestion = memo(function LeaveQuestion({ isNeeded, title, consequence, leave, stay }: LeaveQuestionProps) {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => isNeeded && currentLocation.pathname !== nextLocation.pathname);
  useStayOnPage(isNeeded);

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
            {title}
          </Heading>
          <p>{consequence}</p>
          <div className="flex flex-wrap gap-3">
            <Button variant="danger" onPress={() => blocker.proceed?.()}>
              {leave}
            </Button>
            <Button onPress={() => blocker.reset?.()}>{stay}</Button>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
});
