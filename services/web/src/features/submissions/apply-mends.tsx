/** What was typed in place of cells, sent all together and checked again. Stays in sight while there is something to send. */
import type { Submission } from '@cairnstep/contract';
import { formatCount } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { LeaveQuestion } from '../../ui/leave-question.tsx';
import { beginCheckId } from './check-section.tsx';
import { applyMendsId } from './mend-cell.tsx';
import type { MendDrafts } from './mend-drafts.ts';
import { useMendAndCheck } from './submissions.queries.ts';

export function ApplyMends({ submission, drafts }: { readonly submission: Submission; readonly drafts: MendDrafts }) {
  const apply = useMendAndCheck(submission.id);
  const { all, unreadable } = drafts;
  if (all.length === 0) return null;
  const changes = formatCount(all.length, 'change');

  async function send(): Promise<void> {
    try {
      await apply.mutateAsync(all);
    } catch {
      // Told below, where the changes still stand.
      return;
    }
    drafts.clear();
    announce(`${changes} applied. The check has begun again.`);
    document.getElementById(beginCheckId)?.focus();
  }

  return (
    <div
      className="sticky bottom-0 z-2 grid gap-2 border-t-2 border-lichen bg-sheet py-3"
      role="group"
      aria-label="Changes not applied yet"
    >
      <LeaveQuestion
        isNeeded
        title="Leave the changes you typed?"
        consequence={`${changes} ${all.length === 1 ? 'has' : 'have'} not been applied and would be lost.`}
        leave="Leave and lose them"
        stay="Stay here"
      />
      <p>
        {changes} typed, not applied yet.{' '}
        {unreadable > 0 && (
          <span className="font-semibold text-oxide">{formatCount(unreadable, 'value')} cannot be read: mend or leave it.</span>
        )}
      </p>
      <div className="flex flex-wrap gap-3">
        <Button id={applyMendsId} variant="primary" isDisabled={unreadable > 0} isPending={apply.isPending} onPress={() => void send()}>
          Apply {changes} and check again
        </Button>
        <Button onPress={drafts.clear}>Drop {all.length === 1 ? 'it' : 'them'}</Button>
      </div>
      {apply.isError && <ErrorNotice error={apply.error} />}
    </div>
  );
}
