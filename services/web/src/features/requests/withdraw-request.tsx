import type { AccessRequest } from '@cairnstep/contract';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { useWithdrawRequest } from './requests.queries.ts';

/** Taking a request back, as long as it is not decided. */
export function WithdrawRequest({ request }: { readonly request: Pick<AccessRequest, 'id' | 'number' | 'actions'> }) {
  const withdraw = useWithdrawRequest(request.id);
  if (!request.actions.includes('withdraw')) return null;
  return (
    <ConfirmDialog
      trigger={<Button variant="danger">Take the request back</Button>}
      title={`Take request ${request.number} back?`}
      consequence={
        <p>
          The stewards no longer decide it, and it cannot be handed in again. What you wrote stays readable; a new request can be begun.
        </p>
      }
      confirm="Take it back"
      danger
      onConfirm={async () => {
        await withdraw.mutateAsync();
        announce(`Request ${request.number} was taken back.`);
      }}
    />
  );
}
