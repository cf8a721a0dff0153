/** The mail catcher as a process of its own. */
import { z } from 'zod';
import { startMailCatcher } from './start-mail-catcher.ts';

const port = z.coerce.number().int().min(0).max(65_535);
const Settings = z.object({
  SMTP_PORT: port,
  PORT: port,
  HOST: z.string().min(1).default('127.0.0.1'),
  FOLDER: z.string().min(1).optional(),
});

const settings = Settings.safeParse(process.env);
if (!settings.success) {
  process.stderr.write(`These settings are missing or wrong:\n${z.prettifyError(settings.error)}\n`);
  process.exitCode = 1;
} else {
  const { SMTP_PORT: smtpPort, PORT: httpPort, HOST: host, FOLDER: folder } = settings.data;
  const catcher = await startMailCatcher({ smtpPort, httpPort, host, ...(folder === undefined ? {} : { folder }) });
  process.stdout.write(`Mail catcher: SMTP on port ${catcher.smtpPort}, pages at ${catcher.httpUrl}\n`);
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => void catcher.close().then(() => process.exit(0)));
}
