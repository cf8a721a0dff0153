/** Asks once before something that cannot be taken back: names the act and its consequence. */
import { useState } from 'react';
import type { ReactElement, ReactNode } from 'react';
import { Dialog, DialogTrigger } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { Button } from './button.tsx';
import { ErrorNotice } from './error-notice.tsx';

export interface ConfirmDialogProps {
  /** The button that opens it. */
  readonly trigger: ReactElement;
  /** The act and the thing: "Withdraw request AR-2026-0007?" */
  readonly title: string;
  /** What will be so afterwards. */
  readonly consequence: ReactNode;
  /** The act again, as a verb: "Withdraw the request". */
  readonly confirm: string;
  readonly cancel?: string;
  readonly danger?: boolean;
  /** Awaited; a failure stays in the dialog and nothing closes. */
  readonly onConfirm: () => Promise<unknown>;
}

export function ConfirmDialog({
  trigger,
  title,
  consequence,
  confirm,
  cancel = 'Leave it as it is',
  danger = false,
  onConfirm,
}: ConfirmDialogProps) {
  const [pending, setPending] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);

  async function act(close: () => void): Promise<void> {
    setPending(true);
    setFailure(null);
    try {
      await onConfirm();
      close();
    } catch (error) {
      setFailure(error);
    } finally {
      setPending(false);
    }
  }

  return (
    <DialogTrigger onOpenChange={() => setFailure(null)}>
      {trigger}
      <ModalOverlay
        isDismissable={!pending}
        className="dialog-veil fixed inset-0 z-20 grid items-center justify-items-center overflow-auto p-4"
      >
        <Modal className="w-full max-w-lg rounded-sm border border-edge bg-sheet text-ink">
          <Dialog role="alertdialog" className="grid gap-4 p-6 outline-none">
            {({ close }) => (
              <>
                <Heading slot="title" className="text-section font-semibold">
                  {title}
                </Heading>
                <div>{consequence}</div>
                {failure !== null && <ErrorNotice error={failure} />}
                <div className="flex flex-wrap gap-3">
                  <Button variant={danger ? 'danger' : 'primary'} isPending={pending} onPress={() => void act(close)}>
                    {confirm}
                  </Button>
                  <Button isDisabled={pending} onPress={close}>
                    {cancel}
                  </Button>
                </div>
              </>
            )}
          </Dialog>
        </Modal>
      </ModalOverlay>
    </DialogTrigger>
  );
}
