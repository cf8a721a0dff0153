import { adoptCodes, cleanCsv, createKeyFile, prepareMonth } from '@cairnstep/deidentification';
import { tableKeys } from '@cairnstep/dictionary';
import { FindingLog, readCsvText, readTable } from '@cairnstep/submission-files';
import { describe, expect, it } from 'vitest';
import { demoRegistry, demoSeed } from './registry.ts';

describe('the files of the clinic', () => {
  it('are the prepared month once they are prepared, but for the codes of newcomers', async () => {
    const { clean, fromTheClinic } = demoRegistry({ seed: demoSeed, lastMonth: '2026-10' }).next;
    const { key } = await createKeyFile({ site: 'S01', keyId: '2026-01' }, 'bafo rina tuke sobi malu pegi');
    const tables = [];
    for (const table of tableKeys) {
      const read = await readCsvText(fromTheClinic.files[table] ?? new Uint8Array());
      if (read.ok) tables.push({ table, headers: read.headers, rows: read.rows, lines: read.lines });
    }
    const adopted = await adoptCodes(
      key,
      fromTheClinic.people.map(({ recordNumber, ...person }) => ({ localId: recordNumber, ...person })),
    );
    const prepared = await prepareMonth({ key: adopted, tables });
    expect(prepared.problems).toEqual([]);
    const newcomers = new Set(prepared.newParticipants.map(({ code }) => code));
    expect(newcomers.size).toBe(3);

    for (const table of prepared.clean) {
      const read = async (bytes: Uint8Array) => {
        const findings = new FindingLog();
        const rows = await readTable(table.table, bytes, findings);
        expect(findings.counts.errors).toBe(0);
        return rows;
      };
      const [mine, given] = [await read(new TextEncoder().encode(cleanCsv(table))), await read(clean[table.table] ?? new Uint8Array())];
      expect(mine.length).toBe(given.length);
      for (const { variable } of given.columns) {
        for (let row = 0; row < given.length; row += 1) {
          const cell = mine.column(variable.key).cell(row);
          if (variable.key === 'participant' && newcomers.has(String(cell))) continue;
          expect([variable.key, row, cell]).toEqual([variable.key, row, given.column(variable.key).cell(row)]);
        }
      }
    }
  });
});
