import { tableOf } from '@cairnstep/dictionary';
import type { Finding, RuleFindings } from '../../finding.ts';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import { otherSheets } from '../../reading/workbook/sheet-names.ts';
import { columnLetters } from '../../table/header-row.ts';
import { MarkedTable, mostNotes } from './marked-table.ts';
import type { CellPlace } from './marked-table.ts';
import type { PlannedLink, PlannedRow, PlannedSheet } from './sheet-plan.ts';
import { submittedTables } from './submitted-tables.ts';
import type { SubmittedFile } from './submitted-tables.ts';
import { writeSheets } from './write-sheets.ts';

/** Programs follow no more links of a sheet than about 65,000, and open slowly with as many. */
const mostLinks = 10_000;
const rowColumn = 3;

/** Adds to the list of findings where each of them stands, as far as that is known by then. */
type PlaceOf = (finding: Finding) => CellPlace | undefined;

const sheetOf = ({ table }: Finding): string => (table === null ? '' : tableOf(table).name);

function* listRows(groups: readonly RuleFindings[]): Generator<PlannedRow> {
  yield { line: 1, cells: ['Severity', 'Rule', 'Sheet', 'Row', 'Column', 'What was found', 'What puts it right', 'Why'], style: 'header' };
  let line = 1;
  for (const { id, count, kept, severity, why } of groups) {
    const style = severity;
    for (const finding of kept) {
      line += 1;
      const { line: row, column, found, mend } = finding;
      const styles = new Map([[0, style] as const, ...(row === null ? [] : [[rowColumn, 'link'] as const])]);
      yield { line, cells: [severity, id, sheetOf(finding), row, column, found, mend, why], styles };
    }
    if (kept.length === count) continue;
    line += 1;
    const rest = `${(count - kept.length).toLocaleString('en')} more findings of this rule are not listed one by one.`;
    yield { line, cells: [severity, id, null, null, null, rest, null, why], styles: new Map([[0, style]]) };
  }
  yield {
    line: line + 2,
    cells: [
      `Cells with findings are coloured on the sheets of the tables. The first ${mostNotes.toLocaleString('en')} of each sheet have a note.`,
    ],
  };
}

function links(groups: readonly RuleFindings[], placeOf: PlaceOf): PlannedLink[] {
  const found: PlannedLink[] = [];
  let line = 1;
  for (const { count, kept } of groups) {
    for (const finding of kept) {
      line += 1;
      const place = placeOf(finding);
      if (place && found.length < mostLinks)
        found.push({
          cell: `${columnLetters(rowColumn)}${line}`,
          target: `'${sheetOf(finding)}'!${columnLetters(place.column)}${place.line}`,
        });
    }
    if (kept.length < count) line += 1;
  }
  return found;
}

function planList(groups: readonly RuleFindings[], placeOf: PlaceOf): PlannedSheet {
  return {
    name: otherSheets.findings,
    columns: [{ width: 10 }, { width: 8 }, { width: 20 }, { width: 8 }, { width: 26 }, { width: 60 }, { width: 60 }, { width: 60 }],
    rows: listRows(groups),
    frozen: { rows: 1, columns: 0 },
    hasFilter: true,
    links: () => links(groups, placeOf),
  };
}

/**
 * A workbook that shows a site what was found in its files: a sheet for each submitted table with its cells as they were
 * sent, in the rows they stood in, those with findings coloured and with a note; and a sheet that lists all findings, with
 * links to the cells. Given piece by piece. Corrected, it can be submitted in place of the files.
 *
 * @param files The files as they were submitted; the first counts where two are of the same table.
 * @param findings What reading and checking them gave, as `FindingLog.byRule` puts it.
 */
export async function* writeFindingsWorkbook(
  files: readonly SubmittedFile[],
  findings: readonly RuleFindings[],
  limits: WorkbookLimits = defaultWorkbookLimits,
): AsyncGenerator<Uint8Array> {
  const kept = findings.flatMap((group) => group.kept);
  const tables = (await submittedTables(files, limits)).map(
    (submitted) =>
      new MarkedTable(
        submitted,
        kept.filter(({ table }) => table === submitted.table),
      ),
  );
  const placeOf: PlaceOf = (finding) => tables.find(({ places }) => places.has(finding))?.places.get(finding);
  const sheets: PlannedSheet[] = [];
  for (const table of tables) sheets.push(await table.plan());
  // The list is written last, because the links need the places of the cells.
  yield* writeSheets([...sheets, planList(findings, placeOf)], sheets.length);
}
