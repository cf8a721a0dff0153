/** "Nothing to report": asks once, names the month and says what follows. */
import type { Site } from '@cairnstep/contract';
import { formatMonth } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import type { ButtonVariant } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { useCloseMonth } from './submissions.queries.ts';

export interface CloseMonthProps {
  readonly site: Site;
  readonly month: string;
  readonly variant: ButtonVariant;
}

export function CloseMonth({ site, month, variant }: CloseMonthProps) {
  const close = useCloseMonth(site.id);
  const name = formatMonth(month);
  return (
    <ConfirmDialog
      trigger={
        <Button variant={variant} aria-label={`Nothing to report for ${name}`}>
          Nothing to report
        </Button>
      }
      title={`Nothing to report for ${name}?`}
      consequence={
        <div className="grid gap-2">
          <p>
            {site.name} then counts as having had no session, assessment or event in {name}. The month is closed, and no reminder comes any
            more.
          </p>
          <p>If something turns up, submit the month after all: the submission takes the place of this.</p>
        </div>
      }
      confirm={`Close ${name}`}
      onConfirm={async () => {
        await close.mutateAsync(month);
        announce(`${name} is closed: nothing to report.`);
      }}
    />
  );
}
