/** TypeORM's data source. Only `asActor()` and the migrations run queries through it. */
import 'reflect-metadata';
import { DataSource, DefaultNamingStrategy, type Table } from 'typeorm';
import { CourseFactRow, OutcomeFactRow, ReleaseCourseRow, ReleaseOutcomeRow, ReleaseRow, ReleaseSessionRow } from './entities/facts.ts';
import { AccountRow, GrantRow, InvitationRow, SiteRow, SiteSystemRow, WebSessionRow } from './entities/people.ts';
import { ReplacedCodeRow } from './entities/codes.ts';
import { MonthClosureRow } from './entities/months.ts';
import { AuditEntryRow, MailMessageRow } from './entities/records.ts';
import { registrySchemas, stagedSchemas } from './entities/registry.ts';
import { AccessRequestMemberRow, AccessRequestRow, AccessRequestVoteRow, ExportPseudonymRow, ExportRow } from './entities/requests.ts';
import {
  RowHistoryRow,
  SafeHeaderRow,
  SubmissionFileRow,
  SubmissionFindingRow,
  SubmissionMendRow,
  SubmissionRow,
} from './entities/submissions.ts';
import { migrations } from './migrations/index.ts';

/** Keys are named after their table, as PostgreSQL itself does. */
class Names extends DefaultNamingStrategy {
  override primaryKeyName(table: Table | string): string {
    return `${(typeof table === 'string' ? table : table.name).split('.').pop()}_pkey`;
  }
}

export const entities = [
  SiteRow,
  AccountRow,
  GrantRow,
  InvitationRow,
  SiteSystemRow,
  WebSessionRow,
  SubmissionRow,
  SubmissionFileRow,
  SubmissionFindingRow,
  SubmissionMendRow,
  SafeHeaderRow,
  RowHistoryRow,
  MonthClosureRow,
  ReplacedCodeRow,
  CourseFactRow,
  OutcomeFactRow,
  ReleaseRow,
  ReleaseCourseRow,
  ReleaseOutcomeRow,
  ReleaseSessionRow,
  AccessRequestRow,
  AccessRequestMemberRow,
  AccessRequestVoteRow,
  ExportRow,
  ExportPseudonymRow,
  AuditEntryRow,
  MailMessageRow,
  ...registrySchemas,
  ...stagedSchemas,
];

export interface DataSourceOptions {
  readonly url: string;
  /** Longest a statement may run before PostgreSQL ends it, milliseconds. Unlimited for migrations and the worker's bulk work. */
  readonly statementTimeout?: number;
  readonly poolSize?: number;
}

export function makeDataSource({ url, statementTimeout, poolSize = 10 }: DataSourceOptions): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities,
    migrations,
    migrationsTableName: 'schema_migrations',
    namingStrategy: new Names(),
    synchronize: false,
    logging: false,
    poolSize,
    extra: {
      connectionTimeoutMillis: 5_000,
      idle_in_transaction_session_timeout: 60_000,
      ...(statementTimeout ? { statement_timeout: statementTimeout } : {}),
    },
  });
}
