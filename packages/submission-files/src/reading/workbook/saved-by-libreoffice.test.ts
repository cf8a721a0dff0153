/** Workbooks that LibreOffice 7.4.7.2 has saved. `reference/libreoffice.ts` makes them anew and compares them cell by cell. */
import { readFileSync } from 'node:fs';
import { exampleRow, tableKeys, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { participants } from '../../../reference/filled-template.ts';
import { workbookContents } from '../../../reference/workbook-contents.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import { readWorkbookSheets } from './read-workbook-sheets.ts';

const saved = (name: string): Uint8Array =>
  new Uint8Array(readFileSync(new URL(`../../../reference/saved-by-libreoffice/${name}`, import.meta.url)));

describe('sheets filled in by hand', () => {
  const byHand = saved('sheets-by-hand.xlsx');

  it('are read with formulas, units, formats and empty rows as they are meant', async () => {
    const { tables } = await readPlaces(byHand);
    const { bouts, adverse_events: events } = tables;
    const first = ['participant', 'session_day', 'bout_no', 'distance_m', 'duration_s', 'stim_on', 'stop_reason', 'steps'];
    expect(first.map((key) => bouts?.column(key).cell(0))).toEqual(['S00000000000000000000Z', 3, 1, 300, 90.5, 'yes', 'fatigue', 120]);
    expect(Array.from(bouts?.lines ?? [])).toEqual([4, 6]);
    expect([events?.length, events?.column('severity').cell(0), events?.column('event_no').cell(0)]).toEqual([1, '2', 7]);
  });

  it('have a finding for each thing that cannot be taken as it is, where it stands', async () => {
    expect((await readPlaces(byHand)).places).toEqual([
      'F42 workbook - -',
      'F44 bouts 6 bout_no',
      'F46 bouts 6 steps',
      'F47 bouts 6 duration_s',
      'F47 bouts 6 stop_reason',
      'F45 bouts - steps',
      'F45 bouts 6 -',
      'F45 adverse_events - -',
    ]);
  });

  it('give dates and times as text where they are wanted', async () => {
    const read = await readWorkbookSheets(byHand);
    const bouts = read.ok ? read.sheets.find(({ table }) => table === 'bouts') : undefined;
    expect(bouts?.rows[1]).toEqual(['S00000000000000000000Z', '4', '2', '', '00:01:30', 'FALSE', '2026-03-05', '']);
  });
});

describe('the template, filled in', () => {
  const template = saved('template.xlsx');

  it('is read as it was filled in, without the example rows and without a finding', async () => {
    const { tables, findings } = await readPlaces(template);
    expect(findings).toEqual([]);
    for (const key of tableKeys) {
      const example = exampleRow(key);
      expect([tables[key]?.length, tables[key]?.row(0)]).toEqual([
        1,
        tableOf(key).variables.map((variable) => example[variable.key] ?? null),
      ]);
    }
  });

  it('still has a validation for each column, its participants as they were given, and its columns of codes as text', () => {
    const sheets = new Map(workbookContents(template).map((sheet) => [sheet.name, sheet]));
    for (const { name, variables } of tableKeys.map(tableOf)) {
      expect(sheets.get(name)?.validations).toHaveLength(variables.length);
      expect(sheets.get(name)?.textColumns).toEqual(
        variables.flatMap(({ type }, position) => (['pseudonym', 'code', 'flag'].includes(type) ? [position + 1] : [])),
      );
    }
    expect(sheets.get('Lists')?.cells).toEqual(expect.arrayContaining(participants.map((text, index) => `A${index + 2} text ${text}`)));
  });
});
