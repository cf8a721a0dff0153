import { dataUseOntology, defaultPolicy, purposes, terms } from '@cairnstep/consent';
import type { Purpose, Term, TermCode, Verdict } from '@cairnstep/consent';
import { Section } from '../../../ui/page.tsx';
import { Table } from '../../../ui/table.tsx';
import type { Column } from '../../../ui/table.tsx';
import type { Decision } from '../decision.ts';
import { permissionCodes, purposeKeys, verdictOn } from './purpose-matrix.ts';

export const consentMatching: Decision = {
  slug: 'consent-matching',
  title: 'How consent is matched',
  summary:
    'Whether a person’s rows may be used for a purpose is decided person by person, from the terms of their newest consent, when a request is weighed and again when an export is built.',
  note: 'The matching advises the data steward and filters rows. It releases nothing by itself.',
  Body,
};

const verdictWords: Readonly<Record<Verdict, string>> = {
  permitted: 'allowed',
  not_permitted: 'not allowed',
  manual_review: 'a person decides',
};

function Body() {
  return (
    <>
      <Section title="In this order" id="order">
        <ol className="grid max-w-2xl list-decimal gap-2 pl-5">
          <li>The newest consent must be in force: not withdrawn, replaced or expired.</li>
          <li>The purpose must lie within what it permits.</li>
          <li>Each restriction on it is checked by itself: users, area, time, commerce, ethics approval, duties.</li>
          <li>A refusal wins over an open question, an open question over a permission. Open questions go to a data steward.</li>
        </ol>
      </Section>
      <Section
        title="Purpose and permission"
        id="purposes"
        note={
          <>
            <p>
              Worked out by the matching itself, for a consent without restrictions; permission for a condition taken for spinal cord
              injury.
            </p>
            <p>Codes of permissions: {permissionCodes.map((code) => `${code}, ${terms[code].label}`).join('; ')}.</p>
          </>
        }
      >
        <Table
          id="purposes"
          caption="May the data be used for …"
          columns={purposeColumns}
          rows={purposeKeys}
          rowKey={(purpose) => purpose}
          empty="No purpose is known."
          isSortable={false}
        />
      </Section>
      <Section title="Choices of the registry" id="choices" note={<p>Published rules leave these points open.</p>}>
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>
            Developing methods under a consent for a condition, where general methods research is not forbidden:{' '}
            {verdictWords[defaultPolicy.methodsUnderConditionConsent]}.
          </li>
          <li>
            Data held already when a person withdraws from new data only:{' '}
            {defaultPolicy.heldDataAfterWithdrawal === 'left_out' ? 'left out of every later use' : 'used as consented before'}.
          </li>
          <li>Whoever has withdrawn, however far, is in no later release. Whoever refused general aggregate figures is in none either.</li>
        </ul>
      </Section>
      <Section title="Terms a consent can carry" id="terms" wide note={<Credit />}>
        <Table
          id="terms"
          caption="Permissions and restrictions"
          columns={termColumns}
          rows={termRows}
          rowKey={({ code }) => code}
          empty="No term is known."
          fileName="cairnstep-consent-terms"
        />
      </Section>
    </>
  );
}

function Credit() {
  return (
    <>
      <p>
        Ids, shorthands and labels: {dataUseOntology.name}, version{' '}
        <a href={dataUseOntology.version} className="wrap-anywhere">
          {dataUseOntology.version}
        </a>
        , from{' '}
        <a href={dataUseOntology.repository} className="wrap-anywhere">
          {dataUseOntology.repository}
        </a>
        , licence <a href="https://creativecommons.org/licenses/by/4.0/">{dataUseOntology.licence}</a>; Lawson et al. (2021) Cell Genomics
        1(2):100028.
      </p>
      <p>The meanings are in our words. Terms without an id are the registry’s own.</p>
    </>
  );
}

const purposeColumns: readonly Column<Purpose>[] = [
  { key: 'purpose', header: 'Purpose', value: (purpose) => purposes[purpose], isRowHeader: true },
  ...permissionCodes.map((code): Column<Purpose> => ({
    key: code,
    header: code,
    value: (purpose) => verdictWords[verdictOn(purpose, code)],
    cell: (purpose) => {
      const verdict = verdictOn(purpose, code);
      return <span className={verdict === 'permitted' ? 'font-semibold' : 'text-quiet'}>{verdictWords[verdict]}</span>;
    },
  })),
];

interface TermRow extends Term {
  readonly code: TermCode;
}

const kindWords: Readonly<Record<Term['kind'], string>> = {
  permission: 'permission',
  modifier: 'restriction',
  'local-flag': 'flag of the registry',
};

const termRows = (Object.entries(terms) as [TermCode, Term][]).map(([code, term]): TermRow => ({ code, ...term }));

const termColumns: readonly Column<TermRow>[] = [
  { key: 'meaning', header: 'Meaning', value: ({ meaning }) => meaning, isRowHeader: true },
  { key: 'code', header: 'Code', value: ({ code }) => code, cell: ({ code }) => <code>{code}</code> },
  { key: 'label', header: 'Label', value: ({ label }) => label },
  {
    key: 'id',
    header: 'Id',
    value: ({ id }) => id ?? null,
    cell: ({ id }) => (id === undefined ? <span className="text-quiet">none</span> : <code>{id}</code>),
  },
  { key: 'kind', header: 'Kind', value: ({ kind, code }) => (code === 'CC' ? 'widening' : kindWords[kind]) },
];
