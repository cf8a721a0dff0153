/**
 * The set-based SQL that compares and applies one table of a submission, built from the dictionary so that every table travels the same way.
 * Parameters: :submission, :site, :month, :tables (the tables that came with a file), :limit, :offset. Names of columns come from the
 * dictionary, never from a request.
 */
import { tableOf, type TableKey } from '@cairnstep/dictionary';
import { classColumns } from '../../database/entities/registry.ts';

/** Rows of these belong to a month: one that the month's new file no longer has is removed. People and consents are only added or changed. */
export const monthTables: readonly TableKey[] = ['exams', 'assessments', 'sessions', 'bouts', 'adverse_events'];

export interface TableSql {
  /** What a file says: keys, then values. */
  readonly fileColumns: readonly string[];
  /** Columns of the staged rows beside submission and site, in the order COPY sends them: of the file, its line, derived. */
  readonly stagedColumns: readonly string[];
  readonly counts: string;
  readonly list: { readonly added: string; readonly changed: string; readonly unchanged: string; readonly removed: string };
  /** What goes and what changes is first kept in the history. */
  readonly apply: { readonly removed: readonly string[]; readonly changed: readonly string[]; readonly added: readonly string[] };
}

const columns = (names: readonly string[], alias: string): string => names.map((name) => `${alias}.${name}`).join(', ');

const isOf = (alias: string, other: string, names: readonly string[]): string =>
  names.map((name) => `${alias}.${name} = ${other}.${name}`).join(' and ');

/**
 * From and where of the rows (alias r) that a commit removes: those of the month that its new file no longer has. A bout goes with its session,
 * whether or not a file of bouts came along; as a union, because each half finds its rows by an index of its own.
 */
function removedRows(key: TableKey, keys: readonly string[]): string {
  if (!monthTables.includes(key)) return `from ${key} r where false`;
  const notStaged = `not exists (select from staged_${key} s where s.submission_id = :submission and ${isOf('r', 's', keys)})`;
  const missing = `r.site_id = :site and r.month = :month and '${key}' = any(:tables::text[]) and ${notStaged}`;
  if (key !== 'bouts') return `from ${key} r where ${missing}`;
  const session = ['participant', 'session_day', 'session_no'];
  const list = columns(keys, 'r');
  return `from bouts r where r.site_id = :site and (${list}) in (
      select ${list} from bouts r where ${missing}
      union select ${list} from sessions g join bouts r on r.site_id = g.site_id and ${isOf('r', 'g', session)}
       where g.site_id = :site and g.month = :month and 'sessions' = any(:tables::text[]) and ${notStaged}
         and not exists (select from staged_sessions t where t.submission_id = :submission and ${isOf('t', 'g', session)}))`;
}

function build(key: TableKey): TableSql {
  const table = tableOf(key);
  const keys = table.rowKey;
  const values = table.variables.map((variable) => variable.key).filter((name) => !keys.includes(name));
  const derived: readonly string[] = key === 'exams' ? classColumns : [];
  const all = [...keys, ...values, ...derived];
  const sameKey = isOf('r', 's', keys);
  const differs = `(${columns(values, 's')}) is distinct from (${columns(values, 'r')})`;
  const known = `from staged_${key} s join ${key} r on r.site_id = :site and ${sameKey} where s.submission_id = :submission`;
  const added = `from staged_${key} s where s.submission_id = :submission and not exists (select from ${key} r where r.site_id = :site and ${sameKey})`;
  const removed = removedRows(key, keys);
  const rowKey = `jsonb_build_object(${keys.map((name) => `'${name}', r.${name}`).join(', ')})`;
  const keep = (change: string, rows: string) =>
    `insert into row_history (site_id, table_key, row_key, change, before, submission_id)
     select r.site_id, '${key}', ${rowKey}, '${change}', to_jsonb(r), :submission::uuid ${rows}`;
  const byLine = 'order by s.line limit :limit offset :offset';
  const page = (before: string, after: string, rows: string, order: string) =>
    `select ${before} as before, ${after} as after ${rows} ${order}`;
  return {
    fileColumns: [...keys, ...values],
    stagedColumns: [...keys, ...values, 'line', ...derived],
    counts: `select (select count(*)::int from staged_${key} where submission_id = :submission) as staged,
      (select count(*)::int ${known}) as known, (select count(*)::int ${known} and ${differs}) as changed, (select count(*)::int ${removed}) as removed`,
    list: {
      added: page('null::jsonb', 'to_jsonb(s)', added, byLine),
      changed: page('to_jsonb(r)', 'to_jsonb(s)', `${known} and ${differs}`, byLine),
      unchanged: page('to_jsonb(r)', 'to_jsonb(s)', `${known} and not (${differs})`, byLine),
      removed: page('to_jsonb(r)', 'null::jsonb', removed, `order by ${columns(keys, 'r')} limit :limit offset :offset`),
    },
    apply: {
      removed: [keep('removed', removed), `delete ${removed}`],
      changed: [
        keep('changed', `${known} and ${differs}`),
        `update ${key} r set ${[...values, ...derived].map((name) => `${name} = s.${name}`).join(', ')}, submission_id = :submission
           from staged_${key} s where s.submission_id = :submission and r.site_id = :site and ${sameKey} and ${differs}`,
      ],
      added: [
        `insert into ${key} (site_id, ${all.join(', ')}, month, submission_id)
         select :site::uuid, ${columns(all, 's')}, :month::text, :submission::uuid ${added}`,
      ],
    },
  };
}

const built = new Map<TableKey, TableSql>();

export function tableSql(key: TableKey): TableSql {
  const found = built.get(key) ?? build(key);
  built.set(key, found);
  return found;
}
