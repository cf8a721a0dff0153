/**
 * npm run dev: API and worker from their sources, started again when one changes, and the client from vite's server,
 * which passes /api on to the API. Database, sign-in and mail are those of npm start.
 */
import { join } from 'node:path';
import { drawFreePort, loopback } from '../network/ports.ts';
import { projectRoot } from '../project-root.ts';
import { announceAndStay } from '../start/announce-and-stay.ts';
import { addressOf } from '../start/environment.ts';
import { prepare } from '../start/prepare.ts';
import { answers, untilReady } from '../start/ready.ts';
import { runProduct } from '../start/run-product.ts';
import { runSession } from '../start/session.ts';
import { supervise } from '../start/supervise.ts';

await runSession(async (session) => {
  const { folder, place: prepared } = await prepare(session);
  // Browsers talk to vite's server, so that one has the product's port.
  const place = { ...prepared, apiPort: await drawFreePort() };
  const { report, onStarted, signal } = session;
  report('Starting …');
  await runProduct({ place, folder, fromSources: true, report, onStarted, signal });

  const address = addressOf(place.ports.product);
  const client = supervise(
    {
      title: 'The client’s server',
      arguments: [
        join(projectRoot, 'node_modules/vite/bin/vite.js'),
        '--host',
        loopback,
        '--port',
        String(place.ports.product),
        '--strictPort',
      ],
      cwd: join(projectRoot, 'services/web'),
      // With CI set, vite does not take a closed standard input for the order to end.
      environment: { ...process.env, API_URL: addressOf(place.apiPort), CI: 'true' },
      logFile: join(folder.logs, 'client.log'),
    },
    report,
  );
  onStarted(() => client.stop());
  await untilReady(client, () => answers(address), signal);

  return announceAndStay(session, place);
}, 0);
