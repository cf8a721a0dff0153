import { describeRange, describeRequirement, measures, rulesAbout, tableOf, variableOf } from '@cairnstep/dictionary';
import type { Variable } from '@cairnstep/dictionary';
import { useParams } from 'react-router-dom';
import { formatCount } from '../../lib/format.ts';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { measureAddress, tableAddress, variableAddress, variableAt } from './addresses.ts';
import { CodeList } from './code-list.tsx';
import { Conversions } from './conversions.tsx';
import { cellsOfSegment } from './exam-cells.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Neighbours } from '../../ui/neighbours.tsx';
import { NothingHere } from './nothing-here.tsx';
import { RuleList } from './rule-list.tsx';
import { VersionList } from './version-list.tsx';
import { directionWords, exposureWords, typeWords } from './words.ts';

export default function VariablePage() {
  const { table, column } = useParams();
  const variable = variableAt(table, column);
  return variable === undefined ? <NothingHere /> : <VariableEntry variable={variable} />;
}

function VariableEntry({ variable }: { readonly variable: Variable }) {
  const table = tableOf(variable.table);
  const { codes = [], missingCodes = [], acceptedUnits = [], unit } = variable;
  return (
    <Page
      title={variable.name}
      kicker={
        <>
          <TextLink to="/dictionary">Dictionary</TextLink>, <TextLink to={tableAddress(table.key)}>{table.name}</TextLink>
        </>
      }
      lead={<p>{variable.definition}</p>}
      note={
        <p>
          Source: {variable.source}. In the dictionary since version {variable.since}.
        </p>
      }
    >
      <Section title="What a file holds" id="facts" note={<p>{exposureWords[variable.exposure]}</p>}>
        <Facts facts={factsOf(variable)} />
      </Section>
      {codes.length > 0 && (
        <Section title="Codes" id="codes">
          <div className="grid gap-6">
            <CodeList
              caption="What the column may hold"
              codes={codes}
              {...(variable.table === 'assessments' && variable.key === 'measure' && { link: measureLink })}
            />
            {missingCodes.length > 0 && <CodeList caption="Why there is no value" codes={missingCodes} />}
          </div>
        </Section>
      )}
      {variable.measuredBy !== undefined && <MeasuredBy variable={variable} />}
      {acceptedUnits.length > 0 && unit !== undefined && (
        <Section title="Other units" id="units" note={<p>The factors are exact. Every digit that a conversion gives is kept.</p>}>
          <Conversions stored={unit} units={acceptedUnits} />
        </Section>
      )}
      <Section title="Rules" id="rules" note={<p>Rules compare a value with others: of the row, the day, or the participant.</p>}>
        <RuleList rules={rulesAbout(variable.table, variable.key)} />
      </Section>
      <OtherCells variable={variable} />
      <Section title="Versions" id="versions">
        <VersionList since={variable.since} />
      </Section>
      <Neighbours
        entries={table.variables.map((each) => ({ to: variableAddress(each), name: each.name }))}
        at={variableAddress(variable)}
      />
    </Page>
  );
}

function factsOf(variable: Variable) {
  const { key, type, unit, hard, plausible, decimals, better, aliases = [], measuredBy } = variable;
  return [
    { term: 'Column', value: <code>{key}</code> },
    { term: 'Kind', value: typeWords[type] },
    { term: 'Unit', value: measuredBy === undefined ? unit : `as ${measuredBy.column} says` },
    { term: 'Allowed', value: hard && describeRange(hard, unit) },
    { term: 'Usual', value: plausible && `${describeRange(plausible, unit)}; anything else is asked about` },
    { term: 'Shown with', value: decimals !== undefined && `${formatCount(decimals, 'digit')} after the point` },
    { term: 'Must be filled', value: describeRequirement(variable) },
    { term: 'Direction', value: better && directionWords[better] },
    { term: 'Other headers', value: aliases.length > 0 && <code>{aliases.join(', ')}</code> },
  ];
}

function measureLink({ code, label }: { readonly code: string; readonly label: string }) {
  return <TextLink to={measureAddress(code)}>{label}</TextLink>;
}

/** The measures that give this column its unit and limits. */
function MeasuredBy({ variable }: { readonly variable: Variable }) {
  const { column, prefix } = variable.measuredBy ?? { column: '', prefix: '' };
  const named = new Set((variableOf(variable.table, column).codes ?? []).map(({ code }) => `${prefix}${code}`));
  return (
    <Section title="Measures it can hold" id="measures" note={<p>Unit, limits and step are those of the measure.</p>}>
      <ul className="grid max-w-2xl gap-1">
        {measures
          .filter(({ key }) => named.has(key))
          .map(({ key, name, unit, hard }) => (
            <li key={key}>
              <TextLink to={measureAddress(key)}>{name}</TextLink>
              <span className="text-quiet">, {describeRange(hard, unit)}</span>
            </li>
          ))}
      </ul>
    </Section>
  );
}

function OtherCells({ variable }: { readonly variable: Variable }) {
  const others = cellsOfSegment(variable).filter((key) => key !== variable.key);
  if (others.length === 0) return null;
  return (
    <Section title="Other cells of this segment" id="segment">
      <ul className="flex flex-wrap gap-x-6 gap-y-1">
        {others.map((key) => (
          <li key={key}>
            <TextLink to={variableAddress({ table: 'exams', key })}>{variableOf('exams', key).name}</TextLink>
          </li>
        ))}
      </ul>
    </Section>
  );
}
