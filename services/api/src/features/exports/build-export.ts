/** The job that builds an export: consent and rows are read at one moment, written once, and nothing is left of a build that fails. */
import { createHash, randomBytes } from 'node:crypto';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { queueMail } from '../../mail/queue-mail.ts';
import { verdictOn } from '../requests/consenting.ts';
import { addressesOf, readRequest, type RequestRecord } from '../requests/requests.repository.ts';
import { codebookCsv, exportCsv } from './export-csv.ts';
import { exportTables, type ExportCell, type ExportTableKey } from './export-tables.ts';
import { generalise } from './generalise.ts';
import {
  readCohort,
  readExport,
  readNewestConsents,
  readOutcomeRows,
  readSessionRows,
  replacePseudonyms,
  setExportStatus,
  storeExport,
  type ExportRecord,
} from './exports.repository.ts';
import { exportReadme } from './readme.ts';
import { zipFiles } from './zip-files.ts';

const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
/** Secret randomness: nothing that is published could tell which code is whose. 60 bits. */
const drawPseudonym = (): string => `R${Array.from(randomBytes(12), (byte) => alphabet[byte % 32]).join('')}`;

type Row = Readonly<Record<string, string | number | null>>;

const tableOrder: readonly ExportTableKey[] = ['participants', 'outcomes', 'sessions'];

async function build(
  tx: Tx,
  record: ExportRecord,
  request: RequestRecord,
  today: string,
): Promise<{ content: Buffer; people: number } | null> {
  const { form, releaseNumber } = request;
  if (releaseNumber === null || request.accessEndsOn === null) return null;
  const cohort = await readCohort(tx, releaseNumber, form.cohort.cells);
  const consents = await readNewestConsents(tx, cohort);
  const consenting = cohort.filter(
    (person) => verdictOn(consents.get(`${person.siteId} ${person.participant}`), form, today).verdict === 'permitted',
  );
  const generalised = generalise(consenting);
  if (!generalised) return null;

  const kept = consenting
    .flatMap((person, index) => {
      const values = generalised.values[index];
      return values ? [{ ...person, values, pseudonym: drawPseudonym() }] : [];
    })
    .sort((a, b) => (a.pseudonym < b.pseudonym ? -1 : 1));
  if (new Set(kept.map((person) => person.pseudonym)).size < kept.length) throw new Error('Two people drew one code.');
  const pseudonyms = new Map(kept.map((person) => [`${person.siteId} ${person.participant}`, person.pseudonym]));
  await replacePseudonyms(tx, record.id, kept);

  /** Rows of other tables, by code and then in the order they were read. */
  const withCodes = (table: ExportTableKey, rows: readonly Row[]): ExportCell[][] =>
    rows
      .map((row) =>
        exportTables[table].map(({ key }) =>
          key === 'participant' ? (pseudonyms.get(`${row['site_id']} ${row['participant']}`) ?? null) : (row[key] ?? null),
        ),
      )
      .sort((a, b) => (String(a[0]) < String(b[0]) ? -1 : String(a[0]) > String(b[0]) ? 1 : 0));
  const rowsOf: Readonly<Record<ExportTableKey, () => Promise<ExportCell[][]>>> = {
    participants: async () => kept.map((person) => [person.pseudonym, ...person.values]),
    outcomes: async () => withCodes('outcomes', await readOutcomeRows(tx, releaseNumber, kept)),
    sessions: async () => withCodes('sessions', await readSessionRows(tx, releaseNumber, kept)),
  };
  const asked = tableOrder.filter((table) => form.tables.some((one) => one.table === table));
  const files: { name: string; text: string }[] = [];
  for (const table of asked) files.push({ name: `${table}.csv`, text: exportCsv(table, await rowsOf[table]()) });
  files.push({ name: 'codebook.csv', text: codebookCsv(asked) });
  files.push({
    name: 'README.md',
    text: exportReadme({
      exportNumber: record.number,
      requestNumber: request.number,
      release: releaseNumber,
      form,
      accessEndsOn: request.accessEndsOn,
      generalised,
      notIncluded: cohort.length - kept.length,
      people: kept.length,
    }),
  });
  const manifest = files.map(({ name, text }) => `${createHash('sha256').update(text).digest('hex')}  ${name}\n`).join('');
  return { content: await zipFiles([...files, { name: 'manifest-sha256.txt', text: manifest }]), people: kept.length };
}

export async function buildExport({ config, database, clock }: Context, exportId: string): Promise<void> {
  await asActor(
    database,
    registry,
    async (tx) => {
      const record = await readExport(tx, exportId);
      const request = record && (await readRequest(tx, record.requestId));
      if (record?.status !== 'building' || !request) return;
      const built = request.status === 'approved' ? await build(tx, record, request, clock().toISOString().slice(0, 10)) : null;
      if (!built) {
        await setExportStatus(tx, exportId, 'failed');
        await recordAudit(tx, registry, {
          act: 'export.build',
          object: exportId,
          result: 'refused',
          reason: request.status === 'approved' ? 'too-few-people' : 'not-approved',
        });
        return;
      }
      const sha256 = createHash('sha256').update(built.content).digest('hex');
      await storeExport(tx, exportId, { content: built.content, sha256, participants: built.people });
      for (const recipient of await addressesOf(tx, [request.leadId])) {
        await queueMail(tx, {
          event: `export-ready:${exportId}`,
          recipient,
          subject: `Cairnstep: export ${record.number} is ready`,
          body: `The export of request ${request.number} can be downloaded at ${config.PUBLIC_URL}/exports until ${request.accessEndsOn}.`,
        });
      }
      await recordAudit(tx, registry, { act: 'export.build', object: exportId, detail: { sha256, people: built.people } });
    },
    'one-moment',
  );
}
