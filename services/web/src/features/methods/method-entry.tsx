import type { Computation, EvidenceRow, MethodPage } from '@cairnstep/statistics';
import { certifiedSets, evidenceTable } from '@cairnstep/statistics';
import { Button } from '../../ui/button.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { CertifiedDigits } from './certified-digits.tsx';
import { EntryKicker } from './entry-kicker.tsx';
import { EntryNeighbours } from './entry-neighbours.tsx';
import { evidenceColumns } from './evidence-columns.tsx';
import { Formula } from './formula.tsx';
import { symbolMeanings } from './typeset.ts';

export function MethodEntry({ method }: { readonly method: MethodPage }) {
  const { slug, title, question, formula, whenUsed, smallN, source, computedBy } = method;
  const meanings = symbolMeanings(formula);
  return (
    <Page
      title={title}
      kicker={<EntryKicker topic={question} />}
      lead={<p>{whenUsed}</p>}
      actions={
        <Button variant="quiet" onPress={() => window.print()}>
          Print
        </Button>
      }
    >
      <Section title="Formula" id="formula" note={meanings.length > 0 && meanings.map((meaning) => <p key={meaning}>{meaning}</p>)}>
        <Formula lines={formula} />
      </Section>
      <Section title="In use" id="use">
        <Facts
          facts={[
            { term: 'When n is small', value: smallN },
            { term: 'Source', value: source },
            { term: 'Computed by', value: <ComputedBy {...computedBy} /> },
          ]}
        />
      </Section>
      <Evidence slug={slug} />
      <EntryNeighbours slug={slug} />
    </Page>
  );
}

function ComputedBy({ by, why }: Computation) {
  return (
    <>
      <p>{by.join(', ')}</p>
      <p className="text-small text-quiet">{why}</p>
    </>
  );
}

function Evidence({ slug }: { readonly slug: string }) {
  const rows = evidenceTable.filter(({ method }) => method === slug);
  const sets = certifiedSets.filter(({ method }) => method === slug);
  if (rows.length === 0) {
    return (
      <Section title="Evidence" id="evidence">
        <p>A rule for writing figures: there is nothing to compare it with.</p>
      </Section>
    );
  }
  return (
    <Section
      title="Evidence"
      id="evidence"
      note={
        <>
          <p>
            Our figures beside those of a source outside the registry. The relative error is the largest of all figures compared: at most
            this much of the published one.
          </p>
          <p>
            Anyone with the program can repeat it: <code>npm run verify:statistics</code>
          </p>
        </>
      }
    >
      <div className="grid gap-8">
        <Table
          id="evidence"
          caption="Compared with"
          columns={evidenceColumns}
          rows={rows}
          rowKey={({ source }: EvidenceRow) => source}
          empty="No figure has been compared yet."
          isSortable={false}
        />
        {sets.length > 0 && <CertifiedDigits sets={sets} />}
      </div>
    </Section>
  );
}
