/** What the check found, rule by rule: what is wrong, why it matters, how to mend it, and how often. */
import type { Submission } from '@cairnstep/contract';
import type { ReactNode } from 'react';
import { useSearchParams } from 'react-router-dom';
import { formatCount, formatMonth } from '../../lib/format.ts';
import { Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { DownloadFindings } from './download-findings.tsx';
import { FindingPlaces } from './finding-places.tsx';
import type { MendDrafts } from './mend-drafts.ts';
import { ReasonForm } from './reason-form.tsx';
import type { ReasonDrafts } from './reason-form.tsx';
import { openWarnings, placesOf } from './stack-steps.ts';

type Group = Submission['findings'][number];

export interface FindingsSectionProps {
  readonly submission: Submission;
  readonly isCoordinator: boolean;
  readonly drafts: ReasonDrafts;
  readonly mends: MendDrafts;
}

export function FindingsSection({ submission, isCoordinator, drafts, mends }: FindingsSectionProps) {
  const { findings } = submission;
  if (findings.length === 0) return null;
  const errors = identifyingFirst(findings.filter(({ severity }) => severity === 'error'));
  const warnings = findings.filter(({ severity }) => severity === 'warning');
  // A file sent anew begins the findings anew, so reasons wait until the errors are mended.
  const takesReasons = isCoordinator && errors.length === 0;
  return (
    <>
      <Section
        title="Findings"
        id="findings"
        note={
          <>
            <p>An error keeps the month out until it is mended. A warning is unusual, not impossible: mend it, or say why it stands.</p>
            <p>Findings say what kind of thing was found, never what a cell holds.</p>
          </>
        }
      >
        <div className="grid gap-6">
          {errors.length > 0 && <Groups title={`${formatCount(errors.length, 'rule')} broken: mend these`} groups={errors} />}
          {warnings.length > 0 && (
            <Groups title={warningTitle(submission, warnings.length)} groups={warnings}>
              {(group) =>
                takesReasons ? (
                  <ReasonForm key={group.rule} submissionId={submission.id} group={group} drafts={drafts} />
                ) : (
                  <Reason group={group} />
                )
              }
            </Groups>
          )}
          <DownloadFindings submission={submission} name={`${submission.site.code}-${submission.month}-findings`} />
        </div>
      </Section>
      <FindingPlaces
        submission={submission}
        caption={`Findings of ${formatMonth(submission.month)}`}
        drafts={isCoordinator ? mends : null}
      />
    </>
  );
}

/** What tells who somebody is comes before everything else. */
const identifyingFirst = (groups: readonly Group[]): readonly Group[] =>
  [...groups].sort((a, b) => Number(b.rule === 'F50') - Number(a.rule === 'F50'));

function warningTitle(submission: Submission, count: number): string {
  const open = openWarnings(submission).length;
  const title = formatCount(count, 'warning');
  if (placesOf(submission, 'error') > 0) return `${title} to look at; each that is left after the errors are mended needs a reason`;
  return open === 0 ? `${title}, each with its reason` : `${title} to look at, ${open} without a reason`;
}

interface GroupsProps {
  readonly title: string;
  readonly groups: readonly Group[];
  readonly children?: (group: Group) => ReactNode;
}

function Groups({ title, groups, children }: GroupsProps) {
  return (
    <div>
      <h3 className="pb-2 font-semibold">{title}</h3>
      <ul>
        {groups.map((group) => (
          <li key={group.rule} className="grid gap-3 border-t border-hairline py-4">
            <OneGroup group={group} />
            {children?.(group)}
          </li>
        ))}
      </ul>
    </div>
  );
}

function OneGroup({ group: { rule, severity, statement, why, mend, count } }: { readonly group: Group }) {
  const [search] = useSearchParams();
  const places = new URLSearchParams(search);
  for (const name of ['in', 'severity', 'page']) places.delete(name);
  places.set('rule', rule);
  return (
    <div className="grid gap-x-6 gap-y-1 sm:grid-cols-[72px_minmax(0,1fr)_auto]">
      <p className={`font-semibold ${severity === 'error' ? 'text-oxide' : 'text-amber'}`}>{severity === 'error' ? 'Error' : 'Warning'}</p>
      <div className="grid max-w-2xl gap-1">
        <h4 className="font-semibold">{statement}</h4>
        <p>{mend}</p>
        <p className="text-small text-quiet">{why}</p>
      </div>
      <p className="sm:text-right">
        <TextLink to={{ search: `?${places}`, hash: '#places' }}>
          {formatCount(count, 'place')}
          <span className="sr-only"> of rule {rule}</span>
        </TextLink>
        <span className="block text-small text-quiet">rule {rule}</span>
      </p>
    </div>
  );
}

function Reason({ group: { acknowledgedReason } }: { readonly group: Group }) {
  return acknowledgedReason === null ? (
    <p className="text-quiet">No reason has been given yet.</p>
  ) : (
    <p>
      <span className="text-quiet">Reason given: </span>
      {acknowledgedReason}
    </p>
  );
}
