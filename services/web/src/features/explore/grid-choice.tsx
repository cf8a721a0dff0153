/** What the grid is asked for: outcome, statistic, release or own site. */
import type { Account, listOutcomes, ResponseOf } from '@cairnstep/contract';
import { formatDate } from '../../lib/format.ts';
import { sitesOf } from '../../lib/account.ts';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';
import { unitText } from './grid-words.ts';
import type { GridAddress } from './use-grid-address.ts';

export interface GridChoiceProps {
  readonly account: Account;
  readonly known: ResponseOf<typeof listOutcomes>;
  readonly address: GridAddress;
}

export function GridChoice({ account, known: { outcomes, releases }, address: { question, ask } }: GridChoiceProps) {
  const named = outcomes.filter(({ key }, index) => outcomes.findIndex((other) => other.key === key) === index);
  const ways = outcomes.filter(({ key }) => key === question.outcome);
  const sites = sitesOf(account);
  const newest = releases[0]?.number;
  return (
    <div className="grid grid-cols-1 items-start gap-x-8 gap-y-5 sm:grid-cols-2">
      <div className="grid grid-cols-1 content-start gap-3">
        <Select
          id="outcome"
          label="Outcome"
          value={question.outcome}
          options={named.map((outcome) => ({ value: outcome.key, label: outcomeLabel(outcome) }))}
          onChange={(outcome) => ask({ outcome, inDevice: wayOf(outcomes, outcome, question.inDevice) })}
        />
        {ways.length > 1 ? (
          <RadioGroup
            id="in-device"
            label="Measured"
            inline
            value={question.inDevice}
            options={[
              { value: 'no', label: 'Without the device' },
              { value: 'yes', label: 'In the training device' },
            ]}
            onChange={(inDevice) => ask({ inDevice: inDevice === 'yes' ? 'yes' : null })}
          />
        ) : (
          ways[0] !== undefined && (
            <p className="text-small text-quiet">
              Only results {ways[0].inDevice ? 'in the training device' : 'without the training device'} are in the registry.
            </p>
          )
        )}
      </div>
      <div className="grid grid-cols-1 content-start gap-3">
        <RadioGroup
          id="statistic"
          label="Statistic"
          value={question.statistic}
          options={[
            { value: 'change', label: 'Change over the course' },
            { value: 'baseline', label: 'Value at baseline' },
            { value: 'end', label: 'Value at the end of the course' },
          ]}
          onChange={(statistic) => ask({ statistic: statistic === 'change' ? null : statistic })}
        />
      </div>
      {sites.length > 0 && (
        <RadioGroup
          id="whose"
          label="Whose figures"
          value={question.siteId ?? 'all'}
          options={[
            { value: 'all', label: 'All sites, from a release' },
            ...sites.map(({ id, name }) => ({ value: id, label: `My site: ${name} (exact, live)` })),
          ]}
          onChange={(site) => ask({ site: site === 'all' ? null : site })}
        />
      )}
      {question.siteId === undefined && (
        <Select
          id="release"
          label="Release"
          value={String(question.release ?? newest ?? '')}
          options={releases.map(({ number, madeAt }) => ({
            value: String(number),
            label: `Release ${number}, ${formatDate(madeAt)}${number === newest ? ' (newest)' : ''}`,
          }))}
          onChange={(release) => ask({ release: release === String(newest) ? null : release })}
        />
      )}
    </div>
  );
}

function outcomeLabel(outcome: ResponseOf<typeof listOutcomes>['outcomes'][number]): string {
  const unit = unitText(outcome);
  return unit === '' ? outcome.name : `${outcome.name}, ${unit}`;
}

/** Stays with or without the device where the new outcome has both; otherwise takes the one it has. */
function wayOf(outcomes: ResponseOf<typeof listOutcomes>['outcomes'], key: string, now: 'yes' | 'no'): 'yes' | null {
  const ways = outcomes.filter((outcome) => outcome.key === key).map(({ inDevice }) => (inDevice ? 'yes' : 'no'));
  const way = ways.includes(now) ? now : ways[0];
  return way === 'yes' ? 'yes' : null;
}
