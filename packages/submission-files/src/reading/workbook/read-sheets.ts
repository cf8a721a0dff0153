/** The sheets of a workbook, each given to the sink of its table; findings about everything between the cells. */
import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../../finding-log.ts';
import type { WorkbookLimits } from '../../limits.ts';
import type { ByteSource } from '../byte-source.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { CellDetector } from './cell-detector.ts';
import { openWorkbook } from './open-workbook.ts';
import type { OpenWorkbook, SheetPart } from './open-workbook.ts';
import { scanPart } from './scan-part.ts';
import { meaningOfSheet } from './sheet-names.ts';
import { SheetReader } from './sheet-reader.ts';
import { TableSheet } from './table-sheet.ts';
import type { RowSink } from './table-sheet.ts';
import { wholeFile } from './whole-file.ts';

/** Reads every sheet that is a table; `sinkFor` is asked once for each. */
export async function readSheets(
  source: ByteSource,
  findings: FindingLog,
  limits: WorkbookLimits,
  sinkFor: (table: TableKey) => RowSink,
): Promise<void> {
  const workbook = await reportingUnreadable(findings, null, async () => openWorkbook(await wholeFile(source, limits), limits));
  if (workbook) await readEach(workbook, findings, limits, sinkFor);
}

async function readEach(
  { sheets, surroundings }: OpenWorkbook,
  findings: FindingLog,
  limits: WorkbookLimits,
  sinkFor: (table: TableKey) => RowSink,
): Promise<void> {
  const met = new Set<TableKey>();
  let hasTable = false;
  let hasImage = false;
  for (const [index, sheet] of sheets.entries()) {
    const table = meaningOfSheet(sheet.name);
    if (table === 'other') continue;
    if (table === null) {
      await reportingUnreadable(findings, null, () => reportUndeclared(sheet, index + 1, findings));
      continue;
    }
    if (met.has(table)) {
      findings.add({
        rule: 'F43',
        table,
        line: null,
        column: null,
        found: `Another sheet for this table, in position ${index + 1} of the workbook.`,
      });
      continue;
    }
    met.add(table);
    const events = new TableSheet(table, findings, sinkFor(table));
    const reader = new SheetReader(surroundings, limits, events);
    if (sheet.isHidden) findings.add({ rule: 'F45', table, line: null, column: null, found: 'The sheet is hidden.' });
    const isWhole = await reportingUnreadable(findings, table, () => {
      scanPart(sheet.entry, reader);
      return true;
    });
    events.end();
    hasTable ||= events.hasHeader || !isWhole;
    hasImage ||= events.hasImage;
  }
  if (!hasTable) reportNothing(findings, hasImage);
}

/** Tells a sheet by its position: its name may be somebody's. */
function reportUndeclared(sheet: SheetPart, position: number, findings: FindingLog): void {
  const detector = new CellDetector();
  scanPart(sheet.entry, detector);
  if (!detector.isDone) return;
  findings.add({
    rule: 'F42',
    table: null,
    line: null,
    column: null,
    found: `The sheet in position ${position} of the workbook is none of the tables.`,
  });
}

function reportNothing(findings: FindingLog, hasImage: boolean): void {
  findings.addStopping({
    rule: 'F05',
    table: null,
    line: null,
    column: null,
    found: hasImage ? 'The sheets of the workbook hold images and no table.' : 'No sheet of the workbook holds a table.',
    mend: 'Name each sheet after its table and begin it with the header row, as the template does.',
  });
}

/** Does the work; where the file cannot be read any further, writes that down and gives null. */
async function reportingUnreadable<T>(findings: FindingLog, table: TableKey | null, work: () => Promise<T> | T): Promise<T | null> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    findings.addStopping({ rule: error.rule, table, line: error.line, column: null, found: error.found, mend: error.mend });
    return null;
  }
}
