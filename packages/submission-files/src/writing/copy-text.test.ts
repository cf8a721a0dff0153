import { describe, expect, it } from 'vitest';
import { tableFromRows } from '../table/table-from-rows.ts';
import { bout, someone } from '../test-support/a-month.ts';
import { copyText } from './copy-text.ts';

describe('copyText', () => {
  it('writes rows as the text format of COPY has them', () => {
    const table = tableFromRows('bouts', [bout({ distance_m: 12.5, steps: undefined }), bout({ bout_no: 2, distance_m: 1e-7 })]);
    expect(copyText(table, ['participant', 'bout_no', 'distance_m', 'steps', 'stop_reason'])).toBe(
      `${someone}\t1\t12.5\t\\N\tplanned\n${someone}\t2\t0.0000001\t600\tplanned\n`,
    );
  });

  it('begins each line with what it is given, special characters escaped', () => {
    const table = tableFromRows('bouts', [bout()]);
    expect(copyText(table, ['bout_no'], ['7', null, 'a\tb\\c\n'])).toBe('7\t\\N\ta\\tb\\\\c\\n\t1\n');
  });
});
