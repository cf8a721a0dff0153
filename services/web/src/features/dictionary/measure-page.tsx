import { describeRange, measures, rulesAboutMeasure } from '@cairnstep/dictionary';
import type { Measure, Threshold } from '@cairnstep/dictionary';
import { useParams } from 'react-router-dom';
import { formatCount, formatQuantity } from '../../lib/format.ts';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { measureAddress, measureAt, variableAddress } from './addresses.ts';
import { CodeList } from './code-list.tsx';
import { Conversions } from './conversions.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Neighbours } from '../../ui/neighbours.tsx';
import { NothingHere } from './nothing-here.tsx';
import { RuleList } from './rule-list.tsx';
import { VersionList } from './version-list.tsx';
import { confidenceWords, directionWords, scaleWords } from './words.ts';

export default function MeasurePage() {
  const { key } = useParams();
  const measure = measureAt(key);
  return measure === undefined ? <NothingHere /> : <MeasureEntry measure={measure} />;
}

function MeasureEntry({ measure }: { readonly measure: Measure }) {
  const { thresholds, acceptedUnits = [], grades, cautions } = measure;
  return (
    <Page
      title={measure.name}
      kicker={
        <>
          <TextLink to="/dictionary">Dictionary</TextLink>, <TextLink to="/dictionary?show=measures">Outcome measures</TextLink>
        </>
      }
      lead={<p>{measure.definition}</p>}
      note={
        <>
          <p>
            Source: {measure.source}. In the dictionary since version {measure.since}.
          </p>
          <p>{measure.licence}</p>
        </>
      }
    >
      <Section
        title="How it is recorded"
        id="facts"
        note={
          <p>
            A result is a row of the assessments:{' '}
            <TextLink to={variableAddress({ table: 'assessments', key: 'measure' })}>measure</TextLink> names it,{' '}
            <TextLink to={variableAddress({ table: 'assessments', key: 'value' })}>value</TextLink> holds it.
          </p>
        }
      >
        <Facts facts={factsOf(measure)} />
      </Section>
      {grades !== undefined && (
        <Section title="Grades" id="grades">
          <CodeList
            caption="How each grade is written, and the number it is stored as"
            codes={grades.map(({ written, stored }) => ({ code: written, label: `stored as ${stored}` }))}
          />
        </Section>
      )}
      {acceptedUnits.length > 0 && (
        <Section title="Other units" id="units" note={<p>The factors are exact. Every digit that a conversion gives is kept.</p>}>
          <Conversions stored={measure.unit} units={acceptedUnits} />
        </Section>
      )}
      <Section
        title="Published sizes of change"
        id="thresholds"
        note={
          <>
            <p>MDC: the smallest change that is more than measurement error. MCID: the smallest change that people notice as one.</p>
            <p>
              Figures about groups. They do not decide for one person. A figure from memory is to be confirmed before it drives a decision.
            </p>
          </>
        }
      >
        <div className="grid gap-6">
          <Thresholds name="Smallest detectable change (MDC)" thresholds={thresholds.mdc} />
          <Thresholds name="Smallest important change (MCID)" thresholds={thresholds.mcid} />
        </div>
      </Section>
      {cautions.length > 0 && (
        <Section title="Cautions" id="cautions">
          <ul className="grid max-w-2xl list-disc gap-1 pl-5">
            {cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
          </ul>
        </Section>
      )}
      <Section title="Rules" id="rules" note={<p>Rules compare a result with others of the same day or participant.</p>}>
        <RuleList rules={rulesAboutMeasure(measure.key)} />
      </Section>
      <Section title="Versions" id="versions">
        <VersionList since={measure.since} />
      </Section>
      <Neighbours entries={measures.map(({ key, name }) => ({ to: measureAddress(key), name }))} at={measureAddress(measure.key)} />
    </Page>
  );
}

function factsOf(measure: Measure) {
  const { unit, decimals } = measure;
  return [
    { term: 'Code in files', value: <code>{measure.key}</code> },
    { term: 'Unit', value: unit },
    { term: 'Scale', value: scaleWords[measure.scale] },
    { term: 'Allowed', value: describeRange(measure.hard, unit) },
    { term: 'Usual', value: `${describeRange(measure.plausible, unit)}; anything else is asked about` },
    { term: 'Smallest step', value: formatQuantity(measure.step, unit, decimals) },
    { term: 'Shown with', value: `${formatCount(decimals, 'digit')} after the point` },
    { term: 'Direction', value: directionWords[measure.better] },
    {
      term: 'Means',
      value: measure.meanIsCustomary
        ? measure.scale === 'ordinal'
          ? 'Shown, because the field prints them, and labelled as means of an ordinal score'
          : 'Shown'
        : 'Not shown: medians and counts only',
    },
    { term: 'When', value: measure.timing.join('; ') },
    { term: 'Stopped early', value: measure.scoredWhenStoppedEarly ? 'What was reached counts as the result' : 'Has no result' },
    { term: 'Computed', value: measure.derivedFrom },
    { term: 'In files', value: measure.entered ? 'May be entered' : 'Never entered, only computed' },
  ];
}

function Thresholds({ name, thresholds }: { readonly name: string; readonly thresholds: readonly Threshold[] }) {
  if (thresholds.length === 0)
    return <EmptyState>{`${name}: no published figure for spinal cord injury was found, so none is used.`}</EmptyState>;
  return (
    <div>
      <h3 className="pb-1 font-semibold">{name}</h3>
      <ul className="grid max-w-2xl">
        {thresholds.map(({ value, unit, population, citation, confidence, note }) => (
          <li key={`${citation} ${population}`} className="border-b border-hairline py-2">
            <span className="numbers font-semibold">{typeof value === 'number' ? `${value} ${unit}` : describeRange(value, unit)}</span>,{' '}
            {population}
            <span className="block text-small text-quiet">
              {citation}. Figure {confidenceWords[confidence]}
              {note === undefined ? '' : `; ${note}`}.
            </span>
          </li>
        ))}
      </ul>
    </div>
  );
}
