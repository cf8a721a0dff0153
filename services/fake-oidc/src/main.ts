/** The stand-in as a process of its own. */
import { readSettings } from './settings.ts';
import { startFakeOidc } from './start-fake-oidc.ts';

try {
  const provider = await startFakeOidc(readSettings(process.env));
  process.stdout.write(`Stand-in for sign-in at ${provider.issuer}\n`);
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => void provider.close().then(() => process.exit(0)));
} catch (error) {
  process.stderr.write(`${(error as Error).message}\n`);
  process.exitCode = 1;
}
