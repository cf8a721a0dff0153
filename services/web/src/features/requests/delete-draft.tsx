import type { AccessRequest } from '@cairnstep/contract';
import { useNavigate } from 'react-router-dom';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { useDeleteDraft } from './requests.queries.ts';

export interface DeleteDraftProps {
  readonly request: Pick<AccessRequest, 'id' | 'number' | 'actions'>;
  /** What is still to be kept must not arrive after the draft is gone. */
  readonly keepNow: () => Promise<void>;
}

export function DeleteDraft({ request, keepNow }: DeleteDraftProps) {
  const navigate = useNavigate();
  const remove = useDeleteDraft(request.id);
  if (!request.actions.includes('delete')) return null;
  return (
    <ConfirmDialog
      trigger={<Button variant="danger">Delete the draft</Button>}
      title={`Delete the draft of request ${request.number}?`}
      consequence={<p>All that you wrote in it is gone for good. Nobody else has seen it.</p>}
      confirm="Delete it"
      danger
      onConfirm={async () => {
        await keepNow();
        await remove.mutateAsync();
        announce(`The draft of request ${request.number} was deleted.`);
        await navigate('/requests');
      }}
    />
  );
}
