/** Reading and checking the audit log. Row-level security decides which entries an actor reaches. */
import { recordAudit } from '../../audit/record-audit.ts';
import { readVerdict } from '../../audit/read-verdict.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { route, type Route } from '../../http/route.ts';

const pageSize = 50;

interface EntryRecord {
  readonly seq: string;
  readonly at: Date;
  readonly actor_name: string;
  readonly role: string;
  readonly act: string;
  readonly object: string | null;
  readonly result: 'ok' | 'refused' | 'failed';
}

export const auditRoutes = ({ database }: Context): Route[] => [
  route('listAudit', (actor, { page }) =>
    asActor(database, actor, async (tx) => {
      const [{ count }] = (await tx.query('select count(*)::int as count from audit_entries')) as [{ count: number }];
      const rows = (await tx.query(
        `select e.seq, e.at, coalesce(a.name, y.label, e.actor) as actor_name, e.role, e.act, e.object, e.result
           from audit_entries e left join accounts a on a.id::text = e.actor left join site_systems y on y.id::text = e.actor
          order by e.seq desc limit $1 offset $2`,
        [pageSize, (page - 1) * pageSize],
      )) as EntryRecord[];
      const items = rows.map((row) => ({
        seq: Number(row.seq),
        at: row.at.toISOString(),
        actor: row.actor_name,
        role: row.role === '' ? null : row.role,
        act: row.act,
        object: row.object,
        result: row.result,
      }));
      return { items, page, pageSize, total: count };
    }),
  ),
  route('verifyAudit', (actor, _input, { requestId }) =>
    asActor(database, actor, async (tx) => {
      const verdict = await readVerdict(tx);
      await recordAudit(tx, actor, {
        act: 'audit.verify',
        requestId,
        result: verdict.holds ? 'ok' : 'failed',
        detail: { entries: verdict.entries },
      });
      return verdict;
    }),
  ),
];
