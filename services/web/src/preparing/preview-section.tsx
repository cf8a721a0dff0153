/** Exactly what will be sent: the first rows as they leave, every different word, and what was left behind. */
import { memo } from 'react';
import { tableName } from '../features/submissions/table-names.ts';
import { formatCount, formatNumber, formatShare } from '../lib/format.ts';
import { Facts } from '../ui/facts.tsx';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { StayingBehind } from './staying-behind.tsx';
import { TablePreview } from './table-preview.tsx';
import type { PreparedPicture } from './worker/protocol.ts';

export interface PreviewSectionProps {
  readonly prepared: PreparedPicture;
  readonly isStale: boolean;
  /** "November 2026" */
  readonly monthName: string;
  /** Whether the registry has said whom it holds. */
  readonly knowsTheRegistry: boolean;
}

/** Large, and the same until it is worked out anew. */
export const PreviewSection = memo(function PreviewSection({ prepared, isStale, monthName, knowsTheRegistry }: PreviewSectionProps) {
  const { tables, people, newPeople, rowsLeftBehind, agesTopCoded, lengthChange, rowsInMonth, columns, findings, problems } = prepared;
  const rows = tables.reduce((sum, each) => sum + each.rows, 0);
  return (
    <Section
      title="Preview"
      id="preview"
      note={
        <>
          <p>These are the bytes that leave this page, and there are no others.</p>
          <p>A net is no proof: look whether any word below could tell who somebody is.</p>
        </>
      }
    >
      <div aria-busy={isStale} className="grid gap-6">
        {isStale && <p role="status">The preview is being worked out anew.</p>}
        {lengthChange !== null && lengthChange.newLengths > 0 && (
          <Notice
            kind="warning"
            title={`${formatNumber(lengthChange.newLengths)} of ${formatCount(lengthChange.ids, 'record number')} have a length that nobody had last month.`}
          >
            <p>
              Has a spreadsheet taken away zeros at the beginning? Then these people would get a second code. Look at the column of the
              record numbers in your files before you send.
            </p>
          </Notice>
        )}
        <Facts
          facts={[
            { term: 'Rows', value: `${formatNumber(rows)} in ${formatCount(tables.length, 'table')}` },
            {
              term: `Training in ${monthName}`,
              value:
                rowsInMonth !== null && `${formatShare(rowsInMonth.inside, rowsInMonth.dated)} rows of ${tableName(rowsInMonth.table)}`,
            },
            { term: 'Rows that stay behind', value: rowsLeftBehind === 0 ? 'none' : formatNumber(rowsLeftBehind) },
            { term: 'People', value: formatNumber(people) },
            { term: knowsTheRegistry ? 'New to the registry' : 'New to the key file', value: formatNumber(newPeople) },
            {
              term: 'Ages sent as 90',
              value: agesTopCoded === 0 ? 'none' : `${formatNumber(agesTopCoded)}, because the person is 90 or older`,
            },
          ]}
        />
        {tables.map((table) => (
          <TablePreview key={table.table} table={table} />
        ))}
        <StayingBehind columns={columns} problems={problems} findings={findings} />
      </div>
    </Section>
  );
});
