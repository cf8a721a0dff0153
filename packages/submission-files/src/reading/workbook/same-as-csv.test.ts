import { stringify } from 'csv-stringify/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FindingLog } from '../../finding-log.ts';
import { encode } from '../../test-support/findings-of.ts';
import { whole } from '../../test-support/workbook-parts-of.ts';
import { writeSheets } from '../../writing/workbook/write-sheets.ts';
import { readTable } from '../read-csv.ts';
import { readWorkbook } from './read-workbook.ts';

const headers = ['participant', 'Distance (km)', 'steps', 'stim_on', 'stop_reason', 'rest_after_s'];

/** Cells right and wrong. Decimal commas are left out: in a CSV file they stand for another manner, beside typed numbers they do not. */
const cell = fc.oneof(
  fc.constantFrom('', ' ', 'S00000000000000000000Z', 'yes', 'TRUE', '0', 'pain', ' Fatigue', '=1+1', '-5', '007', '1e3', 'NaN'),
  fc.integer({ min: -10_000, max: 10_000 }).map(String),
  fc.double({ min: 0, max: 1_000, noNaN: true }).map((value) => value.toFixed(3)),
  fc.string({ maxLength: 8 }).filter((text) => !text.includes(',')),
);

describe('a workbook and a CSV file of the same cells', () => {
  it('give the same rows, the same findings and the same places', async () => {
    const filled = fc.array(fc.tuple(...headers.map(() => cell)), { minLength: 1, maxLength: 12 });
    await fc.assert(
      fc.asyncProperty(filled, async (rows) => {
        const all = [headers, ...rows];
        const inCsv = new FindingLog();
        const csv = await readTable('bouts', encode(stringify(all, { record_delimiter: '\r\n', quoted: true })), inCsv);
        const inSheet = new FindingLog();
        const planned = all.map((cells, index) => ({ line: index + 1, cells: [...cells] }));
        const sheet = { name: 'Bouts', columns: headers.map(() => ({ width: 10 })), rows: planned };
        const { bouts } = await readWorkbook(await whole(writeSheets([sheet])), inSheet);

        expect(Array.from({ length: bouts?.length ?? 0 }, (_, row) => bouts?.row(row))).toEqual(
          Array.from({ length: csv.length }, (_, row) => csv.row(row)),
        );
        expect(inSheet.byRule()).toEqual(inCsv.byRule());
      }),
      { seed: 20261104, numRuns: 150 },
    );
  });
});
