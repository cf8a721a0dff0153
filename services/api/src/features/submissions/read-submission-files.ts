/** The files of a submission to typed tables: screened while they are read, with mended cells in their place. */
import type { TableKey } from '@cairnstep/dictionary';
import {
  countUnscreened,
  defaultWorkbookLimits,
  readTable,
  readWorkbook,
  TableScreen,
  type FindingLog,
  type Mends,
  type TypedTable,
  type TypedTables,
} from '@cairnstep/submission-files';
import { registry } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { tableOfFile, type FileKey } from './file-key.ts';
import { readMends, type MendsByTable } from './mends.repository.ts';
import { readSafeHeaders } from './safe-headers.repository.ts';
import { readContent } from './read-content.ts';
import type { FileRecord, SubmissionRecord } from './submissions.repository.ts';

export interface FilesRead {
  readonly tables: TypedTables;
  /** What each file that was read has rows of. */
  readonly rows: ReadonlyMap<FileKey, ReadonlyMap<TableKey, number>>;
  /** Files that must not be kept: they identify somebody, or were not read to their end, so that nobody knows whether they do. */
  readonly refused: readonly FileKey[];
}

/** What is kept of a workbook has passed the limits in its own form; written again it may be somewhat larger. */
const keptLimits = {
  ...defaultWorkbookLimits,
  bytes: 2 * defaultWorkbookLimits.bytes,
  unpackedBytes: 2 * defaultWorkbookLimits.unpackedBytes,
};

class SubmissionReader {
  readonly tables: Partial<Record<TableKey, TypedTable>> = {};
  readonly rows = new Map<FileKey, ReadonlyMap<TableKey, number>>();
  readonly refused: FileKey[] = [];

  constructor(
    private readonly context: Context,
    private readonly submissionId: string,
    private readonly log: FindingLog,
    private readonly safeHeaders: ReadonlySet<string>,
    private readonly mends: MendsByTable,
  ) {}

  async read(key: FileKey): Promise<void> {
    const before = countUnscreened(this.log);
    const screens: TableScreen[] = [];
    const read = await asActor(this.context.database, registry, (tx) => {
      const content = readContent(tx, this.submissionId, key);
      return key === 'workbook' ? this.readSheets(content, screens) : this.readFile(key, content, screens);
    });
    const identifies = screens.map((screen) => screen.report(this.log)).includes(true);
    if (identifies || countUnscreened(this.log) > before) this.refused.push(key);
    const counting = key === 'workbook' ? this.filledSheets(read) : Object.values(read);
    this.rows.set(key, new Map(counting.map((table) => [table.key, table.length])));
    for (const table of counting) this.tables[table.key] = table;
  }

  private async readFile(key: TableKey, content: AsyncIterable<Uint8Array>, screens: TableScreen[]): Promise<TypedTables> {
    return { [key]: await readTable(key, content, this.log, undefined, this.optionsOf(key, screens)) };
  }

  private readSheets(content: AsyncIterable<Uint8Array>, screens: TableScreen[]): Promise<TypedTables> {
    return readWorkbook(content, this.log, keptLimits, (table) => this.optionsOf(table, screens));
  }

  /** A sheet without a row says nothing about its table: the template is sent as it is where a month has nothing for it. */
  private filledSheets(sheets: TypedTables): readonly TypedTable[] {
    const filled = Object.values(sheets).filter(({ length }) => length > 0);
    const isTwice = ({ key }: TypedTable): boolean => this.tables[key] !== undefined;
    for (const { key } of filled.filter(isTwice)) {
      const found = 'The workbook has rows of a table that came with a file of its own.';
      this.log.add({ rule: 'F53', table: key, line: null, column: null, found });
    }
    if (Object.values(sheets).length > 0 && filled.length === 0)
      this.log.add({
        rule: 'F05',
        table: null,
        line: null,
        column: null,
        found: 'No sheet of the workbook has a row below its header and its example.',
        mend: 'Fill in at least one table. A month in which there was nothing is closed as such.',
      });
    return filled.filter((table) => !isTwice(table));
  }

  private optionsOf(table: TableKey, screens: TableScreen[]) {
    const screen = new TableScreen(table, this.safeHeaders);
    screens.push(screen);
    const mends = this.tables[table] ? undefined : this.mends[table];
    return { watch: screen, ...(mends ? { mends } : {}) };
  }

  /** To be called when all files have been read. Where reading broke off, nobody knows which rows there are. */
  reportLostMends(): void {
    for (const [table, mends] of Object.entries(this.mends) as [TableKey, Mends][]) {
      if (this.log.incomplete.has(table)) continue;
      const present = new Set(this.tables[table]?.lines ?? []);
      for (const [line, cells] of mends) {
        if (present.has(line)) continue;
        for (const column of cells.keys())
          this.log.add({ rule: 'F54', table, line, column, found: 'A value was typed for this line, and the file has no row there.' });
      }
    }
  }
}

/** @param onFile Hears how many files have been read. */
export async function readSubmissionFiles(
  context: Context,
  submission: SubmissionRecord,
  files: readonly FileRecord[],
  log: FindingLog,
  onFile: (done: number) => Promise<unknown>,
): Promise<FilesRead> {
  const [safeHeaders, mends] = await asActor(context.database, registry, async (tx) => [
    new Set((await readSafeHeaders(tx, submission.siteId)).map(({ header }) => header)),
    await readMends(tx, submission.id),
  ]);
  const reader = new SubmissionReader(context, submission.id, log, safeHeaders, mends);
  // The workbook last: what it has of a table with a file of its own does not count.
  const kept = files.filter(({ refused }) => !refused).sort((a, b) => Number(a.key === 'workbook') - Number(b.key === 'workbook'));
  for (const [index, { key }] of kept.entries()) {
    await onFile(index);
    await reader.read(key);
  }
  reader.reportLostMends();
  for (const { key } of files.filter(({ refused }) => refused))
    log.addStopping({
      rule: 'F52',
      table: tableOfFile(key),
      line: null,
      column: null,
      found: 'The file was deleted when it was checked before.',
    });
  const { tables, rows, refused } = reader;
  return { tables, rows, refused };
}
