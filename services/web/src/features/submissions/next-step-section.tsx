/** The large line on top of a site's months: what is due, until when, and the button for it. */
import type { Site } from '@cairnstep/contract';
import type { ReactNode } from 'react';
import { formatCount, formatDate, formatMonth } from '../../lib/format.ts';
import { Button, LinkButton } from '../../ui/button.tsx';
import { Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { CloseMonth } from './close-month.tsx';
import { nextStep } from './months.ts';
import type { Month, NextStep } from './months.ts';
import { TemplateLink } from './template-link.tsx';

export interface NextStepSectionProps {
  readonly site: Site;
  readonly months: readonly Month[];
  readonly isCoordinator: boolean;
  /** The month whose submission is being opened. */
  readonly opening: string | null;
  readonly onOpen: (month: string) => void;
  readonly children: ReactNode;
}

export function NextStepSection({ site, months, isCoordinator, opening, onOpen, children }: NextStepSectionProps) {
  const next = nextStep(months, new Date().toISOString().slice(0, 10));
  return (
    <Section
      title={`${site.name} (${site.code})`}
      id="next"
      note={
        <>
          <p>
            <TextLink to={`/explore?site=${site.id}`}>Figures of your own site</TextLink>, exact and live.
          </p>
          <p>
            Autonomic dysreflexia, a fall with injury, a fracture or skin breakdown: the clinic’s emergency and reporting protocol first.
          </p>
        </>
      }
    >
      <div className="grid justify-items-start gap-4">
        {next === null ? <NothingDue months={months} /> : <Due next={next} />}
        {next !== null && isCoordinator && <Act site={site} next={next} isOpening={opening === next.month.month} onOpen={onOpen} />}
        {next !== null && isCoordinator && <TemplateLink site={site} month={next.month.month} />}
        {next !== null && !isCoordinator && <p className="text-quiet">The site coordinator submits. You can follow it here.</p>}
        {children}
      </div>
    </Section>
  );
}

function Due({ next }: { readonly next: NextStep }) {
  const { month, late, correction, others } = next;
  const name = formatMonth(month.month);
  return (
    <div className="grid gap-1">
      <p className="text-title">
        {correction ? (
          <>
            A correction of <strong className="font-semibold">{name}</strong> has been begun
          </>
        ) : (
          <>
            <strong className="font-semibold">{name}</strong> {late ? 'was due on' : 'is due on'}{' '}
            <span className={late ? 'font-semibold text-oxide' : ''}>{formatDate(month.dueOn)}</span>
          </>
        )}
      </p>
      {others > 0 && <p className="text-quiet">After it {formatCount(others, 'more month waits', 'more months wait')}.</p>}
    </div>
  );
}

function Act({
  site,
  next,
  isOpening,
  onOpen,
}: {
  readonly site: Site;
  readonly next: NextStep;
  readonly isOpening: boolean;
  readonly onOpen: (month: string) => void;
}) {
  const { month, begun } = next;
  const name = formatMonth(month.month);
  return begun && month.submissionId !== null ? (
    <LinkButton variant="primary" to={`/submit/${month.submissionId}`}>
      Go on with {name}
    </LinkButton>
  ) : (
    <div className="flex flex-wrap gap-3">
      <Button variant="primary" isPending={isOpening} onPress={() => onOpen(month.month)}>
        Submit {name}
      </Button>
      <CloseMonth site={site} month={month.month} variant="secondary" />
    </div>
  );
}

function NothingDue({ months }: { readonly months: readonly Month[] }) {
  const running = months.find(({ state }) => state === 'not-yet-due');
  return (
    <div className="grid gap-1">
      <p className="text-title">Nothing is due</p>
      {running !== undefined && (
        <p className="text-quiet">
          {formatMonth(running.month)} can be submitted once it is over, and is due on {formatDate(running.dueOn)}.
        </p>
      )}
    </div>
  );
}
