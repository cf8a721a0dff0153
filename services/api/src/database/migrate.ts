/** `node dist/database/migrate.js`: brings the database up to date. Runs as an administrator that acts as the owner. */
import { pathToFileURL } from 'node:url';
import PgBoss from 'pg-boss';
import { queueOptions, queues } from '../jobs/queues.ts';
import { makeDataSource } from './data-source.ts';

/** The same address, acting as a role from the first statement on. */
export function actingAs(url: string, role: string): string {
  const address = new URL(url);
  address.searchParams.set('options', `-c role=${role}`);
  return address.href;
}

/** Tables and reach, then the queue's own schema and its queues; the application may put jobs in, the worker's role takes them out. */
export async function migrate(adminUrl: string): Promise<void> {
  const url = actingAs(adminUrl, 'cairnstep_owner');
  const database = await makeDataSource({ url, poolSize: 1 }).initialize();
  try {
    await database.runMigrations({ transaction: 'all' });
    const boss = new PgBoss({ connectionString: url, max: 1, supervise: false, schedule: false });
    await boss.start();
    for (const queue of queues) {
      await boss.createQueue(queue, { name: queue, policy: 'standard', ...queueOptions[queue] });
    }
    await boss.stop({ graceful: false });
    await database.query('grant usage on schema pgboss to cairnstep_app, cairnstep_jobs');
    await database.query('grant select on pgboss.queue to cairnstep_app');
    await database.query('grant insert, select on pgboss.job to cairnstep_app');
    await database.query('grant select, insert, update, delete on all tables in schema pgboss to cairnstep_jobs');
    await database.query('grant execute on all functions in schema pgboss to cairnstep_jobs');
  } finally {
    await database.destroy();
  }
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const url = process.env['DATABASE_URL'];
  if (!url) {
    process.stderr.write('DATABASE_URL is missing: the address of the database with an account that may act as cairnstep_owner.\n');
    process.exit(2);
  }
  await migrate(url);
}
