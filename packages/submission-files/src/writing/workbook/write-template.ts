import { dictionary, tableKeys } from '@cairnstep/dictionary';
import { otherSheets } from '../../reading/workbook/sheet-names.ts';
import { exampleMark } from '../../table/example-cells.ts';
import { ListColumns } from './list-columns.ts';
import { planDefinitions, planLists, planMeasures } from './plan-definition-sheets.ts';
import { planTableSheet } from './plan-table-sheet.ts';
import type { PlannedRow, PlannedSheet } from './sheet-plan.ts';
import { writeSheets } from './write-sheets.ts';

/** Whom a template is for. */
export interface TemplateFor {
  /** Name of the site, as it stands on the first sheet. */
  readonly site: string;
  /** `2026-11` */
  readonly month: string;
  /** Numbers or codes of the site's participants to choose from, in the order of the list. Others can be typed as well. */
  readonly participants: readonly string[];
}

function planStart({ site, month, participants }: TemplateFor): PlannedSheet {
  const known = participants.length === 1 ? '1 participant is' : `${participants.length.toLocaleString('en')} participants are`;
  const lines: readonly (readonly [string, PlannedRow['style']?])[] = [
    ['Training data of one month', 'title'],
    [`Site: ${site}`],
    [`Month: ${month}`],
    [`Dictionary: version ${dictionary.version}`],
    [''],
    [
      'Each of the next sheets is one table, with a row for each thing it is about. Leave a sheet as it is when the month has nothing for it.',
    ],
    [`Row 2 of each table is an example and begins with ${exampleMark}. It is not read: write below it, or over the whole row.`],
    ['Columns with a darker header are filled in every row. Choose a cell to see what belongs there.'],
    [`Participants are chosen from a list; ${known} on it. Type a number only for somebody new.`],
    [
      'Write days as study days (0 is the first training day), never as calendar dates, unless the file is prepared on the submission page.',
    ],
    ['Columns may be moved or left out. Do not merge cells and do not rename the sheets or headers.'],
    [
      `What each column means stands on the sheet ${otherSheets.definitions}, what each outcome measure is on the sheet ${otherSheets.measures}.`,
    ],
  ];
  return {
    name: otherSheets.start,
    columns: [{ width: 110, style: 'wrapped' }],
    rows: lines.map(([text, style], index) => ({ line: index + 1, cells: [text], ...(style ? { style } : {}) })),
  };
}

/**
 * The workbook that a site fills in for a month, piece by piece: a sheet for each table, with units in the headers, lists
 * to choose from, limits, and an example row that reading passes over; and sheets with instructions, definitions and lists.
 * Columns of codes are formatted as text, so that a spreadsheet program makes no date or number of what is typed there.
 */
export function writeTemplate(target: TemplateFor): AsyncGenerator<Uint8Array> {
  const lists = new ListColumns(target.participants);
  return writeSheets([
    planStart(target),
    ...tableKeys.map((key) => planTableSheet(key, lists)),
    planDefinitions(),
    planMeasures(),
    planLists(lists),
  ]);
}
