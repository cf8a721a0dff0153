/** What was taken in, to be kept by the clinic: on screen, on paper, as JSON. */
import type { SubmissionReceipt } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { formatCount, formatInstantWithZone, formatMonth } from '../../lib/format.ts';
import { saveFile } from '../../lib/save-file.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button, LinkButton } from '../../ui/button.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { ChangeCounts } from './review-section.tsx';
import { changeWords } from './stack-steps.ts';
import { receiptQuery, submissionQuery } from './submissions.queries.ts';
import { tableName, tables } from './table-names.ts';

export default function ReceiptPage() {
  const { submissionId = '' } = useParams();
  const query = useQuery(receiptQuery(submissionId));
  if (query.data === undefined) {
    return (
      <Page title="Receipt">
        <Section>
          <Answer query={query} waiting="Reading the receipt.">
            {() => null}
          </Answer>
        </Section>
      </Page>
    );
  }
  return <Receipt receipt={query.data} />;
}

function Receipt({ receipt }: { readonly receipt: SubmissionReceipt }) {
  const { site, month } = receipt;
  const name = `${site.code}-${month}-receipt`;
  const asJson = () => saveFile(`${name}.json`, `${JSON.stringify(receipt, null, 2)}\n`, 'application/json');
  return (
    <Page
      title={`Receipt of ${formatMonth(month)}`}
      kicker={`Cairnstep, ${site.name} (${site.code})`}
      lead={<p>Accepted: {changeWords(receipt.tables)}.</p>}
      actions={
        <>
          <Button onPress={() => window.print()}>Print</Button>
          <Button onPress={asJson}>Download as JSON</Button>
          <LinkButton variant="quiet" to={`/month?site=${site.code}`}>
            Months of the site
          </LinkButton>
          <LinkButton variant="quiet" to={`/submissions?site=${site.code}`}>
            Submissions of the site
          </LinkButton>
        </>
      }
    >
      <Section
        title="Accepted"
        id="accepted"
        note={<p>The digest names just this content on top of what the registry held before. It is in the audit log too.</p>}
      >
        <dl className="grid max-w-2xl gap-x-6 gap-y-2 sm:grid-cols-[140px_minmax(0,1fr)]">
          <Fact name="On">{formatInstantWithZone(receipt.acceptedAt)}</Fact>
          <Fact name="By">{receipt.acceptedBy}</Fact>
          <Fact name="Submission">
            <code className="break-all">{receipt.submissionId}</code>
          </Fact>
          <Fact name="Digest, SHA-256">
            <code className="break-all">{receipt.digest}</code>
          </Fact>
        </dl>
      </Section>
      <Section title="Rows" id="rows">
        <ChangeCounts id="rows" caption="What the commit did, in rows" tables={receipt.tables} fileName={`${name}-rows`} />
      </Section>
      <Section title="Files" id="files" note={<p>SHA-256 of each file as it was sent. The registry does not keep the files themselves.</p>}>
        <Table
          id="files"
          caption={`${formatCount(receipt.files.length, 'file')} as sent`}
          columns={fileColumns}
          rows={[...tables.map(({ key }) => key), null].flatMap((key) => receipt.files.filter(({ table }) => table === key))}
          rowKey={({ table }) => table ?? 'workbook'}
          empty="No file came with this submission."
          fileName={`${name}-files`}
        />
      </Section>
      <Acknowledged receipt={receipt} fileName={`${name}-warnings`} />
    </Page>
  );
}

function Fact({ name, children }: { readonly name: string; readonly children: ReactNode }) {
  return (
    <>
      <dt className="text-quiet">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}

const fileColumns: readonly Column<SubmissionReceipt['files'][number]>[] = [
  { key: 'table', header: 'Table', value: ({ table }) => tableName(table), isRowHeader: true },
  { key: 'name', header: 'File', value: ({ fileName }) => fileName },
  { key: 'rows', header: 'Rows', value: ({ rows }) => rows, kind: 'number' },
  { key: 'mended', header: 'Cells mended on screen', value: ({ mended }) => mended ?? 0, kind: 'number' },
  {
    key: 'sha256',
    header: 'SHA-256',
    value: ({ sha256 }) => sha256,
    cell: ({ sha256 }) => <code className="inline-block min-w-64 text-small break-all">{sha256}</code>,
  },
];

type Warning = SubmissionReceipt['acknowledged'][number];

function Acknowledged({ receipt, fileName }: { readonly receipt: SubmissionReceipt; readonly fileName: string }) {
  // The receipt names rules; their words stand with the submission.
  const submission = useQuery(submissionQuery(receipt.submissionId));
  const statement = (rule: string) => submission.data?.findings.find((group) => group.rule === rule)?.statement ?? null;
  const columns: readonly Column<Warning>[] = [
    { key: 'rule', header: 'Rule', value: ({ rule }) => rule, isRowHeader: true },
    { key: 'statement', header: 'What it says', value: ({ rule }) => statement(rule) },
    { key: 'count', header: 'Places', value: ({ count }) => count, kind: 'number' },
    { key: 'reason', header: 'Reason given', value: ({ reason }) => reason },
  ];
  return (
    <Section title="Warnings and their reasons" id="warnings">
      <Table
        id="warnings"
        caption="Warnings that stand"
        columns={columns}
        rows={receipt.acknowledged}
        rowKey={({ rule }) => rule}
        empty="The check had nothing to ask about."
        fileName={fileName}
      />
    </Section>
  );
}
