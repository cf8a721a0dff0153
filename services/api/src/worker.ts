/** The door for background work: takes jobs from PostgreSQL, one after another of each kind. Several may run beside each other. */
import PgBoss from 'pg-boss';
import { readConfig, SettingsError } from './config.ts';
import { makeDataSource } from './database/data-source.ts';
import { buildExport } from './features/exports/build-export.ts';
import { remindCoordinators } from './features/months/remind-coordinators.ts';
import { checkSubmission } from './features/submissions/check-submission.ts';
import { errorFacts, makeLogger } from './http/log.ts';
import { listenForBell } from './jobs/bell.ts';
import { makeLeases } from './jobs/leases.ts';
import { tidyUp } from './jobs/tidy-up.ts';
import { workOff } from './jobs/work-off.ts';
import { makeTransport, sendMail } from './mail/send-mail.ts';

try {
  const config = readConfig(process.env);
  const log = makeLogger(config.LOG_LEVEL, 'worker');
  const database = await makeDataSource({ url: config.DATABASE_APP_URL, poolSize: 6 }).initialize();
  const context = { config, database, log, clock: () => new Date() };
  const transport = makeTransport(config.SMTP_URL);
  const boss = new PgBoss({ connectionString: jobsUrl(config.DATABASE_APP_URL), max: 4, migrate: false });
  boss.on('error', (error) => log.error(errorFacts(error), 'queue fault'));
  await boss.start();

  const leases = makeLeases(jobsUrl(config.DATABASE_APP_URL));
  const working = workOff(
    boss,
    leases,
    {
      'check-submission': ({ submissionId }) => checkSubmission(context, submissionId),
      'send-mail': ({ mailId }) => sendMail(context, transport, mailId),
      'build-export': ({ exportId }) => buildExport(context, exportId),
      'tidy-up': () => tidyUp(context),
      'remind-coordinators': () => remindCoordinators(context),
    },
    log,
  );
  await boss.schedule('tidy-up', '*/10 * * * *', {});
  // Every hour, so that a registry that stood still at the hour of reminding makes up for it; each reminder is mailed once.
  await boss.schedule('remind-coordinators', '20 * * * *', {});
  const listening = listenForBell(jobsUrl(config.DATABASE_APP_URL), (queue) => working.wake(queue));
  log.info('ready');
  process.send?.('ready');

  const stop = () => {
    log.info('stopping');
    void working
      .stop()
      .then(() => boss.stop({ graceful: false }))
      .then(() => Promise.all([listening.close(), leases.close(), database.destroy()]))
      .then(() => process.exit(0));
    setTimeout(() => process.exit(1), 15_000).unref();
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
} catch (error) {
  process.stderr.write(`${error instanceof SettingsError ? error.message : String(error)}\n`);
  process.exit(1);
}

/** The same login, acting as the role that reaches the queues and nothing else. */
function jobsUrl(url: string): string {
  const address = new URL(url);
  address.searchParams.set('options', '-c role=cairnstep_jobs');
  return address.href;
}
