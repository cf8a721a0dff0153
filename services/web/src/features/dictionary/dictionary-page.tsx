import { codebookRows, dictionary, dictionaryAsJson, measureRows } from '@cairnstep/dictionary';
import type { Measure, Table, Variable } from '@cairnstep/dictionary';
import { useId } from 'react';
import { useAddressParam } from '../../lib/address-state.ts';
import { toCsv } from '../../lib/csv.ts';
import { formatCount } from '../../lib/format.ts';
import { saveFile } from '../../lib/save-file.ts';
import { Button } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { ExplainedItem } from '../../ui/explained-item.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { SearchFields } from '../../ui/search-fields.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { measureAddress, variableAddress } from './addresses.ts';
import { ExamCells, isExamCell } from './exam-cells.tsx';
import { scopes, searchDictionary } from './search-dictionary.ts';
import type { Scope } from './search-dictionary.ts';
import { VersionList } from './version-list.tsx';

export default function DictionaryPage() {
  const [query, setQuery] = useAddressParam('q');
  const [shown, setShown] = useAddressParam('show');
  const scope = scopes.find((known) => known === shown) ?? 'all';
  const found = searchDictionary(query ?? '', scope);
  const searched = query !== null;
  const tables = dictionary.tables
    .map((table) => ({ table, variables: found.variables.filter((variable) => variable.table === table.key) }))
    .filter(({ variables }) => variables.length > 0);
  return (
    <Page
      title="Dictionary"
      kicker={`Version ${dictionary.version}`}
      lead={
        <p>Every variable the registry holds: what it means, its unit, limits and codes, the rules about it, and where they come from.</p>
      }
      actions={<Takeaway />}
      note={
        <p>
          Templates, checks, exports and this page are made from the same dictionary. The files here are made in your browser; nothing is
          asked of the registry.
        </p>
      }
    >
      <Section>
        <SearchFields
          id="dictionary"
          hint="Name, column, definition or code"
          words={query ?? ''}
          onWords={setQuery}
          choice={{
            label: 'Show',
            hint: 'One table, or the measures',
            value: scope,
            onChange: (chosen) => setShown(chosen === 'all' ? null : chosen),
            options: scopes.map((value) => ({ value, label: scopeWords(value) })),
          }}
        />
        <p role="status" className="pt-4 text-quiet">
          {inWords(found.variables.length, found.measures.length)}
        </p>
        {found.variables.length + found.measures.length === 0 && (
          <EmptyState
            action={
              <Button
                onPress={() => {
                  setQuery(null);
                }}
              >
                Clear the search
              </Button>
            }
          >
            Nothing holds all of these words. Try fewer of them, or a part of a word.
          </EmptyState>
        )}
      </Section>
      {tables.map(({ table, variables }) => (
        <TableSection key={table.key} table={table} variables={variables} searched={searched} />
      ))}
      {found.measures.length > 0 && <MeasureSection measures={found.measures} />}
      <Section title="Versions" id="versions">
        <VersionList />
      </Section>
    </Page>
  );
}

function scopeWords(scope: Scope): string {
  if (scope === 'all') return 'Everything';
  if (scope === 'measures') return 'Outcome measures';
  return dictionary.tables.find(({ key }) => key === scope)?.name ?? scope;
}

function inWords(variables: number, measures: number): string {
  return `${formatCount(variables, 'variable')} and ${formatCount(measures, 'outcome measure')}`;
}

function Takeaway() {
  const csv = 'text/csv;charset=utf-8';
  return (
    <>
      <Button onPress={() => saveFile('cairnstep-codebook.csv', asCsv(codebookRows()), csv)}>Codebook as CSV</Button>
      <Button onPress={() => saveFile('cairnstep-measures.csv', asCsv(measureRows()), csv)}>Measures as CSV</Button>
      <Button
        onPress={() => saveFile('cairnstep-dictionary.json', JSON.stringify(dictionaryAsJson(), null, 2), 'application/json;charset=utf-8')}
      >
        Everything as JSON
      </Button>
      <Button variant="quiet" onPress={() => window.print()}>
        Print
      </Button>
    </>
  );
}

function asCsv<Row extends object>(rows: readonly Row[]): string {
  const header = Object.keys(rows[0] ?? {}) as (keyof Row & string)[];
  return toCsv([header, ...rows.map((row) => header.map((key) => String(row[key])))]);
}

function TableSection({
  table,
  variables,
  searched,
}: {
  readonly table: Table;
  readonly variables: readonly Variable[];
  readonly searched: boolean;
}) {
  const cells = variables.filter(isExamCell);
  const rest = variables.filter((variable) => !isExamCell(variable));
  // The cells stand where the sheet has them: after the participant and the day.
  const before = rest.filter(({ key }) => table.rowKey.includes(key));
  const after = rest.filter(({ key }) => !table.rowKey.includes(key));
  const groups = cells.length > 0 ? [before, after] : [rest];
  return (
    <Section
      title={table.name}
      id={table.key}
      note={
        <>
          <p>{table.definition}</p>
          <p>
            A row is named by <code>{table.rowKey.join(', ')}</code>.
          </p>
          {table.key === 'exams' && (
            <p>
              <TextLink to="/exam">Type an exam</TextLink> and see its levels and grade.
            </p>
          )}
        </>
      }
    >
      <VariableList variables={groups[0] ?? []} />
      {cells.length > 0 && <ExamCells cells={cells} isOpen={searched} />}
      {groups[1] !== undefined && <VariableList variables={groups[1]} />}
    </Section>
  );
}

function VariableList({ variables }: { readonly variables: readonly Variable[] }) {
  if (variables.length === 0) return null;
  return (
    <ul>
      {variables.map((variable) => (
        <Entry
          key={variable.key}
          to={variableAddress(variable)}
          name={variable.name}
          code={variable.key}
          definition={variable.definition}
          unit={variable.unit}
        />
      ))}
    </ul>
  );
}

function MeasureSection({ measures }: { readonly measures: readonly Measure[] }) {
  return (
    <Section
      title="Outcome measures"
      id="measures"
      note={
        <p>
          What the column <TextLink to={variableAddress({ table: 'assessments', key: 'measure' })}>measure</TextLink> of the assessments can
          name. Limits, units and published sizes of change belong to the measure.
        </p>
      }
    >
      <ul>
        {measures.map(({ key, name, definition, unit }) => (
          <Entry key={key} to={measureAddress(key)} name={name} code={key} definition={definition} unit={unit} />
        ))}
      </ul>
    </Section>
  );
}

function Entry({
  to,
  name,
  code,
  definition,
  unit,
}: {
  readonly to: string;
  readonly name: string;
  readonly code: string;
  readonly definition: string;
  readonly unit: string | undefined;
}) {
  const codeId = useId();
  return (
    <ExplainedItem
      name={
        <>
          <TextLink to={to} aria-describedby={codeId}>
            {name}
          </TextLink>
          <code id={codeId} className="block text-small wrap-anywhere text-quiet">
            {code}
          </code>
        </>
      }
    >
      {definition}
      {unit !== undefined && unit !== '' && <span className="text-quiet"> Unit: {unit}.</span>}
    </ExplainedItem>
  );
}
