/** Exports of approved requests: asked for, listed, downloaded. */
import { createHash } from 'node:crypto';
import type { DataExport, InputOf } from '@cairnstep/contract';
import type { buildExport as BuildExport, downloadExport as DownloadExport } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry, type Actor } from '../../authority/actor.ts';
import { requireFound, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { route, type FileAnswer, type Route } from '../../http/route.ts';
import { enqueue } from '../../jobs/enqueue.ts';
import { isTeamMember, readRequest, type RequestRecord } from '../requests/requests.repository.ts';
import {
  countNoLongerConsenting,
  findBuilding,
  insertExport,
  listTeamExports,
  readExport,
  readExportContent,
  setExportStatus,
  type ExportRecord,
} from './exports.repository.ts';

const present = (record: ExportRecord): DataExport => ({ ...record, builtAt: record.builtAt?.toISOString() ?? null });

/** Access counts by the database's clock: approved, not past its last day, ethics approval still valid. */
async function requireAccess(tx: Tx, request: RequestRecord): Promise<void> {
  const ended = () => new Refusal('access-ended', 'Access under this request has ended. A new request can be written.');
  if (request.status === 'ended') throw ended();
  if (request.status !== 'approved') throw new Refusal('request-not-in-state', 'Only an approved request gives access to rows.');
  const [{ valid }] = (await tx.query(`select $1::date >= (now() at time zone 'UTC')::date as valid`, [request.form.ethicsExpiresOn])) as [
    { valid: boolean | null },
  ];
  if (valid !== true) throw new Refusal('access-ended', 'The ethics approval named in the request has run out.');
}

export function exportRoutes({ database, clock }: Context): Route[] {
  const build = (actor: Actor, { requestId: id }: InputOf<typeof BuildExport>, requestId: string): Promise<DataExport> =>
    asActor(database, actor, async (tx) => {
      const request = requireFound(await readRequest(tx, id));
      if (!(await isTeamMember(tx, id))) requireFound(null);
      await requireAccess(tx, request);
      // One build of a request at a time: whoever asks again is shown the one under way.
      await tx.query('select pg_advisory_xact_lock(hashtext($1))', [id]);
      const underWay = await findBuilding(tx, id);
      const exportId = underWay ?? (await insertExport(tx, id, requirePerson(actor).accountId, clock().getUTCFullYear()));
      if (underWay === null) {
        await enqueue(tx, 'build-export', { exportId });
        await recordAudit(tx, actor, { act: 'export.ask', object: exportId, requestId });
      }
      return present(requireFound(await readExport(tx, exportId)));
    });

  /** Checked again at the last moment: consent, access, and that the bytes are those that were built. */
  async function download(actor: Actor, { exportId }: InputOf<typeof DownloadExport>, requestId: string): Promise<FileAnswer> {
    const record = await asActor(database, actor, async (tx) => {
      const found = requireFound(await readExport(tx, exportId));
      if (!(await isTeamMember(tx, found.requestId))) requireFound(null);
      await requireAccess(tx, requireFound(await readRequest(tx, found.requestId)));
      if (found.status === 'stale')
        throw new Refusal('export-stale', 'Somebody in it has withdrawn. Build it again, and destroy earlier copies.');
      if (found.status !== 'ready')
        throw new Refusal('export-not-ready', 'It is still being built, or building it failed. Look again in a moment.');
      return found;
    });
    return asActor(database, registry, async (tx) => {
      if ((await countNoLongerConsenting(tx, exportId)) > 0) {
        await setExportStatus(tx, exportId, 'stale');
        await recordAudit(tx, actor, { act: 'export.download', object: exportId, result: 'refused', reason: 'consent-changed', requestId });
        return null;
      }
      const content = requireFound(await readExportContent(tx, exportId));
      const sha256 = createHash('sha256').update(content).digest('hex');
      if (sha256 !== record.sha256) throw new Error('An export no longer has the bytes that were built.');
      await recordAudit(tx, actor, { act: 'export.download', object: exportId, requestId, detail: { sha256 } });
      return { fileName: `${record.number}.zip`, bytes: content };
    }).then((answer) => {
      if (!answer) throw new Refusal('export-stale', 'Somebody in it has withdrawn. Build it again, and destroy earlier copies.');
      return answer;
    });
  }

  return [
    route('buildExport', (actor, input, { requestId }) => build(actor, input, requestId)),
    route('listExports', (actor) => asActor(database, actor, async (tx) => ({ exports: (await listTeamExports(tx)).map(present) }))),
    route('downloadExport', (actor, input, { requestId }) => download(actor, input, requestId)),
  ];
}
