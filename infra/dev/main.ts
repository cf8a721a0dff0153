/**
 * npm run dev: API and worker from their sources, started again when one changes, and the client from vite's server,
 * which passes /api on to the API. Database, sign-in and mail are those of npm start.
 */
import { join } from 'node:path';
import { createServer } from 'vite';
import { drawFreePort, loopback } from '../network/ports.ts';
import { projectRoot } from '../project-root.ts';
import { announcement } from '../start/announce.ts';
import { addressOf, publicUrlOf } from '../start/environment.ts';
import { prepare } from '../start/prepare.ts';
import { removeRun, writeRun } from '../start/run-note.ts';
import { runProduct } from '../start/run-product.ts';
import { runSession, untilToldToEnd } from '../start/session.ts';

await runSession(async (session) => {
  const { folder, place: prepared } = await prepare(session);
  // Browsers talk to vite's server, so that one has the product's port.
  const place = { ...prepared, apiPort: await drawFreePort() };
  const { report, onStarted, signal } = session;
  report('Starting …');
  await runProduct({ place, folder, fromSources: true, report, onStarted, signal });

  process.chdir(join(projectRoot, 'services/web'));
  const client = await createServer({
    logLevel: 'warn',
    server: { host: loopback, port: place.ports.product, strictPort: true, proxy: { '/api': addressOf(place.apiPort) } },
  });
  await client.listen();
  onStarted(() => client.close());

  const run = {
    address: publicUrlOf(place),
    mailAddress: addressOf(place.ports.mailPages),
    providerAddress: addressOf(place.ports.provider),
  };
  writeRun(folder.path, run);
  onStarted(async () => removeRun(folder.path));
  report(announcement(run, folder.path));
  await untilToldToEnd(session);
  report('Ending …');
  return 0;
}, 0);
