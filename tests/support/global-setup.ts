/** Once per run: roles and a migrated template database that each test file clones. */
import { Client } from 'pg';
import { ensureRoles } from '../../infra/database/roles.ts';
import { withDatabase } from '../../infra/database/connection-url.ts';
import { migrate } from '../../services/api/src/database/migrate.ts';
import { adminUrl, loginPassword, templateDatabase } from './addresses.ts';

export default async function setup(): Promise<void> {
  const admin = new Client({ connectionString: adminUrl() });
  await admin.connect();
  await admin.query(`drop database if exists ${templateDatabase} with (force)`);
  await admin.end();
  await ensureRoles(withDatabase(adminUrl(), templateDatabase), loginPassword);
  await migrate(withDatabase(adminUrl(), templateDatabase));
}
