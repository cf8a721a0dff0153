import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tableOf, type TableKey } from '@cairnstep/dictionary';
import { FindingLog } from '../finding-log.ts';
import { readTable } from '../reading/read-csv.ts';

const encoder = new TextEncoder();

/** Cells that are read where they stand, and cells that are not, of every kind of column. */
const cells = fc.constantFrom(
  '', '0', '7', '12', '-3', '-0', '0.5', '18.25', '007', '100', '99999', '123456789012345', '1234567890123456', '1e3', '.5', '5.', '1,5', '+4', ' 8', '8 ',
  'walking', 'Walking', ' walking', 'yes', 'no', 'NT', 'cr10', '6_20', 'planned', 'treadmill', 'baseline', 'mas', 'wisci', '1+', 'nonsense', '=1+1', 'a"b', '\t=1',
  'S000000000000000000000', 'S00000000000000000000A', 'S000000000000000000000 ',
); // prettier-ignore

const tables = fc.constantFrom<TableKey>('bouts', 'sessions', 'assessments', 'participants', 'adverse_events');

const files = tables.chain((table) => {
  const columns = tableOf(table).variables.map(({ key }) => key);
  return fc.record({
    table: fc.constant(table),
    headers: fc.shuffledSubarray(columns, { minLength: 1 }),
    rows: fc.array(fc.array(cells, { minLength: columns.length, maxLength: columns.length }), { maxLength: 12 }),
    lineEnd: fc.constantFrom('\r\n', '\n', '\r'),
    lastLineEnds: fc.boolean(),
    piece: fc.integer({ min: 4, max: 400 }),
  });
});

const asWritten = (cell: string): string => (/[",]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);
const inMarks = (cell: string): string => `"${cell.replaceAll('"', '""')}"`;

async function readIn(table: TableKey, text: string, piece: number) {
  const bytes = encoder.encode(text);
  async function* pieces() {
    for (let at = 0; at < bytes.length; at += piece) yield bytes.subarray(at, at + piece);
  }
  const findings = new FindingLog();
  const read = await readTable(table, pieces(), findings);
  return {
    lines: [...read.lines],
    cells: read.columns.map((column) => Array.from(read.lines, (_, row) => [column.cell(row), column.isUnreadable(row)])),
    findings: findings.byRule(),
  };
}

describe('rows that are read where they stand', () => {
  it('hold what they hold when each cell stands in quotation marks, and are told the same of', async () => {
    await fc.assert(
      fc.asyncProperty(files, async ({ table, headers, rows, lineEnd, lastLineEnds, piece }) => {
        const textWith = (write: (cell: string) => string): string =>
          [headers.join(','), ...rows.map((row) => row.slice(0, headers.length).map(write).join(','))].join(lineEnd) +
          (lastLineEnds ? lineEnd : '');
        expect(await readIn(table, textWith(asWritten), piece)).toEqual(await readIn(table, textWith(inMarks), 1_000_000));
      }),
      { seed: 20_261_201, numRuns: 400 },
    );
  });
});
